/** What the sign-in form sends. next-auth carries it, so no browser contract names it. */
export interface SignInRequest {
  readonly email: string;
  readonly password: string;
  readonly code: string;
}

/** A new session: its id is all that the browser's token holds. */
export interface SignInReply {
  readonly sessionId: string;
  readonly personId: string;
}
