import type { ModelNerve } from '@/server/demo/nerve-model';
import type { SiteStimulus } from '@/server/demo/scenario-script';

/**
 * Muscles of an invented leg. Amplitudes and latencies from the fibular head to tibialis anterior and fibularis longus, and
 * from the knee to gastrocnemius: from memory, usual adult values.
 */
export const legMuscles = {
  ta: { channelId: 'ta', kind: 'muscle', terminalMs: 3.2, fullUv: 5_600, durationMs: 9.5 },
  fl: { channelId: 'fl', kind: 'muscle', terminalMs: 3.5, fullUv: 6_400, durationMs: 9.8 },
  gm: { channelId: 'gm', kind: 'muscle', terminalMs: 3.9, fullUv: 11_200, durationMs: 10.4 },
} as const;

/** The other leg, outside the operation. */
export const oppositeFibular: ModelNerve = {
  id: 'opposite-fibular',
  stretches: [],
  outlets: [{ channelId: 'ta-opposite', kind: 'muscle', atMm: 0, terminalMs: 3.3, fullUv: 5_300, durationMs: 9.4 }],
};
export const legControl = 'opposite-fibular-head';

/** Through the skin at the knee: 20 to 40 mA at 200 µs (common practice). */
export const atKnee: SiteStimulus = { electrodeId: 'surface', family: 'through-skin', intensityMa: 26, pulseWidthUs: 200, thresholdMa: 8, maximalMa: 21 };
