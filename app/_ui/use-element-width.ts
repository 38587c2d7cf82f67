'use client';

import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

const leastWidthPx = 280;
const plainRemPx = 16;

/** The width that the page gives an element, and the size of its root letter, in px; null before it was measured. */
export function useElementWidth(): { readonly ref: RefObject<HTMLDivElement | null>; readonly widthPx: number | null; readonly remPx: number } {
  const ref = useRef<HTMLDivElement>(null);
  const [widthPx, setWidthPx] = useState<number | null>(null);
  const [remPx, setRemPx] = useState(plainRemPx);
  useLayoutEffect(() => {
    const element = ref.current;
    if (element === null) return;
    const measure = () => {
      setWidthPx(Math.max(leastWidthPx, Math.floor(element.clientWidth)));
      setRemPx(Number.parseFloat(getComputedStyle(document.documentElement).fontSize) || plainRemPx);
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, widthPx, remPx };
}
