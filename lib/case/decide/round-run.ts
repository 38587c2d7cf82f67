import type { RunBody } from '@/lib/case/run-body';
import type { Reading } from '@/lib/response/reading';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** A run with every number at its unit's resolution, rounded once before anything is computed. @returns a new run @source house rule */
export function roundRun(run: RunBody): RunBody {
  return {
    ...run,
    intensityMa: roundTo(run.intensityMa, resolutions.intensityMa),
    maximalResponseMa: orNull(run.maximalResponseMa, resolutions.intensityMa),
    pulseWidthUs: roundTo(run.pulseWidthUs, resolutions.pulseWidthUs),
    readings: run.readings.map((row) => ({ channelId: row.channelId, reading: roundReading(row.reading) })),
  };
}

function roundReading(reading: Reading): Reading {
  if (reading.kind === 'absent') {
    return { kind: 'absent', highestIntensityMa: roundTo(reading.highestIntensityMa, resolutions.intensityMa) };
  }
  if (reading.kind !== 'measured') return reading;
  return {
    kind: 'measured',
    onsetMs: orNull(reading.onsetMs, resolutions.timeMs),
    amplitudeUv: orNull(reading.amplitudeUv, resolutions.amplitudeUv),
    durationMs: orNull(reading.durationMs, resolutions.timeMs),
  };
}

function orNull(value: number | null, resolution: number): number | null {
  return value === null ? null : roundTo(value, resolution);
}
