import { z } from 'zod';

/** A committed entry as it travels: the hashed fields and the hash. `body` is null where a wall may not read it. */
export const wireEntrySchema = z.strictObject({
  format: z.literal(1),
  hospitalId: z.string(),
  caseId: z.string(),
  seq: z.int(),
  previousHash: z.string(),
  hash: z.string(),
  kind: z.string(),
  kindVersion: z.int(),
  commandId: z.string(),
  commandPart: z.int(),
  commandDigest: z.string(),
  eventAt: z.string(),
  recordedAt: z.string(),
  author: z.strictObject({ id: z.string(), role: z.string(), displayName: z.string() }),
  body: z.record(z.string(), z.unknown()).nullable(),
});

/** Answer to a command. */
export const commandReplySchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('committed'), caseId: z.string(), entries: z.array(wireEntrySchema) }),
  z.strictObject({ kind: z.literal('refused'), code: z.string(), message: z.string(), field: z.string().nullable() }),
]);

/** A page of a case's log, oldest first. */
export const entriesReplySchema = z.strictObject({
  entries: z.array(wireEntrySchema),
  headSeq: z.int(),
  headHash: z.string(),
  hasMore: z.boolean(),
});

/** One line of the list of cases. */
export const caseLineSchema = z.strictObject({
  caseId: z.string(),
  reference: z.string(),
  title: z.string(),
  procedure: z.string(),
  side: z.enum(['left', 'right']),
  theatre: z.string(),
  status: z.enum(['planned', 'open', 'closed']),
  plannedAt: z.string(),
  lastEntryAt: z.string(),
  lastSeq: z.int(),
  hospitalName: z.string(),
  timeZone: z.string(),
});

/** The cases a person may see: the open ones and then the newest, cut at a number; `total` says how many there are. */
export const caseListReplySchema = z.strictObject({ cases: z.array(caseLineSchema), total: z.int().min(0) });

/** The head of one case for its page: what is not in the log, for people who may read it. */
export const caseHeadReplySchema = z.strictObject({
  caseId: z.string(),
  hospitalId: z.string(),
  hospitalName: z.string(),
  timeZone: z.string(),
  reference: z.string(),
  role: z.string(),
  mayWrite: z.boolean(),
  patientLabel: z.string().nullable(),
  recordNumber: z.string().nullable(),
});

/** Who is signed in. */
export const sessionReplySchema = z.strictObject({
  personId: z.string(),
  displayName: z.string(),
  email: z.string(),
  isDemo: z.boolean(),
  memberships: z.array(z.strictObject({ hospitalId: z.string(), hospitalName: z.string(), role: z.string(), timeZone: z.string() })),
  theatres: z.array(z.strictObject({ hospitalId: z.string(), theatreId: z.string(), name: z.string() })),
});

/** People of one hospital who may take part in a case, to choose a team from. */
export const peopleReplySchema = z.strictObject({
  people: z.array(z.strictObject({ hospitalId: z.string(), personId: z.string(), displayName: z.string(), role: z.enum(['neurophysiologist', 'surgeon', 'physician']) })),
});

/** A wall that asks to be paired: shown on the wall and at the desk, read aloud. */
export const screenReplySchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('waiting'), screenId: z.string(), code: z.string(), words: z.string() }),
  z.strictObject({ kind: z.literal('paired'), screenId: z.string(), caseId: z.string(), timeZone: z.string() }),
  z.strictObject({ kind: z.literal('ended'), screenId: z.string(), reason: z.enum(['case-closed', 'revoked']), at: z.string(), timeZone: z.string() }),
]);

/** Pairing at the desk: the code as typed. First asked, then confirmed with the words. */
export const pairScreenRequestSchema = z.strictObject({
  code: z.string().regex(/^[A-Z0-9]{6}$/, 'Not a code: six letters or digits as the wall shows them'),
  isConfirmed: z.boolean(),
});

/** Answer to pairing: the two words to compare, and whether the wall is now bound to the case. */
export const pairScreenReplySchema = z.strictObject({ screenId: z.string(), words: z.string(), isPaired: z.boolean() });

/** Every failure over HTTP: a sentence for the person who meets it. */
export const failureReplySchema = z.strictObject({
  kind: z.enum(['bad-request', 'not-signed-in', 'not-found', 'refused', 'too-many', 'not-saved']),
  code: z.string(),
  message: z.string(),
  field: z.string().nullable(),
});

export type WireEntry = z.infer<typeof wireEntrySchema>;
export type CommandReply = z.infer<typeof commandReplySchema>;
export type EntriesReply = z.infer<typeof entriesReplySchema>;
export type CaseLine = z.infer<typeof caseLineSchema>;
export type CaseListReply = z.infer<typeof caseListReplySchema>;
export type CaseHeadReply = z.infer<typeof caseHeadReplySchema>;
export type SessionReply = z.infer<typeof sessionReplySchema>;
export type PeopleReply = z.infer<typeof peopleReplySchema>;
export type ScreenReply = z.infer<typeof screenReplySchema>;
export type PairScreenRequest = z.infer<typeof pairScreenRequestSchema>;
export type PairScreenReply = z.infer<typeof pairScreenReplySchema>;
export type FailureReply = z.infer<typeof failureReplySchema>;
