import type { CasePlan } from '@/lib/case/plan';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { armControl, armNerves, armThroughSkin, ulnarSites } from '@/server/demo/arm';
import { beginCase, endCase } from '@/server/demo/begin-case';
import type { Scenario } from '@/server/demo/scenario';
import { ScenarioScript } from '@/server/demo/scenario-script';

const plan: CasePlan = { ...ulnarAtElbow, title: 'Right ulnar nerve, decompression', side: 'right', theatre: 'Theatre 1' };

function story(): ScenarioScript {
  const script = new ScenarioScript(plan, armNerves, armThroughSkin);
  prepare(script);
  relaxed(script);
  cameBack(script);
  endCase(script, {
    sites: [...ulnarSites, armControl],
    words: () => `Closing runs done. From the axilla ADM stands at ${script.percent('axilla', 'adm')} of baseline, the control at ${script.percent(armControl, 'apb')}.`,
    closeText: 'Responses as at baseline. One fall of all muscle responses under a relaxant given by mistake.',
  });
  return script;
}

function prepare(script: ScenarioScript): void {
  beginCase(script, {
    examination: {
      muscles: [
        { muscle: 'Abductor digiti minimi', grade: 5 },
        { muscle: 'First dorsal interosseous', grade: 4 },
      ],
      sensation: [{ area: 'Little finger', finding: 'reduced' }],
      text: 'Ulnar neuropathy at the elbow on the right.',
    },
    greeting: 'Theatre 1, right ulnar nerve, decompression. No relaxant after intubation is agreed.',
    limbC: 33.5,
  });
  script.part('Baseline through the skin');
  script.phase('baseline');
  script.baselineRuns([...ulnarSites, armControl]);
  script.acceptBaseline('surface', 'through-skin', 'Agree');
  script.phase('monitoring');
  script.runs([...ulnarSites, armControl]);
  script.step('incision', 15);
  script.runs(ulnarSites);
}

/** Fewer and fewer muscle fibres answer, in every muscle. With one twitch of four at most 7 % are left. */
function relaxed(script: ScenarioScript): void {
  script.part('All muscle responses fall');
  const answering = (transmission: number) => {
    script.acting = { ...script.acting, transmission };
  };
  answering(0.61);
  script.run('wrist', { after: 30 });
  answering(0.33);
  script.run('above-elbow', { after: 16 });
  answering(0.2);
  script.run(armControl, { after: 8 });
  answering(0.11);
  script.run('above-elbow', { after: 9 });
  script.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'Surgeon and anaesthetist', how: 'voice' });
  script.give({ name: 'read-back-alert', alertId: 'ulnar-1', words: 'Ulnar down, control down too. Asking for the train-of-four' }, { after: 6 });
  answering(0.03);
  script.runs(['wrist', 'below-elbow', 'above-elbow', 'axilla', armControl], { after: 7 });
  script.condition({ kind: 'train-of-four', count: 1, ratio: null }, 'anaesthetist', 10);
  script.condition({ kind: 'relaxant', text: 'Given by mistake, wrong syringe' }, 'anaesthetist');
  script.message('desk', `All muscle responses gone, the control at ${script.percent(armControl, 'apb')} too. Train-of-four 1 of 4: a relaxant was given by mistake.`);
  script.advice('Nothing can be said of the nerve until the train-of-four is 4 of 4. Ask the surgeon to leave it alone until then.', 'Surgeon waits, reversal is given');
  script.give({ name: 'act-on-alert', alertId: 'ulnar-1', action: 'Surgeon waits; anaesthetist gives the reversal' });
}

function cameBack(script: ScenarioScript): void {
  script.part('Reversal works');
  script.acting = { ...script.acting, transmission: 0.42 };
  script.condition({ kind: 'train-of-four', count: 4, ratio: 0.35 }, 'anaesthetist', 60);
  script.run(armControl);
  script.acting = { ...script.acting, transmission: 0.97 };
  script.condition({ kind: 'train-of-four', count: 4, ratio: 0.95 }, 'anaesthetist', 70);
  script.run(armControl);
  script.runs(ulnarSites);
  script.runs(ulnarSites);
  script.message('desk', `Train-of-four 4 of 4, ratio 0.95. ADM from the axilla at ${script.percent('axilla', 'adm')}, the control at ${script.percent(armControl, 'apb')}.`);
  script.give({ name: 'end-alert', alertId: 'ulnar-1', outcome: 'full', cause: 'anaesthetic', text: 'Relaxant given by mistake, reversed' });
  script.message('physician', 'Agree, cause is the relaxant. Go on.');
}

const { moments } = story();

/** A relaxant given by mistake: every muscle response falls, that of the control too, and comes back. */
export const relaxant: Scenario = {
  name: 'relaxant',
  summary: 'Relaxant given by mistake: all muscle responses fall, the control too, and come back',
  plan,
  identity: { patientLabel: 'Invented patient, adult', recordNumber: 'DEMO-RELAXANT' },
  moments,
};
