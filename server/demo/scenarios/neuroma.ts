import type { Channel, Nerve, Path, StepDefinition } from '@/lib/alert/nerve-plan';
import { defaultRuleSet } from '@/lib/alert/rule-set';
import type { CasePlan } from '@/lib/case/plan';
import { beginCase, endCase } from '@/server/demo/begin-case';
import { chargeUc, type ModelNerve } from '@/server/demo/nerve-model';
import type { Scenario } from '@/server/demo/scenario';
import { ScenarioScript, type SiteStimulus } from '@/server/demo/scenario-script';

const nerves: readonly Nerve[] = [
  {
    id: 'median',
    name: 'Median',
    role: 'at-risk',
    sites: [
      { id: 'above-neuroma', name: 'Above neuroma', positionMm: 0, hotkey: '1', defaultIntensityMa: 12 },
      { id: 'below-neuroma', name: 'Below neuroma', positionMm: 130, hotkey: '2', defaultIntensityMa: 12 },
    ],
  },
  {
    id: 'ulnar',
    name: 'Ulnar, control',
    role: 'control',
    sites: [{ id: 'ulnar-wrist', name: 'Wrist, ulnar', positionMm: 0, hotkey: '3', defaultIntensityMa: 15 }],
  },
];

const hook = { kind: 'nerve', convention: 'peak-to-peak', nerveId: 'median' } as const;
const channels: readonly Channel[] = [
  { ...hook, id: 'hook-above', name: 'Hook above', longName: 'Nerve hook above the neuroma', positionMm: 60 },
  { ...hook, id: 'hook-below', name: 'Hook below', longName: 'Nerve hook below the neuroma', positionMm: 200 },
  { kind: 'muscle', convention: 'baseline-to-peak', id: 'adm', name: 'ADM', longName: 'Abductor digiti minimi', nerveId: 'ulnar', positionMm: 70 },
];

/** Calm rests on the healthy segment above and on the nerve below; the response across the neuroma is what is asked. */
const path = (nerveId: string, siteId: string, channelId: string, isRequired: boolean): Path => ({ id: `${siteId}/${channelId}`, nerveId, siteId, channelId, isRequired });
const paths: readonly Path[] = [
  path('median', 'above-neuroma', 'hook-above', true),
  path('median', 'above-neuroma', 'hook-below', false),
  path('median', 'below-neuroma', 'hook-below', true),
  path('ulnar', 'ulnar-wrist', 'adm', false),
];

const steps: readonly StepDefinition[] = [
  { isRisk: false, voidsDistances: false, id: 'nerve-exposed', label: 'Nerve exposed', since: 'nerve exposed', hotkey: 'i' },
  { isRisk: true, voidsDistances: false, id: 'neurolysis', label: 'Neurolysis', since: 'neurolysis', hotkey: 'y' },
  { isRisk: false, voidsDistances: false, id: 'closure', label: 'Closure', since: 'closure', hotkey: 'w' },
];

const plan: CasePlan = {
  templateId: 'neuroma-in-continuity',
  procedure: 'Neuroma in continuity, median nerve in the forearm',
  title: 'Left median nerve, neuroma in continuity',
  side: 'left',
  theatre: 'Theatre 5',
  nerves,
  channels,
  paths,
  steps,
  rules: defaultRuleSet,
  electrodes: [
    { id: 'hook-stimulating', name: 'Stimulating hook, tripolar' },
    { id: 'surface', name: 'Surface, 1 cm²' },
  ],
  defaultPulseWidthUs: 50,
  defaultFamily: 'exposed',
  closingSiteId: 'above-neuroma',
  trap: 'A healthy segment first: without a response there the test says nothing. Muscle that answers nearby can pass for a nerve response.',
};

/** Where the neuroma lies. Fibres that grew through it are few and slow: 10 to 40 m/s (from memory). */
const neuromaMm = { from: 80, to: 120 };

const forearmNerves: readonly ModelNerve[] = [
  {
    id: 'median',
    stretches: [
      { toMm: neuromaMm.from, velocityMps: 57 },
      { toMm: neuromaMm.to, velocityMps: 24 },
      { toMm: 200, velocityMps: 38 },
    ],
    outlets: [
      { channelId: 'hook-above', kind: 'nerve', atMm: 60, terminalMs: 0, fullUv: 240, durationMs: 1.6 },
      { channelId: 'hook-below', kind: 'nerve', atMm: 200, terminalMs: 0, fullUv: 34, durationMs: 2.2 },
    ],
  },
  { id: 'ulnar', stretches: [], outlets: [{ channelId: 'adm', kind: 'muscle', atMm: 0, terminalMs: 2.9, fullUv: 9_100, durationMs: 5.6 }] },
];

