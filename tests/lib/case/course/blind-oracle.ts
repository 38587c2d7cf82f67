import type { CaseEntry } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';

interface SeenPath {
  lastAt: string;
  lastReason: string | null;
  comparedAt: string | null;
  isAmplitudeRead: boolean;
  isLost: boolean;
}

/**
 * Blindness of one nerve at one second, told from the entries by rules of its own: nothing of the product but the shapes
 * of the entries. Slow on purpose: it reads the log anew for every second.
 */
export function oracleCause(entries: readonly CaseEntry[], nerveId: string, nowMs: number): string | null {
  const past = entries
    .filter((entry) => entry.kind === 'case.planned' || Date.parse(entry.eventAt) <= nowMs)
    .sort((one, other) => (one.kind === 'case.planned' ? -1 : other.kind === 'case.planned' ? 1 : Date.parse(one.eventAt) - Date.parse(other.eventAt) || one.seq - other.seq));
  let plan: CasePlan | null = null;
  let phase = 'set-up';
  let riskAt: string | null = null;
  const baselines = new Map<string, { scatter: number; runs: number }>();
  const paths = new Map<string, SeenPath>();
  const runs = new Map<number, { at: string; readings: readonly { channelId: string; reading: { kind: string } }[]; siteId: string }>();
  const openPaths = new Map<string, readonly string[]>();
  for (const entry of past) {
    if (entry.kind === 'case.planned' || entry.kind === 'plan.revised') plan = entry.body.plan;
    if (entry.kind === 'phase.changed') phase = entry.body.phase;
    if (entry.kind === 'step.logged' && entry.body.isRisk && (riskAt === null || entry.eventAt >= riskAt)) riskAt = entry.eventAt;
    if (entry.kind === 'notice.raised' || entry.kind === 'alert.raised' || entry.kind === 'alert.worsened') openPaths.set(entry.body.alertId, entry.body.pathIds);
    if (entry.kind === 'alert.ended' || entry.kind === 'notice.settled' || entry.kind === 'alert.withdrawn') openPaths.delete(entry.body.alertId);
    if (entry.kind === 'baseline.accepted') {
      for (const value of entry.body.values) {
        baselines.set(value.pathId, { scatter: value.amplitudeScatter, runs: value.runSeqs.length });
        const isOpen = [...openPaths.values()].some((ids) => ids.includes(value.pathId));
        const seen = paths.get(value.pathId);
        if (seen !== undefined && !isOpen) paths.set(value.pathId, { ...seen, lastReason: null, comparedAt: null, isLost: false });
      }
    }
    if (entry.kind === 'run.logged') runs.set(entry.seq, { at: entry.eventAt, readings: entry.body.readings, siteId: entry.body.siteId });
    if (entry.kind === 'run.judged') {
      const run = runs.get(entry.body.runSeq);
      if (run === undefined) continue;
      for (const path of entry.body.paths) {
        if (path.kind === 'not-compared' && path.reason === 'not-read') continue;
        const before = paths.get(path.pathId);
        const now: SeenPath = { lastAt: run.at, lastReason: null, comparedAt: before?.comparedAt ?? null, isAmplitudeRead: before?.isAmplitudeRead ?? false, isLost: before?.isLost ?? false };
        if (path.kind === 'compared') {
          now.comparedAt = run.at;
          now.isAmplitudeRead = path.change.percentOfBaseline !== null;
          now.isLost = path.findings.some((finding) => finding.kind === 'response-lost');
        } else now.lastReason = path.reason;
        paths.set(path.pathId, now);
      }
    }
  }
  if (plan === null) throw new Error('The log has no plan');
  const ofRole = (role: string) => {
    const ids = plan.nerves.filter((nerve) => nerve.role === role).map((nerve) => nerve.id);
    return plan.paths.filter((path) => ids.includes(path.nerveId)).map((path) => paths.get(path.id)).filter((path) => path !== undefined && path.comparedAt !== null) as SeenPath[];
  };
  if (ofRole('at-risk').length > 0 && ofRole('control').length > 0 && [...ofRole('at-risk'), ...ofRole('control')].every((path) => path.isLost)) return 'cannot-be-judged';
  if (phase === 'paused') return 'paused';
  if (phase !== 'monitoring') return 'other-phase';
  const required = plan.paths.filter((path) => path.nerveId === nerveId && path.isRequired);
  if (required.some((path) => !baselines.has(path.id))) return 'no-baseline';
  if (required.some((path) => (paths.get(path.id)?.lastReason ?? null) !== null)) return 'not-compared';
  const limit = plan.rules.amplitudeNoticeFallPercent;
  if (required.some((path) => { const one = baselines.get(path.id)!; return Math.round(10 * 200 * one.scatter * Math.sqrt(1 + 1 / one.runs)) / 10 >= limit; })) return 'not-monitorable';
  const times = required.map((path) => paths.get(path.id)?.comparedAt ?? null);
  const isFresh = required.every((path, index) => {
    const at = times[index] ?? null;
    if (at === null || !paths.get(path.id)!.isAmplitudeRead) return false;
    return (riskAt === null || at > riskAt) && nowMs - Date.parse(at) <= plan.rules.freshnessMinutes * 60_000;
  });
  if (isFresh) return null;
  const oldest = times.filter((at) => at !== null).sort()[0] ?? null;
  return riskAt !== null && (oldest === null || oldest <= riskAt) ? 'not-tested-since-step' : 'not-tested-in-time';
}
