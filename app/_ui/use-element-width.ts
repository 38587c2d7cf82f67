'use client';

import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

const leastWidthPx = 280;

/** The width that the page gives an element, in px; null before it was measured. */
export function useElementWidth(): { readonly ref: RefObject<HTMLDivElement | null>; readonly widthPx: number | null } {
  const ref = useRef<HTMLDivElement>(null);
  const [widthPx, setWidthPx] = useState<number | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (element === null) return;
    const measure = () => setWidthPx(Math.max(leastWidthPx, Math.floor(element.clientWidth)));
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, widthPx };
}
