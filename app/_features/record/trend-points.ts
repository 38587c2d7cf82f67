import type { CasePlan } from '@/lib/case/plan';
import { upcast } from '@/lib/case/upcast';
import type { WireEntry } from '@/lib/contracts/http/replies';

/** One compared run of a path: % of baseline at a time. */
export interface TrendPoint {
  readonly atMs: number;
  readonly percent: number;
  readonly isAlert: boolean;
}

/** The required paths of one nerve over time. */
export interface NerveTrend {
  readonly nerveId: string;
  readonly nerveName: string;
  readonly lines: readonly { readonly pathId: string; readonly name: string; readonly points: readonly TrendPoint[] }[];
}

/** A risk step on the time axis. */
export interface TrendStep {
  readonly atMs: number;
  readonly label: string;
}

/** % of baseline over time for each required path, as judged when it was logged; withdrawn runs are left out. */
export function nerveTrends(entries: readonly WireEntry[], plan: CasePlan): readonly NerveTrend[] {
  const known = entries.map(upcast).filter((entry) => entry !== null);
  const runTimes = new Map<number, number>();
  const judged = new Map<number, ReadonlyMap<string, number>>();
  const alertRuns = new Set<number>();
  for (const entry of known) {
    if (entry.kind === 'run.logged') runTimes.set(entry.seq, Date.parse(entry.eventAt));
    if (entry.kind === 'run.corrected' && entry.body.run === null) judged.delete(entry.body.runSeq);
    if (entry.kind === 'alert.raised' || entry.kind === 'alert.worsened') alertRuns.add(entry.body.runSeq);
    if (entry.kind !== 'run.judged') continue;
    const percents = entry.body.paths.flatMap((path) =>
      path.kind === 'compared' && path.change.percentOfBaseline !== null ? [[path.pathId, path.change.percentOfBaseline] as const] : [],
    );
    judged.set(entry.body.runSeq, new Map(percents));
  }
  return plan.nerves.flatMap((nerve) => {
    const lines = plan.paths
      .filter((path) => path.nerveId === nerve.id && path.isRequired)
      .map((path) => ({ pathId: path.id, name: lineName(plan, path.siteId, path.channelId), points: pointsOf(path.id, judged, runTimes, alertRuns) }))
      .filter((line) => line.points.length > 0);
    return lines.length === 0 ? [] : [{ nerveId: nerve.id, nerveName: nerve.name, lines }];
  });
}

/** The risk steps of the log. */
export function trendSteps(entries: readonly WireEntry[]): readonly TrendStep[] {
  return entries
    .filter((entry) => entry.kind === 'step.logged' && entry.body?.['isRisk'] === true)
    .map((entry) => ({ atMs: Date.parse(entry.eventAt), label: String(entry.body?.['since'] ?? '') }));
}

function pointsOf(pathId: string, judged: ReadonlyMap<number, ReadonlyMap<string, number>>, runTimes: ReadonlyMap<number, number>, alertRuns: ReadonlySet<number>): readonly TrendPoint[] {
  return [...judged]
    .flatMap(([seq, percents]) => {
      const percent = percents.get(pathId);
      const atMs = runTimes.get(seq);
      return percent === undefined || atMs === undefined ? [] : [{ atMs, percent, isAlert: alertRuns.has(seq) }];
    })
    .sort((first, second) => first.atMs - second.atMs);
}

function lineName(plan: CasePlan, siteId: string, channelId: string): string {
  const site = plan.nerves.flatMap((nerve) => nerve.sites).find((candidate) => candidate.id === siteId)?.name ?? siteId;
  const channel = plan.channels.find((candidate) => candidate.id === channelId)?.name ?? channelId;
  return `${site}, ${channel}`;
}
