import type { ModelNerve } from '@/server/demo/nerve-model';
import type { SiteStimulus } from '@/server/demo/scenario-script';

/**
 * The ulnar and median nerves of an invented arm. Velocities: an arm between 50 and 70 m/s, slow across the elbow as before
 * a transposition; latencies at the wrist near 3.0 ms to ADM and 3.7 ms to APB (Buschbacher 1999, both), FDI from memory.
 */
export const armNerves: readonly ModelNerve[] = [
  {
    id: 'ulnar',
    stretches: [
      { toMm: 150, velocityMps: 61 },
      { toMm: 250, velocityMps: 46 },
      { toMm: 460, velocityMps: 58 },
    ],
    outlets: [
      { channelId: 'adm', kind: 'muscle', atMm: 460, terminalMs: 2.9, fullUv: 9_400, durationMs: 5.6 },
      { channelId: 'fdi', kind: 'muscle', atMm: 460, terminalMs: 3.8, fullUv: 10_800, durationMs: 5.9 },
    ],
  },
  { id: 'median', stretches: [], outlets: [{ channelId: 'apb', kind: 'muscle', atMm: 0, terminalMs: 3.8, fullUv: 9_800, durationMs: 5.4 }] },
];

const surface = { electrodeId: 'surface', family: 'through-skin', pulseWidthUs: 200 } as const;

/** Through the skin: 15 to 20 mA at 200 µs, 1.2 times the current of the largest response at least (common practice). */
export const armThroughSkin: Readonly<Record<string, SiteStimulus>> = {
  axilla: { ...surface, intensityMa: 20, thresholdMa: 6, maximalMa: 16 },
  'above-elbow': { ...surface, intensityMa: 18, thresholdMa: 5, maximalMa: 14 },
  'below-elbow': { ...surface, intensityMa: 16, thresholdMa: 5, maximalMa: 13 },
  wrist: { ...surface, intensityMa: 15, thresholdMa: 4, maximalMa: 12 },
  'median-wrist': { ...surface, intensityMa: 15, thresholdMa: 4, maximalMa: 12 },
};

/** On the nerve itself: threshold 0.1 to 0.5 mA and supramaximal 1 to 3 mA in a healthy one (common practice). */
export const onNerve: SiteStimulus = { electrodeId: 'direct-bipolar', family: 'exposed', intensityMa: 2, pulseWidthUs: 200, thresholdMa: 0.4, maximalMa: 1.5 };

/** Sites of the arm from distal to proximal, and the control. */
export const ulnarSites = ['wrist', 'below-elbow', 'above-elbow', 'axilla'] as const;
export const armControl = 'median-wrist';
