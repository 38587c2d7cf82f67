import type { AlertEvidence, Condition, EntryBodies, EntryKind } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { WireEntry } from '@/lib/contracts/http/replies';

/** Names of one object's fields: `true` lets a field through as it is, a list of its own cuts it as well. */
interface Allowed {
  readonly [field: string]: true | Allowed;
}

/** The same, held to the fields that the body really has. */
type AllowedOf<Body> = { readonly [Field in keyof Body]?: true | Allowed };
type ConditionField = Condition extends infer One ? (One extends Condition ? keyof One : never) : never;

const plan: AllowedOf<CasePlan> = {
  templateId: true, procedure: true, title: true, side: true, theatre: true, nerves: true, channels: true, paths: true, steps: true,
  rules: true, electrodes: true, defaultPulseWidthUs: true, defaultFamily: true, closingSiteId: true,
};

const run: AllowedOf<RunBody> = {
  siteId: true, electrodeId: true, family: true, purpose: true, intensityMa: true, pulseWidthUs: true, isSupramaximal: true,
  maximalResponseMa: true, readings: true,
};

/** What was measured; the words that were typed stay at the desk. */
const condition: { readonly [Field in ConditionField]?: true } = { kind: true, count: true, ratio: true, isUp: true, pressureMmHg: true, temperatureC: true };

const evidence: AllowedOf<AlertEvidence> = {
  alertId: true, nerveId: true, runSeq: true, pathIds: true, finding: true, worstPercentOfBaseline: true, location: true,
  lastGoodAt: true, firstBadAt: true, stepsBetween: true, judgeVersion: true,
};

/** Fields of each body that a wall may read. A kind that is not listed travels as number and hashes only. */
const wallFields: { readonly [K in EntryKind]?: AllowedOf<EntryBodies[K]> } = {
  'case.planned': { plan },
  'plan.revised': { plan },
  'case.opened': { clockOffsetMs: true },
  'timeout.confirmed': { side: true },
  'phase.changed': { phase: true, reason: true },
  'run.logged': run,
  'run.judged': { runSeq: true, judgeVersion: true, paths: true, segments: true },
  'run.corrected': { runSeq: true, run },
  'baseline.accepted': {
    family: true, electrodeId: true, runSeqs: true, pathIds: true, isOpening: true, isProvisional: true, setAfterPercent: true, values: true,
  },
  'condition.logged': { condition },
  'step.logged': { stepId: true, label: true, since: true, isRisk: true, voidsDistances: true },
  'distances.measured': { nerveId: true, positions: true },
  'notice.raised': { ...evidence, repeatDueAt: true },
  'notice.settled': { alertId: true, runSeq: true },
  'alert.raised': { ...evidence, isRepeated: true },
  'alert.worsened': { ...evidence, worsening: true },
  'alert.located': { alertId: true, runSeq: true, location: true },
  'alert.recovered': { alertId: true, runSeq: true, percentOfBaseline: true },
  'alert.withdrawn': { alertId: true, runSeq: true },
  'alert.told': { alertId: true },
  'alert.read-back': { alertId: true },
  'alert.acted': { alertId: true },
  'alert.ended': { alertId: true, outcome: true, cause: true },
  'case.closed': {},
};

/**
 * The entry as a wall may read it: number, times and hashes always; author by role only; body cut to the allow-list.
 * @param entry a committed entry as it travels to people; not modified
 * @returns a new entry; `body` is null when the kind is not for walls
 * @source house rule: no identity beyond theatre, procedure and side on the wall
 */
export function wallEntry(entry: WireEntry): WireEntry {
  const fields: Allowed | undefined = wallFields[entry.kind as EntryKind];
  return {
    ...entry,
    author: { id: '', role: entry.author.role, displayName: '' },
    commandDigest: '',
    body: fields === undefined || entry.body === null ? null : cut(entry.body, fields),
  };
}

function cut(body: object, fields: Allowed): Record<string, unknown> {
  const kept = Object.entries(body).filter(([field]) => Object.hasOwn(fields, field));
  return Object.fromEntries(kept.map(([field, value]: [string, unknown]) => [field, cutValue(value, fields[field])]));
}

function cutValue(value: unknown, fields: true | Allowed | undefined): unknown {
  return fields === true || fields === undefined || typeof value !== 'object' || value === null ? value : cut(value, fields);
}
