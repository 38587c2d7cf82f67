/** Answers and questions of doors that no browser contract names. */

/** What the sign-in form sends. */
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

/** Password and code were given again. */
export interface ReauthenticateReply {
  readonly reauthenticatedAt: string;
}

/** Walls that are or were bound to a case. */
export interface ScreenListReply {
  readonly screens: readonly ScreenLine[];
}

/** One wall of a case. */
export interface ScreenLine {
  readonly screenId: string;
  readonly words: string;
  readonly pairedAt: string;
  readonly lastSeenAt: string | null;
  readonly endedAt: string | null;
  readonly isConnected: boolean;
}

/** Demo people with what is needed to sign in as one of them. Only in demo mode, only on loopback. */
export interface DemoPeopleReply {
  readonly people: readonly {
    readonly email: string;
    readonly displayName: string;
    readonly hospitalName: string;
    readonly password: string;
    readonly code: string;
    readonly codeSecondsLeft: number;
    readonly roles: readonly string[];
  }[];
}

/** Whether the product can do its work now. */
export interface HealthReply {
  readonly isDatabaseAnswering: boolean;
  readonly eventLoopDelayP99Ms: number;
  readonly checkedAt: string | null;
}
