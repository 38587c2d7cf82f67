'use client';

import { useEffect, useLayoutEffect, useState, type RefObject } from 'react';

import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import { theatreTypeScale } from '@/lib/chart/theatre-type-scale';

/** Sizes in px as they were set on the page, and whether there is room for what is only good to know. */
export interface WallType {
  readonly neededPx: number;
  readonly hasAges: boolean;
  readonly emphasis: number;
}

/**
 * Steps of a full screen, roomiest first: headline against state size, words against needed size. The last ones go
 * down to 16 minutes of arc, the least that the ergonomics standard allows (from memory): smaller words before cut words.
 */
const steps = [
  { headline: 1.8, needed: 1, hasAges: true, emphasis: 1.7 },
  { headline: 1.4, needed: 1, hasAges: true, emphasis: 1.3 },
  { headline: 1.1, needed: 1, hasAges: true, emphasis: 1 },
  { headline: 1, needed: 1, hasAges: false, emphasis: 1 },
  { headline: 0.9, needed: 0.86, hasAges: false, emphasis: 1 },
  { headline: 0.8, needed: 0.73, hasAges: false, emphasis: 1 },
] as const;

/**
 * Sets the type of a wall from where it is read and steps down until nothing is cut. `contents` is any value that
 * changes when the words do. The sizes go to the element as custom properties: the content policy forbids style attributes.
 */
export function useWallType(root: RefObject<HTMLElement | null>, settings: WallSettings, contents: string): WallType {
  const windowSize = useWindowSize();
  const fitKey = `${contents}|${windowSize}|${settings.distanceM}|${settings.diagonalInch}`;
  const [fit, setFit] = useState({ key: fitKey, step: 0 });
  const index = fit.key === fitKey ? fit.step : 0;
  const step = steps[index] ?? steps[0];
  const [widthPx = 1920, heightPx = 1080] = windowSize.split('x').map(Number);
  const scale = theatreTypeScale({ distanceM: settings.distanceM, diagonalInch: settings.diagonalInch, widthPx, heightPx });
  const neededPx = Math.round(scale.neededPx * step.needed * 10) / 10;

  useLayoutEffect(() => {
    const element = root.current;
    if (element === null) return;
    element.style.setProperty('--needed', `${neededPx}px`);
    element.style.setProperty('--state', `${scale.statePx * Math.min(step.headline, 1)}px`);
    element.style.setProperty('--headline', `${scale.statePx * step.headline}px`);
    const isCut = element.scrollHeight > element.clientHeight + 1 || element.scrollWidth > element.clientWidth + 1;
    if (isCut && index < steps.length - 1) setFit({ key: fitKey, step: index + 1 });
  });

  return { neededPx, hasAges: step.hasAges, emphasis: step.emphasis };
}

function useWindowSize(): string {
  const [size, setSize] = useState('1920x1080');
  useEffect(() => {
    const measure = () => setSize(`${Math.max(200, window.innerWidth)}x${Math.max(200, window.innerHeight)}`);
    measure();
    window.addEventListener('resize', measure);
    return () => window.removeEventListener('resize', measure);
  }, []);
  return size;
}
