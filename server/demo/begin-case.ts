import type { Examination } from '@/lib/case/entry-bodies';
import type { ScenarioScript } from '@/server/demo/scenario-script';

/** What every case begins with: examination, greeting, opening, time-out, and what the anaesthetist reports. */
export function beginCase(script: ScenarioScript, before: { examination: Pick<Examination, 'muscles' | 'sensation' | 'text'>; greeting: string; limbC: number }): void {
  script.part('Before the operation');
  script.give({ name: 'record-examination', examination: { when: 'before-operation', examinedBy: 'Neurophysiologist', ...before.examination } }, { after: 2 });
  script.give({ name: 'open-case', clockOffsetMs: null });
  script.message('desk', before.greeting);
  script.message('physician', 'Connected, I follow from outside the theatre.');
  script.give({ name: 'confirm-timeout', side: script.plan.side, text: 'Surgeon, anaesthetist and nurse agree' });
  script.condition({ kind: 'train-of-four', count: 4, ratio: 0.96 }, 'anaesthetist');
  script.condition({ kind: 'limb-temperature', temperatureC: before.limbC }, null, 5);
  script.condition({ kind: 'core-temperature', temperatureC: 36.4 }, 'anaesthetist', 5);
  script.condition({ kind: 'mean-pressure', pressureMmHg: 78 }, 'anaesthetist', 5);
}

/** What every case ends with: closing runs at the sites, words, take-down, close. */
export function endCase(script: ScenarioScript, closing: { sites: readonly string[]; note?: string; words: () => string; closeText: string }): void {
  script.part('Closing');
  script.runs(closing.sites, { purpose: 'closing', ...(closing.note === undefined ? {} : { note: closing.note }) });
  script.message('desk', closing.words());
  script.message('physician', 'Seen, thank you. I agree with the closing runs.');
  script.step('closure');
  script.phase('take-down');
  script.give({ name: 'close-case', text: closing.closeText }, { after: 20 });
}
