import type { CaseState } from '@/lib/case/case-state';
import { durationWords } from '@/lib/text/format';
import type { Scenario } from '@/server/demo/scenario';
import { scenarios } from '@/server/demo/scenarios/scenarios';

/** The cases that can be played, one on a line. */
export function demoList(): string {
  const width = Math.max(...scenarios.map(({ name }) => name.length));
  return scenarios.map((scenario) => `${scenario.name.padEnd(width)}  ${scenario.summary} (${durationWords(lengthMs(scenario))} at speed 1)`).join('\n');
}

/** What a person needs before the first act: what is played, where to watch, how a wall is paired. */
export function demoWelcome({ url, caseId, reference, scenario, speed }: { url: string; caseId: string; reference: string; scenario: Scenario; speed: number }): string {
  return [
    `Watch: ${url}/cases/${caseId} as desk@demo.example, ${url}/cases/${caseId}/follow as physician@demo.example.`,
    `Wall: open ${url}/screen in a window of its own, choose "Pair a wall" in the case at the desk, type the code, compare the two words.`,
    `${scenario.summary}. Case ${reference}, ${scenario.plan.theatre}, about ${durationWords(lengthMs(scenario) / speed)} at speed ${speed}. Ctrl-C stops it.`,
  ].join('\n');
}

/** How the case stands when the demo ends. */
export function howItStands({ state, reference, url, isStopped }: { state: CaseState; reference: string; url: string; isStopped: boolean }): string {
  if (state.status === 'closed') return `\nCase ${reference} is closed with ${state.seq} entries. Its record: ${url}/cases/${state.caseId}/record as reviewer@demo.example.`;
  const open = Object.values(state.incidents).map((incident) => `${incident.level} ${incident.alertId}`);
  const incidents = open.length === 0 ? 'no notice or alert is open' : `still open: ${open.join(', ')}`;
  return `\n${isStopped ? 'Stopped. ' : ''}Case ${reference} stays ${state.status}, phase ${state.phase}, with ${state.seq} entries; ${incidents}. The desk can go on with it: ${url}/cases/${state.caseId}`;
}

function lengthMs({ moments }: Scenario): number {
  return 1000 * moments.reduce((sum, moment) => sum + moment.afterSeconds, 0);
}
