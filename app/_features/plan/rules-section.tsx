'use client';

import { PlanField } from '@/app/_features/plan/plan-field';
import { Section } from '@/app/_features/plan/section';
import type { RuleSet } from '@/lib/alert/rule-set';

type Limit = Exclude<keyof RuleSet, 'version'>;

const groups: readonly { readonly title: string; readonly rows: readonly (readonly [Limit, string, string])[] }[] = [
  {
    title: 'What counts as a change',
    rows: [
      ['amplitudeWatchFallPercent', 'Watch: amplitude down by', '%'],
      ['amplitudeNoticeFallPercent', 'Notice: amplitude down by', '%'],
      ['lostBelowPercent', 'Lost: under this share of baseline', '%'],
      ['onsetNoticeRisePercent', 'Notice: onset late by', '%'],
      ['onsetNoticeRiseMs', 'and at least', 'ms'],
      ['segmentTimeRisePercent', 'Notice: segment time up by', '%'],
      ['segmentTimeRiseMs', 'and at least', 'ms'],
      ['amplitudeRatioFallPercent', 'Notice: proximal to distal ratio down by', '%'],
      ['worseningPercent', 'Worse: further down by', 'points'],
      ['recoveryMarginPercent', 'Recovered: inside the limit by', '%'],
    ],
  },
  {
    title: 'How long',
    rows: [
      ['freshnessMinutes', 'A test is fresh for', 'min'],
      ['repeatWithinSeconds', 'Repeat a notice within', 's'],
      ['repeatLostWithinSeconds', 'Repeat a loss within', 's'],
      ['tellWithinSeconds', 'Tell an alert within', 's'],
    ],
  },
  {
    title: 'How exact',
    rows: [
      ['assumedAmplitudeScatter', 'Amplitude scatter assumed', 'share'],
      ['distanceErrorMm', 'Error of a distance', 'mm'],
      ['markerErrorMs', 'Error of a marker', 'ms'],
    ],
  },
];

/** The limits of this case, each to be set by the team. */
export function RulesSection() {
  return (
    <Section
      title="Limits"
      text="Custom: customary limits of the trade without a validating study in limb nerves. The team sets them; they are copied into this case and shown wherever they count."
    >
      <div className="grid gap-x-10 gap-y-6 lg:grid-cols-3">
        {groups.map((group) => (
          <div key={group.title} className="flex flex-col gap-3">
            <h3 className="font-semibold">{group.title}</h3>
            {group.rows.map(([limit, label, unit]) => (
              <PlanField key={limit} name={`plan.rules.${limit}`} label={label} isNumeric unit={unit} />
            ))}
          </div>
        ))}
      </div>
    </Section>
  );
}
