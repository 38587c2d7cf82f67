import type { CaseState } from '@/lib/case/case-state';
import { blindCause, blindCauses, type BlindCause } from '@/lib/case/course/blind-cause';
import { inEventOrder } from '@/lib/case/course/course-entries';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { evolve } from '@/lib/case/evolve';
import { initialState } from '@/lib/case/initial-state';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** A stretch of time in which nothing could be seen, and why. */
export interface BlindInterval {
  readonly fromMs: number;
  readonly toMs: number;
  readonly cause: BlindCause;
}

/** Blind time of one nerve or of the case: its stretches, and their sums by cause in ms. */
export interface BlindTime {
  readonly intervals: readonly BlindInterval[];
  readonly msByCause: Readonly<Partial<Record<BlindCause, number>>>;
  readonly blindMs: number;
}

/** Blind time inside the monitoring time of a case. */
export interface BlindTimes {
  /** From the first monitoring phase to take-down or closing, pauses included; ms since 1970, oldest first. */
  readonly monitored: readonly { readonly fromMs: number; readonly toMs: number }[];
  readonly monitoringMs: number;
  /** Some nerve at risk could not be seen. */
  readonly whole: BlindTime;
  readonly nerves: readonly { readonly nerveId: string; readonly time: BlindTime }[];
}

/** One instant from which on a cause holds for each nerve at risk. */
interface Stretch {
  readonly fromMs: number;
  readonly toMs: number;
  readonly causes: Readonly<Record<string, BlindCause | null>>;
}

/**
 * How long, and why, the nerves at risk could not be seen while the case was monitored.
 *
 * Method: the log in the order of its event times, folded by `evolve`; between two entries a cause can only change when
 * a run grows older than the freshness limit, so each such moment is looked at too. A late entry counts from its own
 * time: the sums say when the nerve was tested, not when the program heard of it. Without an end, the last entry ends it.
 *
 * @param entries readable entries in the order of the log; not modified
 * @returns stretches without overlap, sums in ms; all of it inside the monitoring time
 * @source product rule: stable must be earned; freshness custom
 * @accuracy exact to 1 ms; tests/lib/case/course/blind-times.test.ts, second by second by an oracle
 * @example
 * blindTimes(entries).whole.msByCause['not-tested-since-step']
 */
export function blindTimes(entries: readonly CaseEntry[]): BlindTimes {
  const ordered = inEventOrder(entries);
  const stretches: Stretch[] = [];
  let state: CaseState = initialState('record');
  let hasBegun = false;
  ordered.forEach((entry, index) => {
    state = evolve(state, entry);
    hasBegun = hasBegun || (state.phase === 'monitoring' && state.status === 'open');
    const next = ordered[index + 1];
    if (next === undefined || !hasBegun || state.phase === 'take-down' || state.status !== 'open') return;
    // Entries of the plan's own time may come before the case; nothing is monitored between them.
    const [fromMs, toMs] = [msOfMoment(entry.eventAt), msOfMoment(next.eventAt)];
    if (toMs > fromMs) stretches.push(...stretchesBetween(state, fromMs, toMs));
  });
  const nerveIds = [...new Set(stretches.flatMap(({ causes }) => Object.keys(causes)))];
  return {
    monitored: monitoredOf(stretches),
    monitoringMs: stretches.reduce((sum, { fromMs, toMs }) => sum + toMs - fromMs, 0),
    whole: timeOf(stretches, ({ causes }) => blindCauses.find((cause) => Object.values(causes).includes(cause)) ?? null),
    nerves: nerveIds.map((nerveId) => ({ nerveId, time: timeOf(stretches, ({ causes }) => causes[nerveId] ?? null) })),
  };
}

function stretchesBetween(state: CaseState, fromMs: number, toMs: number): readonly Stretch[] {
  const freshMs = state.plan.rules.freshnessMinutes * 60_000;
  const oldFrom = Object.values(state.paths)
    .map((record) => (record.compared === null ? 0 : msOfMoment(record.compared.at) + freshMs + 1))
    .filter((ms) => ms > fromMs && ms < toMs);
  const cuts = [fromMs, ...new Set(oldFrom.sort((first, second) => first - second)), toMs];
  const atRisk = state.plan.nerves.filter((nerve) => nerve.role === 'at-risk');
  return cuts.slice(0, -1).map((cutMs, index) => ({
    fromMs: cutMs,
    toMs: cuts[index + 1] ?? toMs,
    causes: Object.fromEntries(atRisk.map((nerve) => [nerve.id, blindCause(state, nerve, cutMs)])),
  }));
}

function timeOf(stretches: readonly Stretch[], causeOf: (stretch: Stretch) => BlindCause | null): BlindTime {
  const intervals: BlindInterval[] = [];
  const msByCause: Partial<Record<BlindCause, number>> = {};
  for (const stretch of stretches) {
    const cause = causeOf(stretch);
    if (cause === null) continue;
    const { fromMs, toMs } = stretch;
    msByCause[cause] = (msByCause[cause] ?? 0) + toMs - fromMs;
    const last = intervals.at(-1);
    if (last !== undefined && last.cause === cause && last.toMs === fromMs) intervals[intervals.length - 1] = { ...last, toMs };
    else intervals.push({ fromMs, toMs, cause });
  }
  return { intervals, msByCause, blindMs: Object.values(msByCause).reduce((sum, ms) => sum + ms, 0) };
}

function monitoredOf(stretches: readonly Stretch[]): BlindTimes['monitored'] {
  const spans: { fromMs: number; toMs: number }[] = [];
  for (const { fromMs, toMs } of stretches) {
    const last = spans.at(-1);
    if (last !== undefined && last.toMs === fromMs) last.toMs = toMs;
    else spans.push({ fromMs, toMs });
  }
  return spans;
}
