import type { CaseState } from '@/lib/case/case-state';
import type { Refusal } from '@/lib/case/commands';
import type { RunBody } from '@/lib/case/run-body';

/**
 * What of a run does not fit the plan, or is no measurement.
 *
 * Method: a current that rounds to 0 is no stimulus, an amplitude that rounds to 0 no measured response. No response is its own value and needs the highest
 * current tried.
 *
 * @param state the case
 * @param run a rounded run
 * @returns a refusal that names what the plan has; null when the run can be logged
 * @source house rule; no response is never 0: common practice
 */
export function runProblem(state: CaseState, run: RunBody): Refusal | null {
  const sites = state.plan.nerves.flatMap((nerve) => nerve.sites).map((site) => site.id);
  if (!sites.includes(run.siteId)) return unknown('site', run.siteId, sites);
  const channels = state.plan.channels.map((channel) => channel.id);
  const stranger = run.readings.find((row) => !channels.includes(row.channelId));
  if (stranger !== undefined) return unknown('channel', stranger.channelId, channels);
  const electrodes = state.plan.electrodes.map((electrode) => electrode.id);
  if (!electrodes.includes(run.electrodeId)) return unknown('electrode', run.electrodeId, electrodes);
  if (run.intensityMa === 0 || run.maximalResponseMa === 0) {
    return { code: 'current-zero', message: 'Current 0 mA: a stimulus, and the one of the largest response, is above 0 mA' };
  }
  const zero = run.readings.find(({ reading }) => reading.kind === 'measured' && reading.amplitudeUv === 0);
  if (zero === undefined) return null;
  return { code: 'amplitude-zero', message: `Amplitude 0 on ${zero.channelId}: log "no response" with the highest current tried` };
}

function unknown(noun: 'site' | 'channel' | 'electrode', id: string, known: readonly string[]): Refusal {
  const subject = noun.charAt(0).toUpperCase() + noun.slice(1);
  return { code: `${noun}-unknown`, message: `${subject} unknown: ${id}. The plan has ${known.join(', ')}` };
}
