import { z } from 'zod';

import { apiLimits } from '@/lib/contracts/http/api-limits';
import { healthReplySchema, screensReplySchema } from '@/lib/contracts/http/account';
import { commandRequestSchema, planCaseRequestSchema } from '@/lib/contracts/http/commands';
import {
  caseHeadReplySchema,
  caseListReplySchema,
  commandReplySchema,
  entriesReplySchema,
  failureReplySchema,
  pairScreenReplySchema,
  pairScreenRequestSchema,
  peopleReplySchema,
  sessionReplySchema,
  wireEntrySchema,
} from '@/lib/contracts/http/replies';

/** Every shape that travels over HTTP, by the name it has in the interface's description. */
export const apiShapes = {
  PlanCaseRequest: planCaseRequestSchema,
  CommandRequest: commandRequestSchema,
  PairScreenRequest: pairScreenRequestSchema,
  Entry: wireEntrySchema,
  CommittedReply: commandReplySchema.options[0],
  EntriesReply: entriesReplySchema,
  CaseListReply: caseListReplySchema,
  CaseHeadReply: caseHeadReplySchema,
  SessionReply: sessionReplySchema,
  PeopleReply: peopleReplySchema,
  ScreensReply: screensReplySchema,
  PairScreenReply: pairScreenReplySchema,
  HealthReply: healthReplySchema,
  FailureReply: failureReplySchema,
} as const satisfies Readonly<Record<string, z.ZodType>>;

/** Name of a shape. */
export type ApiShape = keyof typeof apiShapes;

/** One operation of the interface for programs. */
export interface ApiOperation {
  readonly operationId: string;
  readonly method: 'get' | 'post' | 'delete';
  /** With its variable parts in braces. */
  readonly path: string;
  readonly summary: string;
  readonly request: ApiShape | null;
  readonly reply: ApiShape;
  readonly query: Readonly<Record<string, { readonly words: string; readonly schema: z.ZodType }>>;
  /** Answers nobody in particular: no token is needed. */
  readonly isOpen: boolean;
  /** May be refused by how things stand, as a command by the state of its case: 409 with the reason. */
  readonly mayConflict: boolean;
}

const read = { method: 'get', request: null, query: {}, isOpen: false, mayConflict: false } as const;
const write = { method: 'post', query: {}, isOpen: false, mayConflict: false } as const;

/**
 * The interface for programs: what a person may do at the desk, with a token instead of a sign-in.
 * @source house rule: one table for the description and for the test that holds it against the routes
 */
export const apiTable: readonly ApiOperation[] = [
  { ...read, operationId: 'readSession', path: '/api/session', summary: 'Whose token this is, in which hospitals, with which theatres', reply: 'SessionReply' },
  { ...read, operationId: 'listPeople', path: '/api/people', summary: 'People of the hospitals where this person plans, to choose a team from', reply: 'PeopleReply' },
  { ...read, operationId: 'listCases', path: '/api/cases', summary: 'The cases this person may see, open ones first', reply: 'CaseListReply' },
  { ...write, operationId: 'planCase', path: '/api/cases', summary: 'Plans a case; the same command id gives the same case again', request: 'PlanCaseRequest', reply: 'CommittedReply', mayConflict: true },
  { ...read, operationId: 'readCase', path: '/api/cases/{caseId}', summary: 'What is not in the log: hospital, time zone, own role, patient label where the role may read it', reply: 'CaseHeadReply' },
  {
    ...read,
    operationId: 'readEntries',
    path: '/api/cases/{caseId}/entries',
    summary: 'A page of the log, oldest first, each entry as it was hashed',
    reply: 'EntriesReply',
    query: {
      after: { words: 'Number of the last entry held; 0 for the beginning', schema: z.int().min(0) },
      limit: { words: 'Most entries of this page', schema: z.int().min(1).max(apiLimits.pageEntries) },
    },
  },
  {
    ...write,
    operationId: 'giveCommand',
    path: '/api/cases/{caseId}/commands',
    summary: 'Logs a run, a condition, a step, the handling of an alert: answered after its commit. Event times may lie in the past, back to the planning of the case. Sending the same command id again is harmless',
    request: 'CommandRequest',
    reply: 'CommittedReply',
    mayConflict: true,
  },
  { ...read, operationId: 'listScreens', path: '/api/cases/{caseId}/screens', summary: 'Theatre screens that are or were bound to the case', reply: 'ScreensReply' },
  { ...write, operationId: 'pairScreen', path: '/api/cases/{caseId}/screens', summary: 'Binds a theatre screen by its code: first asked, then confirmed after its two words were compared aloud', request: 'PairScreenRequest', reply: 'PairScreenReply', mayConflict: true },
  { ...write, method: 'delete', operationId: 'revokeScreen', path: '/api/cases/{caseId}/screens/{screenId}', summary: 'Takes a theatre screen off the case', request: null, reply: 'ScreensReply' },
  { ...read, operationId: 'readHealth', path: '/api/health', summary: 'Whether the product can do its work now', reply: 'HealthReply', isOpen: true },
];
