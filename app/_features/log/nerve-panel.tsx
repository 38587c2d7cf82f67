'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { useNow } from '@/app/_live/use-now';
import { joinClasses } from '@/app/_ui/join-classes';
import { MeasuredScene } from '@/app/_ui/measured-scene';
import { nerveLineScene } from '@/lib/chart/nerve-line-scene';
import { nerveLineView } from '@/lib/chart/nerve-line-view';

/** The nerves at risk to scale, as the case stands now; two share the width. */
export function NervePanel() {
  const { state } = useLogCase();
  const nowMs = useNow(1000);
  const nerves = state.plan.nerves.filter((nerve) => nerve.role === 'at-risk');
  return (
    <div className={joinClasses('grid shrink-0 gap-x-8 px-5 pt-3 pb-2', nerves.length > 1 && 'xl:grid-cols-2')}>
      {nerves.map((nerve) => {
        const view = nerveLineView(state, nerve.id, nowMs);
        return (
          <figure key={nerve.id} className="min-w-0">
            <figcaption className={nerves.length > 1 ? 'mb-1 text-sm font-bold' : 'sr-only'}>{nerve.name}</figcaption>
            <MeasuredScene draw={(widthPx, remPx) => nerveLineScene(view, { widthPx, textPx: (nerves.length > 1 ? 0.78 : 0.875) * remPx, hasAges: true })} />
          </figure>
        );
      })}
    </div>
  );
}