const byHook: SiteStimulus = { electrodeId: 'hook-stimulating', family: 'exposed', intensityMa: 12, pulseWidthUs: 50, thresholdMa: 2, maximalMa: 9 };
const highest: SiteStimulus = { ...byHook, intensityMa: 20 };
const stimuli = {
  'above-neuroma': byHook,
  'below-neuroma': byHook,
  'ulnar-wrist': { electrodeId: 'surface', family: 'through-skin', intensityMa: 15, pulseWidthUs: 200, thresholdMa: 4, maximalMa: 12 },
} as const;

const stimulusWords = ({ intensityMa, pulseWidthUs }: SiteStimulus) => `${intensityMa} mA × ${pulseWidthUs} µs = ${chargeUc(intensityMa, pulseWidthUs).toFixed(2)} µC`;

function story(): ScenarioScript {
  const script = new ScenarioScript(plan, forearmNerves, stimuli);
  // Fibres that crossed conduct below the neuroma; inside it they are held back until it is freed.
  script.actingOn['median'] = { lesions: [{ fromMm: neuromaMm.from, toMm: neuromaMm.to, conductingShare: 0, delayMs: 0 }] };
  prepare(script);
  acrossBefore(script);
  neurolysis(script);
  endCase(script, {
    sites: ['above-neuroma', 'below-neuroma', 'ulnar-wrist'],
    words: () => `Closing runs done. A response across the neuroma is recorded. Healthy segment at ${script.percent('above-neuroma', 'hook-above')} of baseline.`,
    closeText: 'Response across the neuroma recorded after neurolysis, not before it.',
  });
  return script;
}

function prepare(script: ScenarioScript): void {
  beginCase(script, {
    examination: {
      muscles: [
        { muscle: 'Abductor pollicis brevis', grade: 0 },
        { muscle: 'Abductor digiti minimi', grade: 5 },
      ],
      sensation: [{ area: 'Tip of the index finger', finding: 'absent' }],
      text: 'Median nerve injured in the forearm 18 weeks ago, no recovery of the thumb.',
    },
    greeting: 'Theatre 5, left median nerve, neuroma in continuity. No tourniquet used.',
    limbC: 33.5,
  });
  script.step('nerve-exposed', 40);
  script.part('Healthy segment first, and the nerve below');
  script.phase('baseline');
  script.baselineRuns(['above-neuroma', 'below-neuroma'], stimulusWords(byHook));
  script.acceptBaseline('hook-stimulating', 'exposed', 'Healthy segment recorded: the test is valid');
  script.baselineRuns(['ulnar-wrist']);
  script.acceptBaseline('surface', 'through-skin', 'Agree');
  script.phase('monitoring');
  script.runs(['above-neuroma', 'below-neuroma', 'ulnar-wrist']);
}

function acrossBefore(script: ScenarioScript): void {
  script.part('Across the neuroma, before neurolysis');
  script.stimuli['above-neuroma'] = highest;
  script.run('above-neuroma', { after: 25, note: `Across the neuroma: not recorded at the highest current, ${stimulusWords(highest)}` });
  script.run('above-neuroma', { after: 15, note: 'Again, hooks dried and seated anew' });
  script.stimuli['above-neuroma'] = byHook;
  script.message('desk', `Across the neuroma no response up to ${stimulusWords(highest)}. Above it the healthy segment answers at ${script.percent('above-neuroma', 'hook-above')} of baseline.`);
  script.advice('Test is valid. Test again after the neuroma has been freed, same hooks, same distances.', 'Hooks stay where they are');
}

function neurolysis(script: ScenarioScript): void {
  script.part('Neurolysis');
  script.step('neurolysis', 120);
  script.actingOn['median'] = { lesions: [{ fromMm: neuromaMm.from, toMm: neuromaMm.to, conductingShare: 0.45, delayMs: 0 }] };
  script.run('above-neuroma', { after: 30, note: `Across the neuroma: recorded now, ${stimulusWords(byHook)}` });
  script.runs(['below-neuroma', 'ulnar-wrist']);
  script.message('desk', 'A small, late response across the neuroma since it was freed. Repeating it for a baseline.');
  script.part('Baseline across the neuroma');
  script.baselineRuns(['above-neuroma'], 'After neurolysis');
  script.acceptBaseline('hook-stimulating', 'exposed', 'Agree: fibres have grown across');
  script.runs(['above-neuroma', 'below-neuroma']);
}

const { moments } = story();

/** Neuroma in continuity of the median nerve: no response across it before neurolysis, a small one after it. */
export const neuroma: Scenario = {
  name: 'neuroma',
  summary: 'Neuroma in continuity: no response across it at the highest current, a small one after neurolysis',
  plan,
  identity: { patientLabel: 'Invented patient, adult', recordNumber: 'DEMO-NEUROMA' },
  moments,
};
