'use client';

import { useMemo } from 'react';

import { TrendChart } from '@/app/_features/record/trend-chart';
import { nerveTrends, trendSteps } from '@/app/_features/record/trend-points';
import type { CasePlan } from '@/lib/case/plan';
import type { WireEntry } from '@/lib/contracts/http/replies';

interface TrendSectionProps {
  readonly entries: readonly WireEntry[];
  readonly plan: CasePlan;
  readonly timeZone: string;
}

/** Amplitude as % of baseline over the case, one picture for each nerve. */
export function TrendSection({ entries, plan, timeZone }: TrendSectionProps) {
  const trends = useMemo(() => nerveTrends(entries, plan), [entries, plan]);
  const steps = useMemo(() => trendSteps(entries), [entries]);
  return (
    <section aria-label="Amplitude over time" className="mt-8">
      <h2 className="text-xl font-bold">Amplitude, % of baseline</h2>
      {trends.length === 0 ? <p className="py-4 text-second">The trend stands here once a run was compared with its baseline</p> : null}
      {trends.map((trend) => (
        <TrendChart key={trend.nerveId} trend={trend} steps={steps} limitPercent={100 - plan.rules.amplitudeNoticeFallPercent} timeZone={timeZone} />
      ))}
    </section>
  );
}
