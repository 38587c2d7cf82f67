/**
 * The step to which each quantity is rounded before it meets a limit or enters an entry.
 *
 * Method: each step lies well below what a person can mark and above binary noise, so two
 * engines agree on the last digit. Currents keep 0.01 mA because thresholds on the exposed nerve
 * lie near 0.1 mA. A step is not an error: standard errors are computed beside the value.
 *
 * @returns steps in the unit at the end of each name (ms, µV, mV·ms, m/s, %, mm, mA, µs, °C)
 * @source house rule
 * @accuracy exact; tests/lib/units/resolutions.test.ts
 * @example
 * resolutions.timeMs // => 0.001
 */
export const resolutions = {
  timeMs: 0.001,
  amplitudeUv: 0.01,
  areaMvMs: 0.001,
  velocityMps: 0.01,
  percent: 0.1,
  ratio: 0.001,
  coefficientOfVariation: 0.0001,
  distanceMm: 0.1,
  intensityMa: 0.01,
  pulseWidthUs: 1,
  temperatureC: 0.1,
} as const;
