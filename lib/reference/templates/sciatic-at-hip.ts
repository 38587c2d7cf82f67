import type { Channel, Nerve, StepDefinition } from '@/lib/alert/nerve-plan';
import { defaultRuleSet } from '@/lib/alert/rule-set';
import type { CasePlan } from '@/lib/case/plan';
import { pathsFor } from '@/lib/reference/templates/paths-for';

const nerves: readonly Nerve[] = [
  {
    id: 'common-fibular',
    name: 'Common fibular',
    role: 'at-risk',
    sites: [
      { id: 'fibular-above-field', name: 'Lateral part, above field', positionMm: 0, hotkey: '1', defaultIntensityMa: 2 },
      { id: 'fibular-below-field', name: 'Lateral part, below field', positionMm: 120, hotkey: '2', defaultIntensityMa: 2 },
      { id: 'fibular-head', name: 'Fibular head', positionMm: 440, hotkey: '3', defaultIntensityMa: 25 },
    ],
  },
  {
    id: 'tibial',
    name: 'Tibial',
    role: 'at-risk',
    sites: [
      { id: 'tibial-above-field', name: 'Medial part, above field', positionMm: 0, hotkey: '4', defaultIntensityMa: 2 },
      { id: 'tibial-below-field', name: 'Medial part, below field', positionMm: 120, hotkey: '5', defaultIntensityMa: 2 },
      { id: 'popliteal-fossa', name: 'Popliteal fossa', positionMm: 420, hotkey: '6', defaultIntensityMa: 30 },
    ],
  },
  {
    id: 'opposite-fibular',
    name: 'Opposite fibular, control',
    role: 'control',
    sites: [{ id: 'opposite-fibular-head', name: 'Opposite fibular head', positionMm: 0, hotkey: '7', defaultIntensityMa: 25 }],
  },
];

const muscle = { kind: 'muscle', convention: 'baseline-to-peak' } as const;

const channels: readonly Channel[] = [
  { ...muscle, id: 'ta', name: 'TA', longName: 'Tibialis anterior', nerveId: 'common-fibular', positionMm: 530 },
  { ...muscle, id: 'fl', name: 'FL', longName: 'Fibularis longus', nerveId: 'common-fibular', positionMm: 545 },
  { ...muscle, id: 'gm', name: 'GM', longName: 'Gastrocnemius, medial head', nerveId: 'tibial', positionMm: 500 },
  { ...muscle, id: 'ah', name: 'AH', longName: 'Abductor hallucis', nerveId: 'tibial', positionMm: 860 },
  { ...muscle, id: 'ta-opposite', name: 'TA, opposite', longName: 'Tibialis anterior, opposite leg', nerveId: 'opposite-fibular', positionMm: 90 },
];

const plain = { isRisk: false, voidsDistances: false } as const;
const risk = { isRisk: true, voidsDistances: false } as const;

const steps: readonly StepDefinition[] = [
  { ...plain, id: 'nerve-exposed', label: 'Nerve exposed', since: 'nerve exposed', hotkey: 'i' },
  { ...risk, id: 'retractor-posterior', label: 'Posterior retractor', since: 'posterior retractor', hotkey: 'p' },
  { ...risk, id: 'retractor-anterior', label: 'Anterior retractor', since: 'anterior retractor', hotkey: 'f' },
  { ...risk, id: 'hip-flexed', label: 'Hip flexed', since: 'hip flexed', hotkey: 'h' },
  { ...risk, id: 'cup-placed', label: 'Cup placed', since: 'cup placed', hotkey: 'k' },
  { ...risk, id: 'reduction', label: 'Hip reduced', since: 'hip reduced', hotkey: 'd' },
  { ...risk, id: 'cable-tightened', label: 'Cable tightened', since: 'cable tightened', hotkey: 'g' },
  { ...plain, id: 'closure', label: 'Closure', since: 'closure', hotkey: 'w' },
];

/**
 * Sciatic nerve in hip surgery: its common fibular and tibial divisions as two nerves at risk, the opposite leg as control.
 *
 * Method: the exposed nerve is stimulated above and below the field, on its lateral part for the fibular and its medial part
 * for the tibial division, then through the skin at the knee. Distances are a middle-sized adult leg and are there to be
 * measured again. It does not separate the divisions when current spreads from one to the other.
 *
 * @returns a plan with title, side and theatre still to be chosen for the case
 * @source common practice for sites, muscles and steps; direct 0.5 to 3 mA and surface 20 to 40 mA at 200 to 300 µs common practice;
 *   distances and the path choice house rule; spinal and epidural blocks removing muscle responses common practice
 * @accuracy exact; tests/lib/reference/templates/templates.test.ts
 * @example
 * sciaticAtHip.nerves.filter((nerve) => nerve.role === 'at-risk').length // => 2
 */
export const sciaticAtHip: CasePlan = {
  templateId: 'sciatic-at-hip',
  procedure: 'Sciatic nerve in hip surgery',
  title: 'Left sciatic nerve, hip revision',
  side: 'left',
  theatre: 'Theatre',
  nerves,
  channels,
  paths: pathsFor(nerves, channels, ['ta', 'gm']),
  steps,
  rules: defaultRuleSet,
  electrodes: [
    { id: 'direct-bipolar', name: 'Direct, handheld bipolar' },
    { id: 'surface', name: 'Surface, 1 cm²' },
    { id: 'needle', name: 'Needle pair' },
  ],
  defaultPulseWidthUs: 200,
  defaultFamily: 'exposed',
  closingSiteId: 'fibular-above-field',
  trap: 'A spinal or epidural block takes muscle responses away in both legs: ask which block is planned. The fibular division fails first, so a good tibial response does not clear it.',
};
