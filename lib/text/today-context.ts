/** Somebody who has the case open now. */
export interface ConnectedPerson {
  readonly personId: string;
  readonly role: string;
  readonly displayName: string;
  readonly since: string;
}

/** What is known of a case from outside its log: who looks, who is there, and whether it can be seen now. */
export interface TodayContext {
  /** The server's clock while the case is live; the time of its last check while it is not. */
  readonly nowMs: number;
  readonly timeZone: string;
  readonly isLive: boolean;
  readonly deskConnected: boolean;
  readonly deskSince: string | null;
  readonly peopleConnected: readonly ConnectedPerson[];
  /** The person who looks, and as what. */
  readonly viewer: { readonly personId: string; readonly role: string };
}
