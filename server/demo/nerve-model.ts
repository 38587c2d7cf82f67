/** A stretch of nerve from the end of the one before it, with the velocity it has at the reference temperature. */
export interface Stretch {
  readonly toMm: number;
  readonly velocityMps: number;
}

/** Where the impulse is recorded. A muscle is left the trunk for at `atMm` and answers after its terminal latency. */
export interface Outlet {
  readonly channelId: string;
  readonly kind: 'muscle' | 'nerve';
  readonly atMm: number;
  readonly terminalMs: number;
  readonly fullUv: number;
  readonly durationMs: number;
}

/** A nerve of the invented patient: everything that is read from it follows from these figures. */
export interface ModelNerve {
  readonly id: string;
  readonly stretches: readonly Stretch[];
  readonly outlets: readonly Outlet[];
}

/** A stretch where a share of the fibres is blocked, and the rest is late. */
export interface Lesion {
  readonly fromMm: number;
  readonly toMm: number;
  readonly conductingShare: number;
  readonly delayMs: number;
}

/** What acts on the nerve now. */
export interface NerveCondition {
  readonly temperatureC: number;
  /** Share of the muscle fibres that still answer the nerve: below 1 under a relaxant. */
  readonly transmission: number;
  /** Share of the fibres that conduct under and distal to a cuff, and how much slower. */
  readonly cuffShare: number;
  readonly cuffVelocityShare: number;
  readonly lesions: readonly Lesion[];
}

/** A stimulus at a place of the nerve. Below the threshold nothing answers, from the maximal current on every fibre. */
export interface Stimulus {
  readonly positionMm: number;
  readonly intensityMa: number;
  readonly thresholdMa: number;
  readonly maximalMa: number;
}

/** What the model gives: a response, or null where nothing reaches the recording. */
export interface Response {
  readonly onsetMs: number;
  readonly amplitudeUv: number;
  readonly durationMs: number;
}

/** Temperature at which the velocities of the model are stated, °C at the skin (house rule). */
export const referenceC = 33.5;
/** Ulnar motor velocity, m/s for each °C: 15 m/s for 10 °C (Vanggaard 1975). */
export const velocityMpsPerC = 1.5;
/** Distal motor latency, ms for each °C of cooling (Kim 2006, review). */
export const distalMsPerC = 0.2;
/** Amplitude lost by dispersion on 100 mm of healthy nerve: well inside the 20 % that a long limb segment may lose (from memory). */
const dispersionPer100Mm = 0.015;
/** Below these a response cannot be told from noise, µV (common practice: three times the noise). */
const smallestUv = { muscle: 30, nerve: 1.5 } as const;

/**
 * The response of one recording to one stimulus.
 *
 * Method: conduction time stretch by stretch, velocity corrected for temperature and cuff, then the terminal latency;
 * amplitude from the fibres that the stimulus reaches, that every lesion on the way lets through, and that the muscle
 * answers. Cooling changes times only: whether it changes amplitudes is disputed.
 */
export function respond(nerve: ModelNerve, outlet: Outlet, stimulus: Stimulus, condition: NerveCondition): Response | null {
  const passed = condition.lesions.filter((lesion) => stimulus.positionMm <= lesion.fromMm && lesion.toMm <= outlet.atMm);
  const conducting = passed.reduce((share, lesion) => share * lesion.conductingShare, condition.cuffShare);
  const distanceMm = outlet.atMm - stimulus.positionMm;
  const dispersed = (1 - dispersionPer100Mm) ** (distanceMm / 100);
  const answering = outlet.kind === 'muscle' ? condition.transmission : 1;
  const amplitudeUv = outlet.fullUv * reached(stimulus) * conducting * dispersed * answering;
  if (distanceMm < 0 || amplitudeUv < smallestUv[outlet.kind]) return null;
  const delayMs = passed.reduce((sum, lesion) => sum + lesion.delayMs, 0);
  const travelMs = conductionMs(nerve, stimulus.positionMm, outlet.atMm, condition);
  return { onsetMs: travelMs + delayMs + terminalMs(outlet, condition), amplitudeUv, durationMs: outlet.durationMs / dispersed };
}

/** Share of the fibres that a current reaches: between threshold and maximal current they join evenly (house rule). */
function reached({ intensityMa, thresholdMa, maximalMa }: Stimulus): number {
  return Math.min(1, Math.max(0, (intensityMa - thresholdMa) / (maximalMa - thresholdMa)));
}

function terminalMs(outlet: Outlet, { temperatureC, cuffVelocityShare }: NerveCondition): number {
  if (outlet.kind === 'nerve') return 0;
  return (outlet.terminalMs + distalMsPerC * (referenceC - temperatureC)) / cuffVelocityShare;
}

function conductionMs(nerve: ModelNerve, fromMm: number, toMm: number, condition: NerveCondition): number {
  const cooledMps = velocityMpsPerC * (referenceC - condition.temperatureC);
  return nerve.stretches.reduce((sum, { toMm: endMm, velocityMps }, index) => {
    const beginMm = nerve.stretches[index - 1]?.toMm ?? 0;
    const lengthMm = Math.max(0, Math.min(endMm, toMm) - Math.max(beginMm, fromMm));
    return sum + lengthMm / ((velocityMps - cooledMps) * condition.cuffVelocityShare);
  }, 0);
}

/** Charge of one phase in µC: current × width. */
export function chargeUc(intensityMa: number, pulseWidthUs: number): number {
  return (intensityMa * pulseWidthUs) / 1000;
}

/** A nerve on which nothing acts. */
export const healthy: NerveCondition = { temperatureC: referenceC, transmission: 1, cuffShare: 1, cuffVelocityShare: 1, lesions: [] };

/** A share on its way back: from one value towards another, by the same part of what is missing in equal times. */
export function comingBack(from: number, to: number, seconds: number, constantSeconds: number): number {
  return to - (to - from) * Math.exp(-Math.max(0, seconds) / constantSeconds);
}
