'use client';

import { useLayoutEffect, useRef, useState } from 'react';

import { ScenePicture } from '@/app/_ui/scene-picture';
import type { Scene } from '@/lib/chart/scene';

const leastWidthPx = 280;

/** A scene drawn at the width it is given by the page, and drawn again when that changes. */
export function MeasuredScene({ draw, className }: { readonly draw: (widthPx: number) => Scene; readonly className?: string }) {
  const frame = useRef<HTMLDivElement>(null);
  const [widthPx, setWidthPx] = useState<number | null>(null);
  useLayoutEffect(() => {
    const element = frame.current;
    if (element === null) return;
    const measure = () => setWidthPx(Math.max(leastWidthPx, Math.floor(element.clientWidth)));
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return (
    <div ref={frame} className={className}>
      {widthPx === null ? null : <ScenePicture scene={draw(widthPx)} className="block max-w-full" />}
    </div>
  );
}
