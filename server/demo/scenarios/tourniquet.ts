import type { Channel, Nerve, StepDefinition } from '@/lib/alert/nerve-plan';
import { defaultRuleSet } from '@/lib/alert/rule-set';
import type { CasePlan } from '@/lib/case/plan';
import { pathsFor } from '@/lib/reference/templates/paths-for';
import { beginCase, endCase } from '@/server/demo/begin-case';
import { atKnee, legControl, legMuscles, oppositeFibular } from '@/server/demo/leg';
import { comingBack, type ModelNerve } from '@/server/demo/nerve-model';
import type { Scenario } from '@/server/demo/scenario';
import { ScenarioScript } from '@/server/demo/scenario-script';

const nerves: readonly Nerve[] = [
  {
    id: 'common-fibular',
    name: 'Common fibular',
    role: 'at-risk',
    sites: [
      { id: 'popliteal-fossa', name: 'Popliteal fossa', positionMm: 0, hotkey: '1', defaultIntensityMa: 26 },
      { id: 'above-neck', name: 'Above fibular neck', positionMm: 90, hotkey: '2', defaultIntensityMa: 26 },
      { id: 'below-neck', name: 'Below fibular neck', positionMm: 180, hotkey: '3', defaultIntensityMa: 26 },
    ],
  },
  {
    id: 'opposite-fibular',
    name: 'Opposite fibular, control',
    role: 'control',
    sites: [{ id: legControl, name: 'Opposite fibular head', positionMm: 0, hotkey: '4', defaultIntensityMa: 26 }],
  },
];

const muscle = { kind: 'muscle', convention: 'baseline-to-peak' } as const;
const channels: readonly Channel[] = [
  { ...muscle, id: 'ta', name: 'TA', longName: 'Tibialis anterior', nerveId: 'common-fibular', positionMm: 260 },
  { ...muscle, id: 'fl', name: 'FL', longName: 'Fibularis longus', nerveId: 'common-fibular', positionMm: 275 },
  { ...muscle, id: 'ta-opposite', name: 'TA, opposite', longName: 'Tibialis anterior, opposite leg', nerveId: 'opposite-fibular', positionMm: 90 },
];

const plain = { isRisk: false, voidsDistances: false } as const;
const steps: readonly StepDefinition[] = [
  { ...plain, id: 'incision', label: 'Incision', since: 'incision', hotkey: 'i' },
  { isRisk: true, voidsDistances: false, id: 'arch-divided', label: 'Fibrous arch divided', since: 'fibrous arch divided', hotkey: 'd' },
  { ...plain, id: 'closure', label: 'Closure', since: 'closure', hotkey: 'w' },
];

const plan: CasePlan = {
  templateId: 'fibular-at-neck',
  procedure: 'Common fibular nerve at the fibular neck, decompression',
  title: 'Left common fibular nerve, decompression',
  side: 'left',
  theatre: 'Theatre 3',
  nerves,
  channels,
  paths: pathsFor(nerves, channels, ['ta']),
  steps,
  rules: defaultRuleSet,
  electrodes: [{ id: 'surface', name: 'Surface, 1 cm²' }],
  defaultPulseWidthUs: 200,
  defaultFamily: 'through-skin',
  closingSiteId: 'popliteal-fossa',
  trap: 'A cuff on the thigh lames the nerve below it within 15 to 45 minutes: it has to be down before a fall is judged. Knee and foot keep their position.',
};

const legNerves: readonly ModelNerve[] = [
  {
    id: 'common-fibular',
    stretches: [
      { toMm: 90, velocityMps: 50 },
      { toMm: 180, velocityMps: 47 },
    ],
    outlets: [
      { ...legMuscles.ta, atMm: 180 },
      { ...legMuscles.fl, atMm: 180 },
    ],
  },
  oppositeFibular,
];

const sites = ['below-neck', 'above-neck', 'popliteal-fossa'] as const;
const stimuli = { 'popliteal-fossa': atKnee, 'above-neck': atKnee, 'below-neck': atKnee, [legControl]: atKnee };

/** Seconds a cuff is borne without a sign, and in which the conducting share then falls to 37 %: a block between 15 and 45 min (a tourniquet handbook, web copy). */
const cuff = { silentSeconds: 660, fallSeconds: 780, recoverySeconds: 120 } as const;

/** Share of the fibres that conduct under a cuff that has been up so long. */
function shareUnderCuff(seconds: number): number {
  return Math.exp(-Math.max(0, seconds - cuff.silentSeconds) / cuff.fallSeconds);
}

function story(): ScenarioScript {
  const script = new ScenarioScript(plan, legNerves, stimuli);
  prepare(script);
  const upAt = cuffUp(script);
  cuffDown(script, upAt);
  endCase(script, {
    sites: [...sites, legControl],
    words: () => `Closing runs done, cuff down. From the popliteal fossa TA stands at ${script.percent('popliteal-fossa', 'ta')} of baseline, the other leg at ${script.percent(legControl, 'ta-opposite')}.`,
    closeText: 'Responses as at baseline once the cuff was down.',
  });
  return script;
}

