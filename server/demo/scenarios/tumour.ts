import type { Channel, Nerve, StepDefinition } from '@/lib/alert/nerve-plan';
import { defaultRuleSet } from '@/lib/alert/rule-set';
import type { CasePlan } from '@/lib/case/plan';
import { pathsFor } from '@/lib/reference/templates/paths-for';
import { onNerve } from '@/server/demo/arm';
import { beginCase, endCase } from '@/server/demo/begin-case';
import { atKnee, legControl, legMuscles, oppositeFibular } from '@/server/demo/leg';
import { chargeUc, comingBack, type ModelNerve } from '@/server/demo/nerve-model';
import type { Scenario } from '@/server/demo/scenario';
import { ScenarioScript } from '@/server/demo/scenario-script';

const nerves: readonly Nerve[] = [
  {
    id: 'common-fibular',
    name: 'Common fibular part',
    role: 'at-risk',
    sites: [
      { id: 'fibular-above', name: 'Above tumour', positionMm: 0, hotkey: '1', defaultIntensityMa: 2 },
      { id: 'fibular-below', name: 'Below tumour', positionMm: 110, hotkey: '2', defaultIntensityMa: 2 },
      { id: 'fibular-head', name: 'Fibular head', positionMm: 350, hotkey: '3', defaultIntensityMa: 26 },
    ],
  },
  {
    id: 'tibial',
    name: 'Tibial part',
    role: 'at-risk',
    sites: [
      { id: 'tibial-above', name: 'Above tumour', positionMm: 0, hotkey: '4', defaultIntensityMa: 2 },
      { id: 'tibial-below', name: 'Below tumour', positionMm: 110, hotkey: '5', defaultIntensityMa: 2 },
    ],
  },
  {
    id: 'opposite-fibular',
    name: 'Opposite fibular, control',
    role: 'control',
    sites: [{ id: legControl, name: 'Opposite fibular head', positionMm: 0, hotkey: '6', defaultIntensityMa: 26 }],
  },
];

const muscle = { kind: 'muscle', convention: 'baseline-to-peak' } as const;
const channels: readonly Channel[] = [
  { ...muscle, id: 'ta', name: 'TA', longName: 'Tibialis anterior', nerveId: 'common-fibular', positionMm: 440 },
  { ...muscle, id: 'fl', name: 'FL', longName: 'Fibularis longus', nerveId: 'common-fibular', positionMm: 455 },
  { ...muscle, id: 'gm', name: 'GM', longName: 'Gastrocnemius, medial head', nerveId: 'tibial', positionMm: 420 },
  { ...muscle, id: 'ta-opposite', name: 'TA, opposite', longName: 'Tibialis anterior, opposite leg', nerveId: 'opposite-fibular', positionMm: 90 },
];

const risk = { isRisk: true, voidsDistances: false } as const;
const steps: readonly StepDefinition[] = [
  { isRisk: false, voidsDistances: false, id: 'nerve-exposed', label: 'Nerve exposed', since: 'nerve exposed', hotkey: 'i' },
  { ...risk, id: 'capsule-opened', label: 'Capsule opened', since: 'capsule opened', hotkey: 'p' },
  { ...risk, id: 'fascicles-parted', label: 'Fascicles parted', since: 'fascicles parted', hotkey: 'f' },
  { ...risk, id: 'fascicle-divided', label: 'Entering fascicle divided', since: 'entering fascicle divided', hotkey: 'd' },
  { ...risk, id: 'tumour-removed', label: 'Tumour removed', since: 'tumour removed', hotkey: 'g' },
  { isRisk: false, voidsDistances: false, id: 'closure', label: 'Closure', since: 'closure', hotkey: 'w' },
];

