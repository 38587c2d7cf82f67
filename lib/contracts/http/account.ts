import { z } from 'zod';

/** Password and second factor, given again before something that is signed. */
export const reauthenticateRequestSchema = z.strictObject({ password: z.string().min(1).max(256), code: z.string().min(1).max(10) });

/** Password and code were given again. */
export const reauthenticateReplySchema = z.strictObject({ reauthenticatedAt: z.string() });

/** Demo people with what is needed to sign in as one of them. Only in demo mode, only on loopback. */
export const demoPeopleReplySchema = z.strictObject({
  people: z.array(
    z.strictObject({
      email: z.string(),
      displayName: z.string(),
      hospitalName: z.string(),
      password: z.string(),
      code: z.string(),
      codeSecondsLeft: z.number(),
      roles: z.array(z.string()),
    }),
  ),
});

/** Walls that are or were bound to a case. */
export const screensReplySchema = z.strictObject({
  screens: z.array(
    z.strictObject({
      screenId: z.string(),
      words: z.string(),
      pairedAt: z.string(),
      lastSeenAt: z.string().nullable(),
      endedAt: z.string().nullable(),
      isConnected: z.boolean(),
    }),
  ),
});

/** Whether the product can do its work now. */
export const healthReplySchema = z.strictObject({
  isDatabaseAnswering: z.boolean(),
  eventLoopDelayP99Ms: z.number(),
  checkedAt: z.string().nullable(),
});

export type ReauthenticateReply = z.infer<typeof reauthenticateReplySchema>;
export type DemoPeopleReply = z.infer<typeof demoPeopleReplySchema>;
/** One invented person with what is needed to sign in as them. */
export type DemoPerson = DemoPeopleReply['people'][number];
export type ScreensReply = z.infer<typeof screensReplySchema>;
/** One wall that is or was bound to the case. */
export type ScreenLine = ScreensReply['screens'][number];
export type HealthReply = z.infer<typeof healthReplySchema>;
