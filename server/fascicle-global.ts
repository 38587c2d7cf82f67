import type { CommandRequest, PlanCaseRequest } from '@/lib/contracts/http/commands';
import type {
  CaseHeadReply,
  CaseListReply,
  CommandReply,
  EntriesReply,
  FailureReply,
  PairScreenReply,
  PairScreenRequest,
  PeopleReply,
  ScreenReply,
  SessionReply,
} from '@/lib/contracts/http/replies';
import type { DemoPeopleReply, HealthReply, ReauthenticateReply, ScreensReply } from '@/lib/contracts/http/account';
import type { SignInReply, SignInRequest } from '@/server/auth/sign-in-reply';

/** Where a request came from. `address` is the socket's, set by the server itself. */
export interface RequestSource {
  readonly cookie: string | null;
  /** The Authorization header of a program; null for a browser. */
  readonly authorization: string | null;
  readonly address: string;
}

/** Commands that routes may ask for: input and answer. */
export interface CommandDoors {
  'plan-case': { input: PlanCaseRequest; answer: CommandReply };
  'give-command': { input: { caseId: string; request: CommandRequest }; answer: CommandReply };
  'pair-screen': { input: { caseId: string; request: PairScreenRequest }; answer: PairScreenReply };
  'revoke-screen': { input: { caseId: string; screenId: string }; answer: ScreensReply };
  'ask-for-screen': { input: Record<string, never>; answer: ScreenReply };
  'sign-in': { input: SignInRequest; answer: SignInReply };
  'sign-out': { input: { sessionId: string }; answer: Record<string, never> };
  reauthenticate: { input: { password: string; code: string }; answer: ReauthenticateReply };
}

/** Questions that routes and pages may ask. */
export interface QueryDoors {
  session: { input: Record<string, never>; answer: SessionReply };
  people: { input: Record<string, never>; answer: PeopleReply };
  cases: { input: Record<string, never>; answer: CaseListReply };
  'case-access': { input: { caseId: string }; answer: { readonly caseId: string } };
  'case-head': { input: { caseId: string }; answer: CaseHeadReply };
  'case-entries': { input: { caseId: string; after: number; limit: number }; answer: EntriesReply };
  screens: { input: { caseId: string }; answer: ScreensReply };
  screen: { input: Record<string, never>; answer: ScreenReply };
  'demo-people': { input: Record<string, never>; answer: DemoPeopleReply };
  health: { input: Record<string, never>; answer: HealthReply };
}

/** What a door answers: never an exception. `cookies` are whole Set-Cookie lines. */
export type Reply<Answer> =
  | { readonly isOk: true; readonly status: 200; readonly body: Answer; readonly cookies: readonly string[] }
  | { readonly isOk: false; readonly status: number; readonly body: FailureReply; readonly cookies: readonly string[] };

/** The one seam between Next's bundles and the server that serves them. */
export interface FascicleGlobal {
  execute<Name extends keyof CommandDoors>(name: Name, input: CommandDoors[Name]['input'], source: RequestSource): Promise<Reply<CommandDoors[Name]['answer']>>;
  query<Name extends keyof QueryDoors>(name: Name, input: QueryDoors[Name]['input'], source: RequestSource): Promise<Reply<QueryDoors[Name]['answer']>>;
}

declare global {
  var fascicle: FascicleGlobal;
}
