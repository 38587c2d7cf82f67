import type { CaseState } from '@/lib/case/case-state';
import { nerveStatus } from '@/lib/case/nerve-status';
import { durationWords } from '@/lib/text/format';
import { siteName } from '@/lib/text/site-name';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** One thing that has not been tested or measured, and since when or how soon. */
export interface DueTask {
  readonly key: string;
  readonly label: string;
  readonly when: string;
  readonly isNow: boolean;
}

/** What is due, the most needed first: repeats, the next site that locates, train-of-four, sites since the last risk step, the control. */
export function dueTasks(state: CaseState, nowMs: number): readonly DueTask[] {
  return [...repeats(state, nowMs), ...locating(state), ...distances(state), ...train(state, nowMs), ...untested(state, nowMs), ...controls(state)];
}

function repeats(state: CaseState, nowMs: number): DueTask[] {
  return Object.values(state.incidents).flatMap((incident) => {
    if (incident.level !== 'notice' || incident.repeatDueAt === null) return [];
    const first = incident.pathIds[0] ?? '';
    const leftMs = msOfMoment(incident.repeatDueAt) - nowMs;
    const label = `Repeat at ${siteName(state.plan, first.slice(0, first.indexOf('/')))}`;
    return [{ key: `repeat-${incident.alertId}`, label, when: leftMs > 0 ? `in ${Math.ceil(leftMs / 1000)}\u00a0s` : 'now', isNow: true }];
  });
}

function locating(state: CaseState): DueTask[] {
  return Object.values(state.incidents).flatMap(({ location, alertId }) =>
    location.kind === 'not-known' && location.nextSiteId !== null
      ? [{ key: `locate-${alertId}`, label: `Test ${siteName(state.plan, location.nextSiteId)} to locate`, when: 'best next', isNow: false }]
      : [],
  );
}

function distances(state: CaseState): DueTask[] {
  return Object.keys(state.distancesVoidSince).map((nerveId) => ({
    key: `distances-${nerveId}`,
    label: `Measure distances, ${state.plan.nerves.find((nerve) => nerve.id === nerveId)?.name ?? nerveId}`,
    when: 'void',
    isNow: false,
  }));
}

function train(state: CaseState, nowMs: number): DueTask[] {
  const kept = state.conditions['train-of-four'];
  const firstBad = Object.values(state.incidents).map((incident) => incident.firstBadAt).sort()[0];
  if (kept === undefined) return [{ key: 'train', label: 'Train-of-four', when: 'not measured', isNow: firstBad !== undefined }];
  if (firstBad !== undefined && kept.at < firstBad) {
    return [{ key: 'train', label: 'Train-of-four', when: `${durationWords(nowMs - msOfMoment(kept.at))} old`, isNow: true }];
  }
  return [];
}

function untested(state: CaseState, nowMs: number): DueTask[] {
  if (state.phase !== 'monitoring') return [];
  return state.plan.nerves
    .filter((nerve) => nerve.role === 'at-risk')
    .flatMap((nerve) => {
      const status = nerveStatus(state, nerve, nowMs);
      const stepAt = status.lastRiskStep?.at ?? '';
      return status.untestedSiteIds.map((siteId) => {
        const tested = newestAt(state, siteId);
        const when = tested === null ? 'never' : tested <= stepAt ? `since ${status.lastRiskStep?.since ?? 'step'}` : `${durationWords(nowMs - msOfMoment(tested))} old`;
        return { key: `site-${siteId}`, label: siteLabel(state, siteId), when, isNow: false };
      });
    });
}

function controls(state: CaseState): DueTask[] {
  const stepAt = state.steps.findLast((step) => step.isRisk);
  const controlPaths = state.plan.paths.filter((path) => state.plan.nerves.some((nerve) => nerve.id === path.nerveId && nerve.role === 'control'));
  return controlPaths.flatMap((path) => {
    const tested = state.paths[path.id]?.compared?.at ?? null;
    const channel = state.plan.channels.find((candidate) => candidate.id === path.channelId)?.name ?? path.channelId;
    if (tested !== null && (stepAt === undefined || tested > stepAt.at)) return [];
    return [{ key: `control-${path.id}`, label: `Control, ${channel}`, when: tested === null ? 'never' : `since ${stepAt?.since ?? 'step'}`, isNow: false }];
  });
}

function newestAt(state: CaseState, siteId: string): string | null {
  const times = state.plan.paths
    .filter((path) => path.siteId === siteId && path.isRequired)
    .map((path) => state.paths[path.id]?.compared?.at ?? '')
    .sort();
  return times[0] === undefined || times[0] === '' ? null : times[0];
}

function siteLabel(state: CaseState, siteId: string): string {
  const name = siteName(state.plan, siteId);
  return name.charAt(0).toUpperCase() + name.slice(1);
}