const plan: CasePlan = {
  templateId: 'nerve-sheath-tumour',
  procedure: 'Nerve sheath tumour, sciatic nerve in the thigh',
  title: 'Right sciatic nerve, nerve sheath tumour',
  side: 'right',
  theatre: 'Theatre 4',
  nerves,
  channels,
  paths: pathsFor(nerves, channels, ['ta', 'gm']),
  steps,
  rules: defaultRuleSet,
  electrodes: [
    { id: 'direct-bipolar', name: 'Direct, handheld bipolar' },
    { id: 'surface', name: 'Surface, 1 cm²' },
  ],
  defaultPulseWidthUs: 200,
  defaultFamily: 'exposed',
  closingSiteId: 'fibular-above',
  trap: 'Fascicles run over the capsule: a window without a response has to be silent along the whole tumour. A tourniquet alone can weaken responses.',
};

/** Fibular and tibial parts of the sciatic nerve: leg nerves conduct at 40 to 60 m/s, faster in the thigh than below the knee. */
const legNerves: readonly ModelNerve[] = [
  {
    id: 'common-fibular',
    stretches: [
      { toMm: 110, velocityMps: 52 },
      { toMm: 350, velocityMps: 50 },
    ],
    outlets: [
      { ...legMuscles.ta, atMm: 350 },
      { ...legMuscles.fl, atMm: 350 },
    ],
  },
  {
    id: 'tibial',
    stretches: [
      { toMm: 110, velocityMps: 54 },
      { toMm: 330, velocityMps: 51 },
    ],
    outlets: [{ ...legMuscles.gm, atMm: 330 }],
  },
  oppositeFibular,
];

const stimuli = { 'fibular-above': onNerve, 'fibular-below': onNerve, 'tibial-above': onNerve, 'tibial-below': onNerve, 'fibular-head': atKnee, [legControl]: atKnee };
const onFibular = ['fibular-below', 'fibular-above'] as const;
const everySite = ['fibular-head', ...onFibular, 'tibial-below', 'tibial-above'] as const;

function story(): ScenarioScript {
  const script = new ScenarioScript(plan, legNerves, stimuli);
  prepare(script);
  mapping(script);
  parting(script);
  removal(script);
  endCase(script, {
    sites: [...everySite, legControl],
    words: () => `Closing runs done. From above the tumour TA stands at ${script.percent('fibular-above', 'ta', 'opening')} of the opening baseline, GM at ${script.percent('tibial-above', 'gm')}. The fibular loss has come back in part only.`,
    closeText: 'Fibular responses lower than at baseline at the end, present from every site. To be examined in recovery.',
  });
  return script;
}

function prepare(script: ScenarioScript): void {
  beginCase(script, {
    examination: {
      muscles: [
        { muscle: 'Tibialis anterior', grade: 5 },
        { muscle: 'Fibularis longus', grade: 5 },
        { muscle: 'Gastrocnemius, medial head', grade: 5 },
      ],
      sensation: [
        { area: 'Back of the foot', finding: 'normal' },
        { area: 'Sole of the foot', finding: 'normal' },
      ],
      text: 'Painful swelling in the thigh, no weakness.',
    },
    greeting: 'Theatre 4, right sciatic nerve, nerve sheath tumour. No tourniquet planned.',
    limbC: 33.5,
  });
  script.step('nerve-exposed', 30);
  script.part('Baseline on the exposed nerve');
  script.phase('baseline');
  const { intensityMa, pulseWidthUs } = onNerve;
  script.baselineRuns([...onFibular, 'tibial-below', 'tibial-above'], `On the nerve, ${intensityMa} mA × ${pulseWidthUs} µs = ${chargeUc(intensityMa, pulseWidthUs).toFixed(2)} µC`);
  script.acceptBaseline('direct-bipolar', 'exposed', 'Agree, both parts monitorable');
  script.baselineRuns(['fibular-head', legControl]);
  script.acceptBaseline('surface', 'through-skin', 'Agree');
  script.phase('monitoring');
  script.runs([...everySite, legControl]);
}

