'use client';

import { ScenePicture } from '@/app/_ui/scene-picture';
import { useElementWidth } from '@/app/_ui/use-element-width';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineScene } from '@/lib/chart/nerve-line-scene';

interface NervePicturesProps {
  readonly views: readonly NerveLineView[];
  readonly hasAges?: boolean;
  readonly className?: string;
}

/** Nerve lines under one another, at the width the page gives them. Several are named at their ends. */
export function NervePictures({ views, hasAges = false, className }: NervePicturesProps) {
  const { ref, widthPx, remPx } = useElementWidth();
  return (
    <div ref={ref} className={className}>
      {widthPx === null
        ? null
        : views.map((view) => (
            <ScenePicture key={view.nerveId} scene={nerveLineScene(views.length > 1 ? named(view) : view, { widthPx, textPx: textPxFor(widthPx, remPx), hasAges })} className="block max-w-full" />
          ))}
    </div>
  );
}

/** Type that grows with the line and with the page's letters: readable on a telephone, not lost on a very large window. */
function textPxFor(widthPx: number, remPx: number): number {
  const scale = remPx / 16;
  return scale * Math.min(18, Math.max(11.5, 9.5 + widthPx / scale / 160));
}

function named(view: NerveLineView): NerveLineView {
  return view.end === null ? view : { ...view, end: { ...view.end, caption: view.nerveName } };
}
