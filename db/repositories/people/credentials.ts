/** What a sign-in is checked against. Never leaves the server and is never logged. */
export interface Credentials {
  readonly personId: string;
  readonly email: string;
  readonly displayName: string;
  readonly passwordHash: string;
  readonly secondFactorSecret: string;
  /** The last time step whose code was accepted; −1 for none. */
  readonly secondFactorStep: number;
  readonly isDemo: boolean;
}

/** Columns of a row of people as credentials. */
export const CREDENTIAL_COLUMNS = `id as "personId", email, display_name as "displayName", password_hash as "passwordHash",
  second_factor_secret as "secondFactorSecret", second_factor_step as "secondFactorStep", is_demo as "isDemo"`;
