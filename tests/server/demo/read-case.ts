import type { EntryBodies, EntryDraft, EntryKind } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { Scenario } from '@/server/demo/scenario';
import { playAtOnce } from '@/tests/server/demo/play-at-once';

/** An entry of a played case, with its number and the part of the story it stands in. */
export type ToldEntry = EntryDraft & { readonly seq: number; readonly heading: string; readonly at: string };

/** A measured response with everything that arithmetic needs, read from the log alone. */
export interface ToldResponse {
  readonly seq: number;
  readonly heading: string;
  readonly nerveId: string;
  readonly siteId: string;
  readonly channelId: string;
  readonly run: RunBody;
  readonly onsetMs: number;
  readonly amplitudeUv: number;
  /** Mean of the runs of the baseline in force; null before there is one. */
  readonly baseline: { readonly onsetMs: number; readonly amplitudeUv: number } | null;
  /** Place of each site by the newest measuring before the run; null while distances are void. */
  readonly placesMm: ReadonlyMap<string, number | null>;
}

/** Everything that a case wrote, in order. The first entry is the planning. */
export function toldEntries(scenario: Scenario): readonly ToldEntry[] {
  let seq = 1;
  return playAtOnce(scenario).acts.flatMap(({ drafts, heading, at }) => drafts.map((draft) => ({ ...draft, seq: (seq += 1), heading, at })));
}

/** The entries of one kind. */
export function ofKind<K extends EntryKind>(entries: readonly ToldEntry[], kind: K): readonly { seq: number; heading: string; at: string; body: EntryBodies[K] }[] {
  return entries.filter((entry) => entry.kind === kind) as unknown as { seq: number; heading: string; at: string; body: EntryBodies[K] }[];
}

/** Every measured response, its baseline and its place worked out here, not taken from the judge. */
export function toldResponses(plan: CasePlan, entries: readonly ToldEntry[]): readonly ToldResponse[] {
  const places = new Map<string, number | null>(plan.nerves.flatMap((nerve) => nerve.sites.map((site) => [site.id, site.positionMm])));
  const baselines = new Map<string, { onsetMs: number; amplitudeUv: number }>();
  const responses: ToldResponse[] = [];
  for (const entry of entries) {
    if (entry.kind === 'step.logged' && entry.body.voidsDistances) for (const siteId of places.keys()) places.set(siteId, null);
    if (entry.kind === 'distances.measured') for (const { siteId, positionMm } of entry.body.positions) places.set(siteId, positionMm);
    if (entry.kind === 'baseline.accepted') for (const [key, means] of meansOf(responses, entry.body)) baselines.set(key, means);
    if (entry.kind === 'run.logged') responses.push(...responsesOf(plan, entry, places, baselines));
  }
  return responses;
}

function responsesOf(plan: CasePlan, entry: ToldEntry & { kind: 'run.logged' }, places: ReadonlyMap<string, number | null>, baselines: ReadonlyMap<string, { onsetMs: number; amplitudeUv: number }>): ToldResponse[] {
  const run = entry.body;
  const nerveId = plan.nerves.find((nerve) => nerve.sites.some((site) => site.id === run.siteId))!.id;
  return run.readings.flatMap(({ channelId, reading }) => {
    if (reading.kind !== 'measured') return [];
    const baseline = baselines.get(keyOf(run, channelId)) ?? null;
    return [{ seq: entry.seq, heading: entry.heading, nerveId, siteId: run.siteId, channelId, run, onsetMs: reading.onsetMs!, amplitudeUv: reading.amplitudeUv!, baseline, placesMm: new Map(places) }];
  });
}

function keyOf(run: Pick<RunBody, 'siteId' | 'electrodeId' | 'family'>, channelId: string): string {
  return `${run.siteId}/${channelId} ${run.electrodeId} ${run.family}`;
}

function meansOf(responses: readonly ToldResponse[], { runSeqs }: EntryBodies['baseline.accepted']): readonly (readonly [string, { onsetMs: number; amplitudeUv: number }])[] {
  const used = responses.filter((response) => runSeqs.includes(response.seq));
  return [...new Set(used.map(({ run, channelId }) => keyOf(run, channelId)))].map((key) => {
    const group = used.filter(({ run, channelId }) => keyOf(run, channelId) === key);
    return [key, { onsetMs: mean(group.map((one) => one.onsetMs)), amplitudeUv: mean(group.map((one) => one.amplitudeUv)) }];
  });
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** The response in percent of its baseline. */
export function percentOf(response: ToldResponse): number {
  return (100 * response.amplitudeUv) / response.baseline!.amplitudeUv;
}
