'use client';

import { useLayoutEffect, useState, type RefObject } from 'react';
import { flushSync } from 'react-dom';

import { useFontArrivals, useWindowSize } from '@/app/_features/theatre/use-window-size';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import { theatreTypeScale } from '@/lib/chart/theatre-type-scale';

/** Sizes in px as they were set on the page, and whether there is room for what is only good to know. */
export interface WallType {
  readonly neededPx: number;
  /** Width between the margins of the wall. */
  readonly roomPx: number;
  readonly hasAges: boolean;
  readonly emphasis: number;
  /** How many of the facts at the foot there is room for, most needed first. */
  readonly factCount: number;
}

/**
 * Steps of a full screen, roomiest first: headline against state size, words against needed size. 0.73 is 16 minutes
 * of arc, the least that the ergonomics standard allows (from memory). Below that stand only walls too small for their
 * distance, as two nerves on 55 inches at 5 m: smaller words before cut words.
 */
const steps = [
  { headline: 1.8, needed: 1, hasAges: true, emphasis: 1.8, factCount: 6 },
  { headline: 1.5, needed: 1, hasAges: true, emphasis: 1.4, factCount: 6 },
  { headline: 1.2, needed: 1, hasAges: true, emphasis: 1, factCount: 6 },
  { headline: 1, needed: 1, hasAges: true, emphasis: 1, factCount: 6 },
  { headline: 1, needed: 1, hasAges: false, emphasis: 1, factCount: 6 },
  { headline: 1, needed: 1, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 0.95, needed: 0.93, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 0.9, needed: 0.86, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 0.85, needed: 0.79, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 0.8, needed: 0.73, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 0.8, needed: 0.73, hasAges: false, emphasis: 1, factCount: 0 },
  { headline: 0.7, needed: 0.64, hasAges: false, emphasis: 1, factCount: 0 },
  { headline: 0.6, needed: 0.56, hasAges: false, emphasis: 1, factCount: 0 },
] as const;

/** Side margin of the wall in needed sizes; the same as `--edge-room` in globals.css. */
const edgeRoom = 1.15;

/**
 * Sets the type of a wall from where it is read and steps down until nothing is cut. `words` is all that is shown; its
 * digits do not count, so that a running number never moves the picture. The sizes go to the element as custom
 * properties: the content policy forbids style attributes.
 */
export function useWallType(root: RefObject<HTMLElement | null>, settings: WallSettings, words: string): WallType {
  const { distanceM, diagonalInch } = settings;
  const { widthPx, heightPx } = useWindowSize();
  const fontArrivals = useFontArrivals();
  const fitKey = [fontArrivals, words.replaceAll(/\d/g, '0'), widthPx, heightPx, distanceM, diagonalInch].join('|');
  const [fit, setFit] = useState({ key: fitKey, step: 0 });
  const index = fit.key === fitKey ? fit.step : 0;
  const step = steps[index] ?? steps[0];
  const scale = theatreTypeScale({ distanceM, diagonalInch, widthPx, heightPx });
  const neededPx = Math.round(scale.neededPx * step.needed * 10) / 10;
  const { statePx } = scale;

  useLayoutEffect(() => {
    const element = root.current;
    if (element === null) return;
    element.style.setProperty('--needed', `${neededPx}px`);
    element.style.setProperty('--state', `${statePx * Math.min(step.headline, 1)}px`);
    element.style.setProperty('--headline', `${statePx * step.headline}px`);
    const isCut = element.scrollHeight > element.clientHeight + 1 || element.scrollWidth > element.clientWidth + 1;
    // Before the next paint, so that nobody sees the steps.
    if (isCut && index < steps.length - 1) queueMicrotask(() => flushSync(() => setFit({ key: fitKey, step: index + 1 })));
  }, [root, neededPx, statePx, step.headline, index, fitKey]);

  const { hasAges, emphasis, factCount } = step;
  return { neededPx, roomPx: Math.floor(widthPx - 2 * edgeRoom * neededPx), hasAges, emphasis, factCount };
}
