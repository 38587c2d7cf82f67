import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { alertDrafts } from '@/lib/case/decide/alert-drafts';
import { draft } from '@/lib/case/decide/draft';
import { evolveDraft } from '@/lib/case/decide/evolve-draft';
import { judgedDraft } from '@/lib/case/decide/judged-draft';
import { roundRun } from '@/lib/case/decide/round-run';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/**
 * Logs a run, judges it, and raises, confirms, worsens, locates or recovers what it shows.
 * @returns drafts: run.logged, run.judged, then alert entries; a refusal only for a site or channel the plan does not have
 * @source product rule: a well-formed run is never refused for the case's state
 */
export function decideRun(
  state: CaseState,
  command: CaseCommand & { name: 'log-run' },
  context: DecideContext,
): readonly EntryDraft[] | Refusal {
  const sites = state.plan.nerves.flatMap((nerve) => nerve.sites);
  if (!sites.some((site) => site.id === command.run.siteId)) {
    const known = sites.map((site) => site.id).join(', ');
    return { code: 'site-unknown', message: `Site unknown: ${command.run.siteId}. The plan has ${known}` };
  }
  const channels = state.plan.channels.map((channel) => channel.id);
  const stranger = command.run.readings.find((row) => !channels.includes(row.channelId));
  if (stranger !== undefined) {
    return { code: 'channel-unknown', message: `Channel unknown: ${stranger.channelId}. The plan has ${channels.join(', ')}` };
  }
  if (!state.plan.electrodes.some((electrode) => electrode.id === command.run.electrodeId)) {
    const known = state.plan.electrodes.map((electrode) => electrode.id).join(', ');
    return { code: 'electrode-unknown', message: `Electrode unknown: ${command.run.electrodeId}. The plan has ${known}` };
  }
  const logged = draft('run.logged', roundRun(command.run));
  const afterRun = evolveDraft(state, logged, context);
  const runSeq = state.seq + 1;
  const judged = judgedDraft(afterRun, runSeq);
  if (judged === null) return [logged];
  const afterJudgement = evolveDraft(afterRun, judged, context);
  return [logged, judged, ...alertDrafts(state, afterJudgement, runSeq)];
}
