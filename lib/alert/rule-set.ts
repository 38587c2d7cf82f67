/**
 * The limits a case is judged by, as data. Copied into the case when it is planned, so a later change of
 * the template never touches it. Percent fields are falls or rises against baseline, in percent.
 */
export interface RuleSet {
  readonly version: 1;
  readonly amplitudeWatchFallPercent: number;
  readonly amplitudeNoticeFallPercent: number;
  readonly onsetNoticeRisePercent: number;
  readonly onsetNoticeRiseMs: number;
  readonly segmentTimeRisePercent: number;
  readonly segmentTimeRiseMs: number;
  readonly amplitudeRatioFallPercent: number;
  readonly lostBelowPercent: number;
  readonly recoveryMarginPercent: number;
  readonly worseningPercent: number;
  readonly freshnessMinutes: number;
  readonly repeatWithinSeconds: number;
  readonly repeatLostWithinSeconds: number;
  readonly tellWithinSeconds: number;
  readonly assumedAmplitudeScatter: number;
  readonly distanceErrorMm: number;
  readonly markerErrorMs: number;
}

/**
 * The limits a case starts with.
 * @source custom: customary limits of the trade without a validating study in limb nerves; the −50 % with +10 %
 *   pair and the −20 % ratio come from laryngeal-nerve practice (from memory; ratio from a published laryngeal series)
 */
export const defaultRuleSet: RuleSet = {
  version: 1,
  amplitudeWatchFallPercent: 30,
  amplitudeNoticeFallPercent: 50,
  onsetNoticeRisePercent: 10,
  onsetNoticeRiseMs: 0.3,
  segmentTimeRisePercent: 20,
  segmentTimeRiseMs: 0.4,
  amplitudeRatioFallPercent: 20,
  lostBelowPercent: 5,
  recoveryMarginPercent: 5,
  worseningPercent: 20,
  freshnessMinutes: 5,
  repeatWithinSeconds: 90,
  repeatLostWithinSeconds: 30,
  tellWithinSeconds: 60,
  assumedAmplitudeScatter: 0.08,
  distanceErrorMm: 2,
  markerErrorMs: 0.05,
};
