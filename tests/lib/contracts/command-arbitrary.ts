import fc from 'fast-check';

import { defaultRuleSet } from '@/lib/alert/rule-set';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { bounds, type BoundedQuantity } from '@/lib/units/bounds';

/** A number between the bounds of its quantity, both ends now and then. */
export function within(name: BoundedQuantity): fc.Arbitrary<number> {
  const { min, max } = bounds[name];
  return fc.oneof({ weight: 1, arbitrary: fc.constantFrom<number>(min, max) }, { weight: 8, arbitrary: fc.double({ min, max, noNaN: true }) });
}

const orNull = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: null });
const text = (max: number) => fc.string({ unit: 'grapheme', minLength: 1, maxLength: max }).filter((one) => one.trim().length > 0 && one.length <= max && !/[\p{Cc}\u2028-\u202e\u2066-\u2069]/u.test(one));
/** Mostly what the plan has, now and then a stranger. */
const known = (ids: readonly string[], stranger: string) => fc.oneof({ weight: 30, arbitrary: fc.constantFrom(...ids) }, { weight: 1, arbitrary: fc.constant(stranger) });
const siteId = known(['axilla', 'above-elbow', 'below-elbow', 'wrist', 'median-wrist'], 'knee');
const alertId = fc.constantFrom('ulnar-1', 'ulnar-1', 'ulnar-2', 'median-1');

const reading = fc.oneof(
  fc
    .record({ kind: fc.constant('measured'), onsetMs: orNull(within('onsetMs')), amplitudeUv: orNull(within('amplitudeUv')), durationMs: orNull(within('durationMs')) })
    .filter((one) => one.onsetMs !== null || one.amplitudeUv !== null),
  fc.record({ kind: fc.constant('absent'), highestIntensityMa: within('intensityMa') }),
  fc.record({ kind: fc.constant('unusable'), reason: fc.constantFrom('artefact', 'movement', 'cautery', 'wet-field', 'poor-contact', 'off-scale') }),
  fc.record({ kind: fc.constant('not-read') }),
);

const run = fc.record({
  siteId,
  electrodeId: known(['surface', 'surface', 'surface', 'needle'], 'hook'),
  family: fc.constantFrom('through-skin', 'through-skin', 'exposed', 'pre-position'),
  purpose: fc.constantFrom('baseline', 'check', 'closing'),
  intensityMa: fc.oneof(fc.constantFrom(15, 16, 18, 20), within('intensityMa')),
  pulseWidthUs: fc.oneof(fc.constant(200), within('pulseWidthUs')),
  isSupramaximal: fc.boolean(),
  maximalResponseMa: orNull(within('intensityMa')),
  readings: fc.uniqueArray(fc.record({ channelId: known(['adm', 'fdi', 'apb'], 'edb'), reading }), { minLength: 1, selector: (row) => row.channelId }),
  note: orNull(text(60)),
});

const condition = fc.oneof(
  fc.record({ kind: fc.constant('train-of-four'), count: fc.integer({ min: 0, max: 4 }), ratio: orNull(within('trainOfFourRatio')) }),
  fc.record({ kind: fc.constant('tourniquet'), isUp: fc.boolean(), pressureMmHg: orNull(within('cuffPressureMmHg')) }),
  fc.record({ kind: fc.constantFrom('limb-temperature', 'core-temperature'), temperatureC: within('temperatureC') }),
  fc.record({ kind: fc.constant('mean-pressure'), pressureMmHg: within('meanPressureMmHg') }),
  fc.record({ kind: fc.constantFrom('relaxant', 'local-anaesthetic', 'other'), text: text(60) }),
);

const named = <T extends object>(name: string, fields: fc.Arbitrary<T>) => fields.map((rest) => ({ name, ...rest }));

/** Any command a person may give to the ulnar case, inside the bounds of its fields, sensible or not. */
export const commandArbitrary = fc.oneof(
  { weight: 8, arbitrary: named('log-run', fc.record({ run })) },
  { weight: 2, arbitrary: named('correct-run', fc.record({ runSeq: fc.integer({ min: 1, max: 60 }), run: orNull(run), reason: text(40) })) },
  { weight: 2, arbitrary: named('accept-baseline', fc.record({ family: fc.constantFrom('through-skin', 'exposed'), electrodeId: fc.constantFrom('surface', 'needle'), reason: orNull(text(40)) })) },
  named('log-condition', fc.record({ condition, reportedBy: orNull(text(20)) })),
  named('log-step', fc.record({ stepId: fc.constantFrom('nerve-lifted', 'nerve-transposed', 'incision', 'other', 'gone'), label: orNull(text(30)) })),
  named('measure-distances', fc.record({
    nerveId: fc.constantFrom('ulnar', 'median', 'radial'),
    positions: fc.tuple(...[0, 150, 250, 460].map((mm) => fc.oneof(fc.constant(mm), within('positionMm')))).map((values) =>
      values.map((positionMm, index) => ({ siteId: ['axilla', 'above-elbow', 'below-elbow', 'wrist'][index], positionMm })),
    ),
    reason: orNull(text(20)),
  })),
  named('change-phase', fc.record({ phase: fc.constantFrom('set-up', 'baseline', 'monitoring', 'paused', 'take-down'), reason: orNull(text(20)) })),
  named('open-case', fc.record({ clockOffsetMs: orNull(fc.double({ min: -86_400_000, max: 86_400_000, noNaN: true })) })),
  named('confirm-timeout', fc.record({ side: fc.constantFrom('left', 'right'), text: orNull(text(20)) })),
  named('revise-plan', fc.record({ plan: fc.record({ watch: fc.integer({ min: 1, max: 99 }), notice: fc.integer({ min: 1, max: 99 }) }).map(({ watch, notice }) => ({
    ...ulnarAtElbow, rules: { ...defaultRuleSet, amplitudeWatchFallPercent: watch, amplitudeNoticeFallPercent: notice },
  })) })),
  named('tell-alert', fc.record({ alertId, whom: text(20), how: text(20), words: text(60) })),
  named('read-back-alert', fc.record({ alertId, words: orNull(text(20)) })),
  named('act-on-alert', fc.record({ alertId, action: text(20) })),
  named('end-alert', fc.record({ alertId, outcome: fc.constantFrom('full', 'partial', 'none'), cause: fc.constantFrom('surgical', 'undetermined'), text: orNull(text(20)) })),
  named('send-message', fc.record({ text: text(60) })),
  named('close-case', fc.record({ text: orNull(text(20)) })),
);
