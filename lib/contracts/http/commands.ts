import { z } from 'zod';

import type { CaseCommand } from '@/lib/case/commands';
import { planSchema } from '@/lib/contracts/http/plan-schema';
import { quantity } from '@/lib/contracts/quantity';
import { alertSlug, boundedText, moment, slug, uuid } from '@/lib/contracts/text-schemas';

const text = (max: number) => boundedText(max).nullable();
const family = z.enum(['pre-position', 'through-skin', 'exposed']);
const side = z.enum(['left', 'right']);
const entrySeq = z.int().min(1).max(10_000_000);

const reading = z.discriminatedUnion('kind', [
  z
    .strictObject({
      kind: z.literal('measured'),
      onsetMs: quantity('onsetMs').nullable(),
      amplitudeUv: quantity('amplitudeUv').nullable(),
      durationMs: quantity('durationMs').nullable(),
    })
    .refine((value) => value.onsetMs !== null || value.amplitudeUv !== null, 'Nothing read: onset or amplitude is needed, or "not read"'),
  z.strictObject({ kind: z.literal('absent'), highestIntensityMa: quantity('intensityMa') }),
  z.strictObject({
    kind: z.literal('unusable'),
    reason: z.enum(['artefact', 'movement', 'cautery', 'wet-field', 'poor-contact', 'off-scale']),
  }),
  z.strictObject({ kind: z.literal('not-read') }),
]);

/** One stimulation with its responses. */
export const runSchema = z.strictObject({
  siteId: slug,
  electrodeId: slug,
  family,
  purpose: z.enum(['baseline', 'check', 'closing']),
  intensityMa: quantity('intensityMa'),
  pulseWidthUs: quantity('pulseWidthUs'),
  isSupramaximal: z.boolean(),
  maximalResponseMa: quantity('intensityMa').nullable(),
  readings: z
    .array(z.strictObject({ channelId: slug, reading }))
    .min(1)
    .max(16)
    .refine((list) => new Set(list.map((row) => row.channelId)).size === list.length, 'Channel twice: one reading for each channel is allowed'),
  note: text(300),
});

const condition = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('train-of-four'), count: quantity('trainOfFourCount').int(), ratio: quantity('trainOfFourRatio').nullable() }),
  z.strictObject({ kind: z.literal('tourniquet'), isUp: z.boolean(), pressureMmHg: quantity('cuffPressureMmHg').nullable() }),
  z.strictObject({ kind: z.literal('limb-temperature'), temperatureC: quantity('temperatureC') }),
  z.strictObject({ kind: z.literal('core-temperature'), temperatureC: quantity('temperatureC') }),
  z.strictObject({ kind: z.literal('mean-pressure'), pressureMmHg: quantity('meanPressureMmHg') }),
  z.strictObject({ kind: z.literal('relaxant'), text: boundedText(120) }),
  z.strictObject({ kind: z.literal('local-anaesthetic'), text: boundedText(120) }),
  z.strictObject({ kind: z.literal('other'), text: boundedText(200) }),
]);

const examination = z
  .strictObject({
    when: z.enum(['before-operation', 'after-operation']),
    examinedBy: boundedText(60),
    muscles: z.array(z.strictObject({ muscle: boundedText(60), grade: z.int('Not a grade: 0 to 5 is allowed').min(0, 'Not a grade: 0 to 5 is allowed').max(5, 'Not a grade: 0 to 5 is allowed') })).max(24),
    sensation: z.array(z.strictObject({ area: boundedText(60), finding: z.enum(['normal', 'reduced', 'absent', 'not-testable']) })).max(24),
    text: text(500),
  })
  .refine((value) => value.muscles.length + value.sensation.length > 0 || value.text !== null, 'Nothing examined: a muscle, an area of skin or a text is needed');

/** Commands a person may give to a case that exists. Planning and timers have their own doors. */
export const personCommandSchema = z.discriminatedUnion('name', [
  z.strictObject({ name: z.literal('revise-plan'), plan: planSchema }),
  z.strictObject({ name: z.literal('open-case'), clockOffsetMs: z.number().min(-86_400_000).max(86_400_000).nullable() }),
  z.strictObject({ name: z.literal('confirm-timeout'), side, text: text(200) }),
  z.strictObject({ name: z.literal('change-phase'), phase: z.enum(['set-up', 'baseline', 'monitoring', 'paused', 'take-down']), reason: text(200) }),
  z.strictObject({ name: z.literal('log-run'), run: runSchema }),
  z.strictObject({ name: z.literal('correct-run'), runSeq: entrySeq, run: runSchema.nullable(), reason: boundedText(200) }),
  z.strictObject({ name: z.literal('accept-baseline'), family, electrodeId: slug, reason: text(200) }),
  z.strictObject({ name: z.literal('log-condition'), condition, reportedBy: text(60) }),
  z.strictObject({ name: z.literal('log-step'), stepId: slug, label: text(60) }),
  z.strictObject({
    name: z.literal('measure-distances'),
    nerveId: slug,
    positions: z.array(z.strictObject({ siteId: slug, positionMm: quantity('positionMm') })).min(1).max(12),
    reason: text(200),
  }),
  z.strictObject({ name: z.literal('tell-alert'), alertId: alertSlug, whom: boundedText(60), how: boundedText(40), words: boundedText(300) }),
  z.strictObject({ name: z.literal('read-back-alert'), alertId: alertSlug, words: text(300) }),
  z.strictObject({ name: z.literal('act-on-alert'), alertId: alertSlug, action: boundedText(200) }),
  z.strictObject({
    name: z.literal('end-alert'),
    alertId: alertSlug,
    outcome: z.enum(['full', 'partial', 'none']),
    cause: z.enum(['surgical', 'position', 'tourniquet', 'physiological', 'anaesthetic', 'technical', 'undetermined']),
    text: text(300),
  }),
  z.strictObject({ name: z.literal('send-message'), text: boundedText(500) }),
  z.strictObject({ name: z.literal('give-advice'), text: boundedText(500) }),
  z.strictObject({ name: z.literal('confirm-advice'), adviceSeq: entrySeq, text: text(300) }),
  z.strictObject({ name: z.literal('confirm-baseline'), baselineSeq: entrySeq, text: text(300) }),
  z.strictObject({ name: z.literal('record-examination'), examination }),
  z.strictObject({ name: z.literal('close-case'), text: text(300) }),
]) satisfies z.ZodType<CaseCommand>;

/** A command in its envelope: a repeat of the same id is harmless. */
export const commandRequestSchema = z.strictObject({
  commandId: uuid,
  eventAt: moment,
  command: personCommandSchema,
});

/** Planning a case: its identity stays out of the log, which holds only a salted commitment. */
export const planCaseRequestSchema = z.strictObject({
  commandId: uuid,
  eventAt: moment,
  plan: planSchema,
  /** Where it is planned; needed only by a person of several hospitals whose theatres share a name. */
  hospitalId: uuid.optional(),
  /** Who takes part besides the planner: they see the case from then on. */
  team: z.array(z.strictObject({ personId: uuid, role: z.enum(['neurophysiologist', 'surgeon', 'physician']) })).max(12).optional(),
  identity: z.strictObject({ patientLabel: boundedText(120), recordNumber: boundedText(60) }),
});

/** A command request as it travels. */
export type CommandRequest = z.infer<typeof commandRequestSchema>;
/** A planning request as it travels. */
export type PlanCaseRequest = z.infer<typeof planCaseRequestSchema>;
/** A command a person may give. */
export type PersonCommand = z.infer<typeof personCommandSchema>;
