'use client';

import { useLayoutEffect, useRef, useState } from 'react';

import { ScenePicture } from '@/app/_ui/scene-picture';
import { joinClasses } from '@/app/_ui/join-classes';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineScene } from '@/lib/chart/nerve-line-scene';

interface NerveLinesProps {
  readonly views: readonly NerveLineView[];
  readonly textPx: number;
  readonly hasAges: boolean;
  readonly emphasis: number;
}

/** The nerves of the case over the whole width, each drawn to scale; several share the height. */
export function NerveLines({ views, textPx, hasAges, emphasis }: NerveLinesProps) {
  const frame = useRef<HTMLDivElement>(null);
  const [widthPx, setWidthPx] = useState<number | null>(null);
  useLayoutEffect(() => {
    const element = frame.current;
    if (element === null) return;
    const measure = () => setWidthPx(Math.max(200, Math.floor(element.clientWidth)));
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  const isAlone = views.length === 1;
  return (
    <div ref={frame} className="flex min-w-0 flex-col justify-evenly gap-[0.6em] overflow-x-hidden text-(length:--needed)">
      {widthPx === null
        ? null
        : views.map((view) => (
            <figure key={view.nerveId} className="m-0">
              <figcaption className={joinClasses('mb-[0.2em] leading-none font-bold', isAlone && 'sr-only')}>{view.nerveName}</figcaption>
              <ScenePicture scene={nerveLineScene(view, { widthPx, textPx, hasAges, emphasis: isAlone ? emphasis : 1 })} className="block" />
            </figure>
          ))}
    </div>
  );
}
