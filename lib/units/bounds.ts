/** The limits of one field: both ends are allowed. `unit` is empty for counts and ratios. */
export interface Bound {
  readonly min: number
  readonly max: number
  readonly unit: string
  readonly reason: string
}

/**
 * What a field can hold, with the reason in the trade's terms.
 *
 * Method: outside these limits a number is a slip of the hand or of the unit, never a patient.
 * They say nothing about normal or abnormal, and a value inside them may still be asked back.
 *
 * @returns rows of {min, max, unit, reason}, keyed by field name with the unit last
 * @source house rule, drawn around common practice with a wide margin
 * @accuracy exact; tests/lib/units/bounds.test.ts tests both sides of each limit
 * @example
 * bounds.onsetMs.min // => 0.1
 */
export const bounds = {
  onsetMs: {
    min: 0.1,
    max: 100,
    unit: 'ms',
    reason: 'Earlier than 0.1 ms is the stimulus artefact, later than 100 ms is no direct response',
  },
  conductionTimeMs: {
    min: 0.001,
    max: 100,
    unit: 'ms',
    reason: 'Two onsets differ by one step of the marker at least and by less than the latest onset',
  },
  peakMs: {
    min: 0.1,
    max: 200,
    unit: 'ms',
    reason: 'A peak follows its onset, and a direct response is over within 200 ms',
  },
  durationMs: {
    min: 0.1,
    max: 100,
    unit: 'ms',
    reason: 'A negative peak lasts longer than one mark on the screen and ends within 100 ms',
  },
  amplitudeUv: {
    min: 0,
    max: 100_000,
    unit: 'µV',
    reason: 'No muscle or nerve response exceeds 100 mV, and a size has no sign',
  },
  areaMvMs: {
    min: 0,
    max: 1_000,
    unit: 'mV·ms',
    reason: 'The area under a negative peak stays far below 1,000 mV·ms, and a size has no sign',
  },
  noiseUv: {
    min: 0,
    max: 10_000,
    unit: 'µV',
    reason: 'A baseline noisier than 10 mV hides every response, and a size has no sign',
  },
  distanceMm: {
    min: 1,
    max: 1_500,
    unit: 'mm',
    reason: 'Two sites lie at least 1 mm apart and within the length of one limb',
  },
  positionMm: {
    min: 0,
    max: 1_500,
    unit: 'mm',
    reason: 'A site lies distal to the most proximal one and within the length of one limb',
  },
  intensityMa: {
    min: 0,
    max: 100,
    unit: 'mA',
    reason: 'Nerve stimulators deliver up to 100 mA, and a current has no sign here: polarity is named apart',
  },
  pulseWidthUs: {
    min: 10,
    max: 2_000,
    unit: 'µs',
    reason: 'Nerve stimulators deliver pulses of 10 to 2,000 µs',
  },
  stimulusRateHz: {
    min: 0.1,
    max: 100,
    unit: 'Hz',
    reason: 'Single responses are taken at 0.1 to 100 stimuli a second',
  },
  temperatureC: {
    min: 15,
    max: 45,
    unit: '°C',
    reason: 'A limb in theatre lies between a cold room and the heat that burns',
  },
  trainOfFourCount: {
    min: 0,
    max: 4,
    unit: '',
    reason: 'Four stimuli give none to four twitches',
  },
  trainOfFourRatio: {
    min: 0,
    max: 1.5,
    unit: '',
    reason: 'The fourth twitch is at most half as large again as the first',
  },
  cuffPressureMmHg: {
    min: 0,
    max: 600,
    unit: 'mmHg',
    reason: 'Tourniquets are not driven beyond 600 mmHg',
  },
  meanPressureMmHg: {
    min: 10,
    max: 250,
    unit: 'mmHg',
    reason: 'A mean arterial pressure outside 10 to 250 mmHg is a slip or a disconnected line',
  },
  distanceErrorMm: {
    min: 0,
    max: 50,
    unit: 'mm',
    reason: 'A tape that errs by more than 50 mm measures no segment',
  },
  markerErrorMs: {
    min: 0,
    max: 5,
    unit: 'ms',
    reason: 'A mark that errs by more than 5 ms marks no onset',
  },
  coefficientOfVariation: {
    min: 0,
    max: 10,
    unit: '',
    reason: 'A scatter above ten times the mean is no baseline',
  },
  runCount: {
    min: 1,
    max: 1_000,
    unit: '',
    reason: 'A baseline is made of one run at least and of no more than a case can hold',
  },
} as const satisfies Record<string, Bound>;

/** The name of a field that has limits. */
export type BoundedQuantity = keyof typeof bounds;
