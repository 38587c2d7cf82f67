import type { Nerve, Path } from '@/lib/alert/nerve-plan';
import { smallestChange } from '@/lib/change/smallest-change';
import type { Baseline, CaseState, ComparedRecord, KeptStep, PathRecord } from '@/lib/case/case-state';
import { watchedOf, type Watched } from '@/lib/case/watched-of';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** Facts of one nerve at one moment, from its required paths. What is said of them is decided elsewhere. */
export interface NerveStatus {
  readonly nerve: Nerve;
  readonly siteCount: number;
  readonly baselineSiteCount: number;
  /** Sites whose required paths have a comparable run after the last risk step and inside the freshness limit. */
  readonly freshSiteCount: number;
  readonly untestedSiteIds: readonly string[];
  readonly lastRiskStep: KeptStep | null;
  readonly isEverySiteCompared: boolean;
  readonly newestComparedAt: string | null;
  readonly oldestComparedAt: string | null;
  readonly lowest: { readonly percentOfBaseline: number; readonly at: string; readonly siteId: string } | null;
  readonly highest: { readonly percentOfBaseline: number; readonly isBeyondNoise: boolean } | null;
  /** The worst that moved or is past a limit without an open notice or alert: nobody may call it calm. */
  readonly watched: Watched | null;
  readonly notCompared: PathRecord | null;
  readonly isNotMonitorable: boolean;
  readonly setAfterPercent: number | null;
}

/**
 * What is known of a nerve now.
 *
 * Method: a site counts as fresh only when every required path from it has a comparable run made after the last risk
 * step, with its amplitude read and not older than the freshness limit. Several channels of a site count once.
 *
 * @param state the case
 * @param nerve one of its nerves
 * @param nowMs ms since 1970, the server's clock
 * @returns facts, null where nothing is known
 * @source product rule: stable must be earned; freshness custom
 * @accuracy tests/lib/case/nerve-status.test.ts
 * @example
 * nerveStatus(state, ulnar, nowMs).freshSiteCount
 */
export function nerveStatus(state: CaseState, nerve: Nerve, nowMs: number): NerveStatus {
  const required = state.plan.paths.filter((path) => path.nerveId === nerve.id && path.isRequired);
  const siteIds = nerve.sites.map((site) => site.id).filter((id) => required.some((path) => path.siteId === id));
  const lastRiskStep = state.steps.filter((step) => step.isRisk).reduce<KeptStep | null>(later, null);
  const isFresh = (path: Path) => isFreshPath(state, path, lastRiskStep, nowMs);
  const untestedSiteIds = siteIds.filter((id) => !required.filter((path) => path.siteId === id).every(isFresh));
  const baselined = siteIds.filter((id) => required.filter((path) => path.siteId === id).every((path) => baselinesOf(state, path).length > 0));
  const records = required.map((path) => state.paths[path.id]).filter((record) => record !== undefined);
  const compared = records.map((record) => record.compared).filter((record) => record !== null);
  const times = compared.map((record) => record.at).sort();
  return {
    nerve,
    siteCount: siteIds.length,
    baselineSiteCount: baselined.length,
    freshSiteCount: siteIds.length - untestedSiteIds.length,
    untestedSiteIds,
    lastRiskStep,
    isEverySiteCompared: compared.length === required.length,
    newestComparedAt: times.at(-1) ?? null,
    oldestComparedAt: times[0] ?? null,
    lowest: lowestOf(state, required),
    highest: highestOf(compared),
    watched: watchedOf(state, nerve),
    notCompared: records.find((record) => record.lastNotCompared !== null) ?? null,
    isNotMonitorable: required.some((path) => isTooNoisy(state, newestBaseline(state, path))),
    setAfterPercent: setAfter(state, required),
  };
}

/** A run dated further ahead than this comes from a wrong clock and keeps nothing fresh. House rule. */
const clockToleranceMs = 5_000;

function later(latest: KeptStep | null, step: KeptStep): KeptStep {
  return latest === null || step.at >= latest.at ? step : latest;
}

function isFreshPath(state: CaseState, path: Path, step: KeptStep | null, nowMs: number): boolean {
  const compared = state.paths[path.id]?.compared ?? null;
  if (compared === null || compared.change.percentOfBaseline === null) return false;
  if (step !== null && compared.at <= step.at) return false;
  const ageMs = nowMs - msOfMoment(compared.at);
  return ageMs <= state.plan.rules.freshnessMinutes * 60_000 && ageMs >= -clockToleranceMs;
}

function baselinesOf(state: CaseState, path: Path) {
  return Object.values(state.baselines).filter((baseline) => baseline.pathId === path.id);
}

function newestBaseline(state: CaseState, path: Path): Baseline | null {
  return baselinesOf(state, path).reduce<Baseline | null>((newest, baseline) => (newest === null || baseline.seq > newest.seq ? baseline : newest), null);
}

function isTooNoisy(state: CaseState, baseline: Baseline | null): boolean {
  if (baseline === null) return false;
  const smallest = smallestChange({
    coefficientOfVariation: baseline.amplitudeScatter,
    baselineRunCount: baseline.runSeqs.length,
  });
  return smallest.smallestLossPercent >= state.plan.rules.amplitudeNoticeFallPercent;
}

function lowestOf(state: CaseState, required: readonly Path[]): NerveStatus['lowest'] {
  const rows = required.flatMap((path) => {
    const compared = state.paths[path.id]?.compared;
    const percentOfBaseline = compared?.change.percentOfBaseline ?? null;
    return compared && percentOfBaseline !== null ? [{ percentOfBaseline, at: compared.at, siteId: path.siteId }] : [];
  });
  return rows.reduce<NerveStatus['lowest']>(
    (lowest, row) => (lowest === null || row.percentOfBaseline < lowest.percentOfBaseline ? row : lowest),
    null,
  );
}

function highestOf(compared: readonly ComparedRecord[]): NerveStatus['highest'] {
  return compared.reduce<NerveStatus['highest']>((highest, { change }) => {
    if (change.percentOfBaseline === null || (highest !== null && change.percentOfBaseline <= highest.percentOfBaseline)) return highest;
    const gain = change.percentOfBaseline - 100;
    return { percentOfBaseline: change.percentOfBaseline, isBeyondNoise: gain > 2 * (change.amplitudeErrorPercent ?? 0) };
  }, null);
}

function setAfter(state: CaseState, required: readonly Path[]): number | null {
  const values = required
    .flatMap((path) => baselinesOf(state, path))
    .map((baseline) => baseline.setAfterPercent)
    .filter((value) => value !== null);
  return values.length === 0 ? null : Math.min(...values);
}
