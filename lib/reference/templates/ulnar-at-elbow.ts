import type { Channel, Nerve, StepDefinition } from '@/lib/alert/nerve-plan';
import { defaultRuleSet } from '@/lib/alert/rule-set';
import type { CasePlan } from '@/lib/case/plan';
import { pathsFor } from '@/lib/reference/templates/paths-for';

const nerves: readonly Nerve[] = [
  {
    id: 'ulnar',
    name: 'Ulnar',
    role: 'at-risk',
    sites: [
      { id: 'axilla', name: 'Axilla', positionMm: 0, hotkey: '1', defaultIntensityMa: 20 },
      { id: 'above-elbow', name: 'Above elbow', positionMm: 150, hotkey: '2', defaultIntensityMa: 18 },
      { id: 'below-elbow', name: 'Below elbow', positionMm: 250, hotkey: '3', defaultIntensityMa: 16 },
      { id: 'wrist', name: 'Wrist', positionMm: 460, hotkey: '4', defaultIntensityMa: 15 },
    ],
  },
  {
    id: 'median',
    name: 'Median, control',
    role: 'control',
    sites: [{ id: 'median-wrist', name: 'Wrist, median', positionMm: 0, hotkey: '5', defaultIntensityMa: 15 }],
  },
];

const muscle = { kind: 'muscle', convention: 'baseline-to-peak' } as const;

const channels: readonly Channel[] = [
  { ...muscle, id: 'adm', name: 'ADM', longName: 'Abductor digiti minimi', nerveId: 'ulnar', positionMm: 530 },
  { ...muscle, id: 'fdi', name: 'FDI', longName: 'First dorsal interosseous', nerveId: 'ulnar', positionMm: 570 },
  { ...muscle, id: 'apb', name: 'APB', longName: 'Abductor pollicis brevis', nerveId: 'median', positionMm: 70 },
];

const plain = { isRisk: false, voidsDistances: false } as const;
const risk = { isRisk: true, voidsDistances: false } as const;

const steps: readonly StepDefinition[] = [
  { ...plain, id: 'incision', label: 'Incision', since: 'incision', hotkey: 'i' },
  { ...plain, id: 'neurolysis', label: 'Neurolysis', since: 'neurolysis', hotkey: 'y' },
  { ...risk, id: 'retractor-placed', label: 'Retractor placed', since: 'retractor placed', hotkey: 'p' },
  { ...risk, id: 'nerve-lifted', label: 'Nerve lifted', since: 'nerve lifted', hotkey: 'l' },
  { ...risk, id: 'cautery-near-nerve', label: 'Cautery near nerve', since: 'cautery near nerve', hotkey: 'h' },
  { isRisk: true, voidsDistances: true, id: 'nerve-transposed', label: 'Nerve transposed', since: 'nerve transposed', hotkey: 'x' },
  { ...risk, id: 'sling-sutured', label: 'Sling sutured', since: 'sling sutured', hotkey: 'g' },
  { ...plain, id: 'closure', label: 'Closure', since: 'closure', hotkey: 'w' },
];

/**
 * Ulnar nerve at the elbow, anterior transposition, with the median nerve at the wrist as control.
 *
 * Method: four sites from axilla to wrist, elbow flexed 70 to 90 degrees and distances taken along the curve.
 * Distances are a middle-sized adult arm and are there to be measured again. Required are the paths to ADM: calm rests
 * on them. FDI tells a second muscle, APB tells a fault of the test from a fault of the nerve.
 *
 * @returns a plan with title, side and theatre still to be chosen for the case
 * @source common practice for sites, muscles and steps; surface 15 to 40 mA at 200 µs and direct 0.3 to 2 mA common practice;
 *   distances and the path choice house rule; crossing fibres in the forearm (Martin-Gruber) from memory
 * @accuracy exact; tests/lib/reference/templates/templates.test.ts
 * @example
 * ulnarAtElbow.nerves[0]?.sites.length // => 4
 */
export const ulnarAtElbow: CasePlan = {
  templateId: 'ulnar-at-elbow',
  procedure: 'Ulnar nerve at the elbow, transposition',
  title: 'Left ulnar nerve, transposition',
  side: 'left',
  theatre: 'Theatre',
  nerves,
  channels,
  paths: pathsFor(nerves, channels, ['adm']),
  steps,
  rules: defaultRuleSet,
  electrodes: [
    { id: 'surface', name: 'Surface, 1 cm²' },
    { id: 'needle', name: 'Needle pair' },
    { id: 'direct-bipolar', name: 'Direct, handheld bipolar' },
  ],
  defaultPulseWidthUs: 200,
  defaultFamily: 'through-skin',
  closingSiteId: 'axilla',
  trap: 'Fibres that cross from median to ulnar in the forearm (Martin-Gruber) can look like a block between elbow and wrist. After transposition the old distances are void: measure again before velocity is compared.',
};