function mapping(script: ScenarioScript): void {
  script.part('Capsule mapped and opened');
  const text = `Capsule mapped along its length at ${onNerve.intensityMa} mA × ${onNerve.pulseWidthUs} µs = ${chargeUc(onNerve.intensityMa, onNerve.pulseWidthUs).toFixed(2)} µC: one window without a response in TA, FL or GM`;
  script.condition({ kind: 'other', text }, 'surgeon', 40);
  script.message('physician', 'The window is silent along the whole tumour, agree.');
  script.step('capsule-opened', 15);
  script.runs([...onFibular, 'fibular-head', 'tibial-below', 'tibial-above']);
}

/** Fascicles of the fibular part are pulled off the capsule; a part of what is lost comes back. */
function parting(script: ScenarioScript): void {
  script.part('Fascicles parted');
  script.step('fascicles-parted', 30);
  const hurt = (conductingShare: number) => {
    script.actingOn['common-fibular'] = { lesions: [{ fromMm: 40, toMm: 60, conductingShare, delayMs: 0.4 * (1 - conductingShare) }] };
  };
  hurt(0.45);
  script.run('fibular-above', { after: 15 });
  hurt(0.33);
  script.run('fibular-above', { after: 14 });
  const alertId = 'common-fibular-1';
  script.give({ name: 'tell-alert', alertId, whom: 'Surgeon', how: 'voice' });
  script.give({ name: 'read-back-alert', alertId, words: 'Fibular down since parting, I stop here' }, { after: 6 });
  script.run('fibular-below');
  script.run('tibial-above');
  script.give({ name: 'act-on-alert', alertId, action: 'Parting stopped, nerve slack, irrigated warm' });
  const stoppedAt = script.atSeconds;
  const lost = script.percent('fibular-above', 'ta');
  script.message('desk', `Fibular part, TA from above the tumour at ${lost}, from below it at ${script.percent('fibular-below', 'ta')}. Tibial part at ${script.percent('tibial-above', 'gm')}. Surgeon stopped.`);
  script.advice('One place, at the tumour, other part kept. Wait and test each minute before going on.', 'Surgeon waits');
  for (let count = 0; count < 4; count += 1) {
    hurt(comingBack(0.33, 0.68, script.atSeconds + 40 - stoppedAt, 50));
    script.run('fibular-above', { after: 40 });
  }
  script.message('desk', `TA from above the tumour back at ${script.percent('fibular-above', 'ta')} and no longer rising. Surgeon goes on in another plane.`);
  script.part('New baseline above the tumour');
  hurt(0.68);
  script.baselineRuns(['fibular-above'], 'A part of the response is lost');
  script.acceptBaseline('direct-bipolar', 'exposed', 'Agree: a part is lost, watch what is left', 'A part is lost; what is left is watched from here on');
  script.give({ name: 'end-alert', alertId, outcome: 'partial', cause: 'surgical', text: 'Fascicles pulled off the capsule; a part came back' });
  script.runs(everySite);
}

function removal(script: ScenarioScript): void {
  script.part('Tumour removed');
  const text = `Entering fascicle isolated and stimulated, ${onNerve.intensityMa} mA: no response in TA, FL or GM`;
  script.condition({ kind: 'other', text }, 'surgeon', 25);
  script.step('fascicle-divided');
  script.runs(['fibular-above', 'tibial-above']);
  script.step('tumour-removed', 30);
  script.runs(everySite);
  script.message('physician', `TA from above at ${script.percent('fibular-above', 'ta')} of the new baseline, GM at ${script.percent('tibial-above', 'gm')}: no further fall. Please examine ankle and toes in recovery.`);
}

const { moments } = story();

/** Nerve sheath tumour of the sciatic nerve: a partial loss in one part that comes back in part. */
export const tumour: Scenario = {
  name: 'tumour',
  summary: 'Nerve sheath tumour of the sciatic nerve: the fibular part falls, and comes back in part',
  plan,
  identity: { patientLabel: 'Invented patient, adult', recordNumber: 'DEMO-TUMOUR' },
  moments,
};
