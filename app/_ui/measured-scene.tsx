'use client';

import { ScenePicture } from '@/app/_ui/scene-picture';
import { useElementWidth } from '@/app/_ui/use-element-width';
import type { Scene } from '@/lib/chart/scene';

/** A scene drawn at the width it is given by the page, its letters in proportion to the page's; drawn again when either changes. */
export function MeasuredScene({ draw, className }: { readonly draw: (widthPx: number, remPx: number) => Scene; readonly className?: string }) {
  const { ref, widthPx, remPx } = useElementWidth();
  return (
    <div ref={ref} className={className}>
      {widthPx === null ? null : <ScenePicture scene={draw(widthPx, remPx)} className="block max-w-full" />}
    </div>
  );
}
