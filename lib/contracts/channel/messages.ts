import { z } from 'zod';

import { commandReplySchema, wireEntrySchema } from '@/lib/contracts/http/replies';
import { commandRequestSchema } from '@/lib/contracts/http/commands';
import { alertSlug, moment, uuid } from '@/lib/contracts/text-schemas';

/*
 * The live channel. A viewer sends `follow` with the last number it holds. The answer carries the next entries and the
 * head; with `hasMore` the viewer follows again from there. Later entries arrive as `entries`, each batch dense. A viewer
 * applies an entry only if its number is last + 1 and its previousHash is the hash it holds; otherwise it follows again.
 * Following and following again are one call. `pulse` comes once a second and only after a query of the database was
 * answered; `checkedAt` is the database's own time of that answer. Without a pulse for 3 s a screen is not live.
 * A wall receives every number, hash and previousHash, and bodies only of the kinds in `channel/wall-entry`.
 */

/** Viewer to server: give me what comes after this number. */
export const followRequestSchema = z.strictObject({
  contractVersion: z.int(),
  caseId: uuid,
  after: z.int().min(0),
});

/** Server's answer to `follow`. */
export const followReplySchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('entries'),
    entries: z.array(wireEntrySchema),
    headSeq: z.int(),
    headHash: z.string(),
    hasMore: z.boolean(),
  }),
  z.strictObject({ kind: z.literal('refused'), code: z.enum(['not-found', 'newer-version', 'bad-request', 'not-saved']), message: z.string() }),
]);

/** Desk to server: a command, with the case it is for. */
export const commandMessageSchema = commandRequestSchema.extend({ caseId: uuid });

/** Server's answer to a command over the channel; the same as over HTTP. */
export const commandMessageReplySchema = commandReplySchema;

/** Server to viewer: entries just committed. */
export const entriesMessageSchema = z.strictObject({ caseId: z.string(), entries: z.array(wireEntrySchema) });

/** Server to viewer, once a second: the heads of all its cases, and when the database was last asked. */
export const pulseMessageSchema = z.strictObject({
  checkedAt: z.string(),
  cases: z.array(
    z.strictObject({
      caseId: z.string(),
      headSeq: z.int(),
      headHash: z.string(),
      deskConnected: z.boolean(),
      deskSince: z.string().nullable(),
      wallsConnected: z.int(),
      /** People who have the case open now, in any process; always empty for a wall. */
      peopleConnected: z.array(z.strictObject({ personId: z.string(), role: z.string(), displayName: z.string(), since: z.string() })),
    }),
  ),
});

/** Server to viewer: this viewer may no longer follow. */
export const endedMessageSchema = z.strictObject({ caseId: z.string(), reason: z.enum(['revoked', 'signed-out', 'case-closed']) });

/** Wall to server: an alert or a state was painted. */
export const paintedMessageSchema = z.strictObject({ caseId: uuid, seq: z.int().min(1), alertId: alertSlug.nullable(), paintedAt: moment });

export type FollowReply = z.infer<typeof followReplySchema>;
export type EntriesMessage = z.infer<typeof entriesMessageSchema>;
export type PulseMessage = z.infer<typeof pulseMessageSchema>;
export type EndedMessage = z.infer<typeof endedMessageSchema>;
