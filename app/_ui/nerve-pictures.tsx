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
  const { ref, widthPx } = useElementWidth();
  return (
    <div ref={ref} className={className}>
      {widthPx === null
        ? null
        : views.map((view) => (
            <ScenePicture key={view.nerveId} scene={nerveLineScene(views.length > 1 ? named(view) : view, { widthPx, textPx: textPxFor(widthPx), hasAges })} className="block max-w-full" />
          ))}
    </div>
  );
}

/** Type that grows with the line, readable on a telephone and not lost on a wall of pixels. */
function textPxFor(widthPx: number): number {
  return Math.min(26, Math.max(11.5, 9.5 + widthPx / 160));
}

function named(view: NerveLineView): NerveLineView {
  return view.end === null ? view : { ...view, end: { ...view.end, caption: view.nerveName } };
}
