import { askServer, type Question } from '@/app/_live/ask-server';
import type { Contract } from '@/lib/contracts/contract';
import type { CommandRequest, PlanCaseRequest } from '@/lib/contracts/http/commands';
import {
  caseHeadReplySchema,
  caseListReplySchema,
  commandReplySchema,
  entriesReplySchema,
  pairScreenReplySchema,
  peopleReplySchema,
  screenReplySchema,
  sessionReplySchema,
  type CaseHeadReply,
  type CaseListReply,
  type CommandReply,
  type EntriesReply,
  type PairScreenReply,
  type PairScreenRequest,
  type PeopleReply,
  type ScreenReply,
  type SessionReply,
} from '@/lib/contracts/http/replies';

/*
 * The server's HTTP doors for the browser. Each throws `ApiFailure` with a sentence. Commands of a case that exists go
 * through `sendCommand`, which keeps them first.
 */

const caseDoor = (caseId: string, rest = ''): string => `/api/cases/${encodeURIComponent(caseId)}${rest}`;

/** Who is signed in. */
export const readSession = (question?: Pick<Question, 'timeoutMs'>): Promise<SessionReply> => askServer('/api/session', sessionReplySchema, question);

/** The cases of this person. */
export const readCases = (): Promise<CaseListReply> => askServer('/api/cases', caseListReplySchema);

/** People whom this person can choose for the team of a case. */
export const readPeople = (): Promise<PeopleReply> => askServer('/api/people', peopleReplySchema);

/** Plans a new case; send the same command id again after "no answer". */
export const planCase = (request: PlanCaseRequest): Promise<CommandReply> =>
  askServer<CommandReply>('/api/cases', commandReplySchema, { method: 'POST', body: request });

/** The head of a case, patient's label included. */
export const readCaseHead = (caseId: string): Promise<CaseHeadReply> => askServer(caseDoor(caseId), caseHeadReplySchema);

/** One page of a case's log after a number. */
export const readEntries = (caseId: string, after: number, limit: number): Promise<EntriesReply> =>
  askServer(caseDoor(caseId, `/entries?after=${after}&limit=${limit}`), entriesReplySchema);

/** A command past the waiting queue: only for pages outside a running case. */
export const postCommand = (caseId: string, request: CommandRequest): Promise<CommandReply> =>
  askServer<CommandReply>(caseDoor(caseId, '/commands'), commandReplySchema, { method: 'POST', body: request });

/** Asks for a wall's words by its code, then binds it with `isConfirmed`. */
export const pairScreen = (caseId: string, request: PairScreenRequest): Promise<PairScreenReply> =>
  askServer(caseDoor(caseId, '/screens'), pairScreenReplySchema, { method: 'POST', body: request });

/** A wall asks for a pairing code; its cookie comes with the answer. */
export const askForScreen = (): Promise<ScreenReply> => askServer<ScreenReply>('/api/screen', screenReplySchema, { method: 'POST', body: {} });

/** A wall asks how it stands. */
export const readScreen = (): Promise<ScreenReply> => askServer<ScreenReply>('/api/screen', screenReplySchema);

/** Any other door, read by the contract that the caller brings from `lib/contracts`. */
export const ask = <Answer>(path: string, contract: Contract<Answer>, question?: Question): Promise<Answer> => askServer(path, contract, question);
