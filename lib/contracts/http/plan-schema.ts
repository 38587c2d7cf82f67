import { z } from 'zod';

import type { CasePlan } from '@/lib/case/plan';
import { boundedNumber, quantity } from '@/lib/contracts/quantity';
import { boundedText, pathSlug, slug } from '@/lib/contracts/text-schemas';

const hotkey = z.string().regex(/^[a-z0-9]$/, 'Not a key: one lower-case letter or digit').nullable();

const site = z.strictObject({
  id: slug,
  name: boundedText(40),
  positionMm: quantity('positionMm'),
  hotkey,
  defaultIntensityMa: quantity('intensityMa'),
});

const nerve = z.strictObject({
  id: slug,
  name: boundedText(40),
  role: z.enum(['at-risk', 'control']),
  sites: z.array(site).min(1).max(12),
});

const channel = z.strictObject({
  id: slug,
  name: boundedText(20),
  longName: boundedText(60),
  kind: z.enum(['muscle', 'nerve']),
  convention: z.enum(['baseline-to-peak', 'peak-to-peak']),
  nerveId: slug,
  positionMm: quantity('positionMm'),
});

const path = z.strictObject({ id: pathSlug, nerveId: slug, siteId: slug, channelId: slug, isRequired: z.boolean() });

const step = z.strictObject({
  id: slug,
  label: boundedText(40),
  since: boundedText(40),
  isRisk: z.boolean(),
  voidsDistances: z.boolean(),
  hotkey,
});

const percent = boundedNumber(1, 99, '1 to 99 % is allowed');
const rules = z.strictObject({
  version: z.literal(1),
  amplitudeWatchFallPercent: percent,
  amplitudeNoticeFallPercent: percent,
  onsetNoticeRisePercent: percent,
  onsetNoticeRiseMs: boundedNumber(0.05, 5, '0.05 to 5 ms is allowed'),
  segmentTimeRisePercent: percent,
  segmentTimeRiseMs: boundedNumber(0.05, 5, '0.05 to 5 ms is allowed'),
  amplitudeRatioFallPercent: percent,
  lostBelowPercent: boundedNumber(1, 20, '1 to 20 % is allowed'),
  recoveryMarginPercent: boundedNumber(1, 30, '1 to 30 % is allowed'),
  worseningPercent: boundedNumber(5, 50, '5 to 50 points are allowed'),
  freshnessMinutes: boundedNumber(1, 30, '1 to 30 min is allowed'),
  repeatWithinSeconds: boundedNumber(10, 600, '10 to 600 s is allowed'),
  repeatLostWithinSeconds: boundedNumber(10, 600, '10 to 600 s is allowed'),
  tellWithinSeconds: boundedNumber(10, 600, '10 to 600 s is allowed'),
  assumedAmplitudeScatter: boundedNumber(0.01, 0.5, '0.01 to 0.5 is allowed'),
  distanceErrorMm: boundedNumber(0.5, 20, '0.5 to 20 mm is allowed'),
  markerErrorMs: boundedNumber(0.005, 1, '0.005 to 1 ms is allowed'),
});

/** The plan of a case as it comes from the plan page. Relations between its parts are checked by `planProblem`. */
export const planSchema: z.ZodType<CasePlan> = z.strictObject({
  templateId: slug,
  procedure: boundedText(80),
  title: boundedText(80),
  side: z.enum(['left', 'right']),
  theatre: boundedText(40),
  nerves: z.array(nerve).min(1).max(8),
  channels: z.array(channel).min(1).max(16),
  paths: z.array(path).min(1).max(96),
  steps: z.array(step).max(20),
  rules,
  electrodes: z.array(z.strictObject({ id: slug, name: boundedText(40) })).min(1).max(8),
  defaultPulseWidthUs: quantity('pulseWidthUs'),
  defaultFamily: z.enum(['pre-position', 'through-skin', 'exposed']),
  closingSiteId: slug,
  trap: boundedText(300),
});
