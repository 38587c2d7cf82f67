import type { Reading } from '@/lib/response/reading';
import { respond, type ModelNerve, type NerveCondition, type Outlet, type Stimulus } from '@/server/demo/nerve-model';
import { scatter } from '@/server/demo/scatter';

/** Steps a person reads from a screen: times to 0.01 ms, widths to 0.1 ms, a muscle to 0.01 mV, a nerve to 0.1 µV. */
const readSteps = { onsetMs: 0.01, durationMs: 0.1, muscleUv: 10, nerveUv: 0.1 } as const;

/** What a person reads of one response: the model's, a little off, rounded; or no response at the current tried. */
export function readResponse(nerve: ModelNerve, outlet: Outlet, stimulus: Stimulus, acting: NerveCondition, ordinal: number): Reading {
  const response = respond(nerve, outlet, stimulus, acting);
  if (response === null) return { kind: 'absent', highestIntensityMa: stimulus.intensityMa };
  const deviation = scatter(ordinal);
  return {
    kind: 'measured',
    onsetMs: rounded(response.onsetMs + deviation.onsetMs, readSteps.onsetMs),
    amplitudeUv: rounded(response.amplitudeUv * (1 + deviation.amplitudeShare), outlet.kind === 'muscle' ? readSteps.muscleUv : readSteps.nerveUv),
    durationMs: rounded(response.durationMs, readSteps.durationMs),
  };
}

function rounded(value: number, step: number): number {
  return Number((Math.round(value / step) * step).toFixed(2));
}
