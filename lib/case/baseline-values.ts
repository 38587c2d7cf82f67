import type { KeptRun } from '@/lib/case/case-state';
import type { BaselineValues } from '@/lib/case/entry-bodies';
import { pathIdOf } from '@/lib/case/keys';
import { baselineScatter } from '@/lib/change/baseline-scatter';
import type { Reading } from '@/lib/response/reading';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/**
 * The baseline of one path from its accepted runs: means, scatter and stimulus.
 *
 * Method: arithmetic mean of what was read; scatter of amplitude from three runs or more, else the assumed figure.
 * Runs without a response on the path do not count.
 *
 * @param runs accepted runs, oldest first; not modified
 * @param pathId the path
 * @param assumedAmplitudeScatter coefficient of variation used below three runs
 * @returns rounded values; null when no run has a response on the path
 * @source house rule: a baseline is a mean of like runs
 * @accuracy times to 0.001 ms, amplitude to 0.01 µV; tests/lib/case/baseline.test.ts
 * @example
 * baselineValues(runs, 'wrist/adm', 0.08)?.amplitudeUv
 */
export function baselineValues(runs: readonly KeptRun[], pathId: string, assumedAmplitudeScatter: number): BaselineValues | null {
  const used = runs.filter((kept) => responseOf(kept, pathId) !== null);
  const newest = used.at(-1);
  if (newest === undefined) return null;
  const readings = used.map((kept) => responseOf(kept, pathId)).filter((reading) => reading !== null);
  const amplitudesUv = numbers(readings.map((reading) => reading.amplitudeUv));
  const scatter = baselineScatter({ amplitudesUv, assumedCoefficientOfVariation: assumedAmplitudeScatter });
  const { run } = newest;
  return {
    pathId,
    runSeqs: used.map((kept) => kept.seq),
    at: newest.at,
    onsetMs: mean(numbers(readings.map((reading) => reading.onsetMs)), resolutions.timeMs),
    amplitudeUv: mean(amplitudesUv, resolutions.amplitudeUv),
    durationMs: mean(numbers(readings.map((reading) => reading.durationMs)), resolutions.timeMs),
    amplitudeScatter: scatter.coefficientOfVariation,
    isScatterAssumed: scatter.isAssumed,
    intensityMa: run.intensityMa,
    pulseWidthUs: run.pulseWidthUs,
    isSupramaximal: run.isSupramaximal,
    maximalResponseMa: run.maximalResponseMa,
  };
}

function responseOf(kept: KeptRun, pathId: string): Extract<Reading, { kind: 'measured' }> | null {
  const row = kept.run.readings.find((candidate) => pathIdOf(kept.run.siteId, candidate.channelId) === pathId);
  return row?.reading.kind === 'measured' && (row.reading.amplitudeUv ?? 0) > 0 ? row.reading : null;
}

function numbers(values: readonly (number | null)[]): readonly number[] {
  return values.filter((value) => value !== null);
}

function mean(values: readonly number[], resolution: number): number | null {
  if (values.length === 0) return null;
  return roundTo(values.reduce((sum, value) => sum + value, 0) / values.length, resolution);
}