function prepare(script: ScenarioScript): void {
  beginCase(script, {
    examination: {
      muscles: [
        { muscle: 'Tibialis anterior', grade: 4 },
        { muscle: 'Fibularis longus', grade: 4 },
      ],
      sensation: [{ area: 'Back of the foot', finding: 'reduced' }],
      text: 'Fibular neuropathy at the fibular neck on the left.',
    },
    greeting: 'Theatre 3, left common fibular nerve, decompression. Cuff agreed for the skin only, down before the nerve is touched.',
    limbC: 33.5,
  });
  script.condition({ kind: 'tourniquet', isUp: false, pressureMmHg: null }, 'nurse');
  script.part('Baseline, cuff down');
  script.phase('baseline');
  script.baselineRuns([...sites, legControl]);
  script.acceptBaseline('surface', 'through-skin', 'Agree, cuff is down');
  script.phase('monitoring');
  script.runs([...sites, legControl]);
}

/** Nobody lets the cuff down. Below it all responses fall together, whatever the surgeon does. */
function cuffUp(script: ScenarioScript): number {
  script.part('Cuff up, and left up');
  script.condition({ kind: 'tourniquet', isUp: true, pressureMmHg: 280 }, 'nurse', 20);
  const upAt = script.atSeconds;
  const testAll = (firstAfter: number, siteIds: readonly string[] = sites) => siteIds.forEach((siteId, index) => testUnderCuff(script, siteId, index === 0 ? firstAfter : 9, upAt));
  script.step('incision', 30);
  testAll(180);
  testAll(240);
  testAll(230);
  script.step('arch-divided', 20);
  testAll(25);
  testAll(220);
  script.message('desk', `TA from the popliteal fossa at ${script.percent('popliteal-fossa', 'ta')}, lower at every site. Testing on.`);
  testAll(100, ['below-neck', 'above-neck']);
  testAll(130, ['above-neck', 'above-neck']);
  return upAt;
}

function testUnderCuff(script: ScenarioScript, siteId: string, after: number, upAt: number): void {
  const share = shareUnderCuff(script.atSeconds + after - upAt);
  script.actingOn['common-fibular'] = { cuffShare: share, cuffVelocityShare: 1 - 0.12 * (1 - share) };
  script.run(siteId, { after });
}

function cuffDown(script: ScenarioScript, upAt: number): void {
  const alertId = 'common-fibular-1';
  script.part('Cuff found and let down');
  script.give({ name: 'tell-alert', alertId, whom: 'Surgeon', how: 'voice' });
  script.give({ name: 'read-back-alert', alertId, words: 'Fibular down at every site. Is the cuff still up?' }, { after: 7 });
  testUnderCuff(script, 'below-neck', 9, upAt);
  script.run(legControl);
  const atFall = shareUnderCuff(script.atSeconds + 8 - upAt);
  script.give({ name: 'act-on-alert', alertId, action: 'Cuff was still up: let down' });
  script.condition({ kind: 'tourniquet', isUp: false, pressureMmHg: null }, 'nurse', 5);
  const downAt = script.atSeconds;
  script.message('desk', `Common fibular, TA from above the neck at ${script.percent('above-neck', 'ta')}, from below it at ${script.percent('below-neck', 'ta')}. Cuff was left up, now down. Other leg at ${script.percent(legControl, 'ta-opposite')}.`);
  script.advice('Every site the same and the other leg kept: the cuff explains it. Judge the nerve only once it has been down for a while.', 'Surgeon waits');
  const recover = (siteId: string, after: number) => {
    const share = comingBack(atFall, 0.97, script.atSeconds + after - downAt, cuff.recoverySeconds);
    script.actingOn['common-fibular'] = { cuffShare: share, cuffVelocityShare: 1 - 0.12 * (1 - share) };
    script.run(siteId, { after });
  };
  recover('above-neck', 70);
  for (const round of [0, 1]) sites.forEach((siteId, index) => recover(siteId, index === 0 ? 80 + 70 * round : 10));
  script.give({ name: 'end-alert', alertId, outcome: 'full', cause: 'tourniquet', text: 'Cuff left up on the thigh, back after it was let down' });
  script.message('physician', `Agree, TA from the popliteal fossa back at ${script.percent('popliteal-fossa', 'ta')}.`);
}

const { moments } = story();

/** A cuff that is left up on the thigh: every response below it falls slowly, and comes back when it is let down. */
export const tourniquet: Scenario = {
  name: 'tourniquet',
  summary: 'Tourniquet left up: responses below the cuff fall slowly, and come back when it is let down',
  plan,
  identity: { patientLabel: 'Invented patient, adult', recordNumber: 'DEMO-CUFF' },
  moments,
};
