'use client';

import { useWatch } from 'react-hook-form';

import { buildPlan } from '@/app/_features/plan/build-plan';
import { templateOf, type PlanForm } from '@/app/_features/plan/plan-form';
import { MeasuredScene } from '@/app/_ui/measured-scene';
import { initialState } from '@/lib/case/initial-state';
import type { NerveLineSegment } from '@/lib/chart/nerve-line';
import { nerveLineScene } from '@/lib/chart/nerve-line-scene';
import { nerveLineView } from '@/lib/chart/nerve-line-view';

/** The nerve as it is planned, to scale, drawn again with every change; a sentence while it cannot be drawn. */
export function PlanLine({ nerveIndex }: { readonly nerveIndex: number }) {
  const form = useWatch<PlanForm>() as PlanForm;
  const plan = buildPlan(form, templateOf(form.plan.templateId));
  const nerve = plan.nerves[nerveIndex];
  if (nerve === undefined) return null;
  const positions = [...nerve.sites.map((site) => site.positionMm), ...plan.channels.filter((channel) => channel.nerveId === nerve.id).map((channel) => channel.positionMm)];
  const isRising = nerve.sites.every((site, index) => index === 0 || site.positionMm > (nerve.sites[index - 1]?.positionMm ?? 0));
  if (positions.some((position) => !Number.isFinite(position)) || !isRising) {
    return <p className="py-6 text-second">The nerve is drawn when every site has a position in mm and positions rise from proximal to distal.</p>;
  }
  const view = nerveLineView({ ...initialState('plan'), plan }, nerve.id, 0);
  if (view.sites.length === 0) return <p className="py-6 text-second">The nerve is drawn when a channel records distal to its sites.</p>;
  const planned = { ...view, sites: view.sites.map((site) => ({ ...site, text: `${site.positionMm}\u00a0mm` })), segments: view.segments.map(withLength) };
  return <MeasuredScene className="py-3" draw={(widthPx, remPx) => nerveLineScene(planned, { widthPx, textPx: 0.875 * remPx, hasAges: false })} />;
}

/** Nothing is tested while planning: the length stands where the velocity will. */
function withLength(segment: NerveLineSegment): NerveLineSegment {
  const length = `${Math.round((segment.toMm - segment.fromMm) * 10) / 10}\u00a0mm`;
  return { ...segment, text: length, shortText: length };
}
