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
 * distance, as two nerves on 55 inches at 5 m: smaller words before cut words. The state keeps its size longest.
 */
const steps = [
  { headline: 1.8, needed: 1, hasAges: true, emphasis: 1.8, factCount: 6 },
  { headline: 1.5, needed: 1, hasAges: true, emphasis: 1.4, factCount: 6 },
  { headline: 1.2, needed: 1, hasAges: true, emphasis: 1, factCount: 6 },
  { headline: 1, needed: 1, hasAges: true, emphasis: 1, factCount: 6 },
  { headline: 1, needed: 1, hasAges: false, emphasis: 1, factCount: 6 },
  { headline: 1, needed: 1, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 1, needed: 0.93, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 1, needed: 0.86, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 1, needed: 0.79, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 1, needed: 0.73, hasAges: false, emphasis: 1, factCount: 2 },
  { headline: 0.9, needed: 0.73, hasAges: false, emphasis: 1, factCount: 0 },
  { headline: 0.7, needed: 0.64, hasAges: false, emphasis: 1, factCount: 0 },
  { headline: 0.6, needed: 0.56, hasAges: false, emphasis: 1, factCount: 0 },
] as const;

/**
 * What gives way to the words about the link, least needed first. The headline never does: an open alert keeps its size.
 * One row of facts is as high as the strip of the link, so that the last of these is enough wherever facts were shown.
 */
const yields: readonly ((type: typeof steps[number]) => Pick<WallType, 'emphasis' | 'hasAges' | 'factCount'>)[] = [
  (type) => type,
  (type) => ({ ...type, emphasis: 1 }),
  (type) => ({ ...type, emphasis: 1, hasAges: false }),
  ...[3, 2, 1, 0].map((count) => (type: typeof steps[number]) => ({ emphasis: 1, hasAges: false, factCount: Math.min(count, type.factCount) })),
];

/** Side margin of the wall in needed sizes; the same as `--edge-room` in globals.css. */
const edgeRoom = 1.15;

/**
 * Sets the type of a wall from where it is read and steps down until nothing is cut. `words` is all that is shown; its
 * digits do not count, so that a running number never moves the picture. Where all but the strip `link` would fit, the
 * size stays and something less needed gives way to it. The sizes go to the element as custom properties: the content
 * policy forbids style attributes.
 */
export function useWallType(root: RefObject<HTMLElement | null>, settings: WallSettings, words: string, link?: RefObject<HTMLElement | null>): WallType {
  const { distanceM, diagonalInch } = settings;
  const { widthPx, heightPx } = useWindowSize();
  const fontArrivals = useFontArrivals();
  const fitKey = [fontArrivals, words.replaceAll(/\d/g, '0'), widthPx, heightPx, distanceM, diagonalInch].join('|');
  const [fit, setFit] = useState({ key: fitKey, step: 0, yielded: 0 });
  const { step: index, yielded } = fit.key === fitKey ? fit : { step: 0, yielded: 0 };
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
    const next = nextFit(element, link?.current ?? null, index, yielded);
    // Before the next paint, so that nobody sees the steps.
    if (next !== null) queueMicrotask(() => flushSync(() => setFit({ key: fitKey, ...next })));
  }, [root, link, neededPx, statePx, step.headline, index, yielded, fitKey]);

  const { hasAges, emphasis, factCount } = (yields[yielded] ?? ((type) => type))(step);
  return { neededPx, roomPx: Math.floor(widthPx - 2 * edgeRoom * neededPx), hasAges, emphasis, factCount };
}

/** Where to go from a picture that is cut; null when nothing is cut, or nothing is left to give. */
function nextFit(wall: HTMLElement, link: HTMLElement | null, step: number, yielded: number): { readonly step: number; readonly yielded: number } | null {
  const tooHighPx = wall.scrollHeight - wall.clientHeight;
  const isTooWide = wall.scrollWidth > wall.clientWidth + 1;
  if (tooHighPx <= 1 && !isTooWide) return null;
  const isOnlyTheLink = !isTooWide && tooHighPx - (link?.offsetHeight ?? 0) <= 1;
  if (isOnlyTheLink && yielded < yields.length - 1) return { step, yielded: yielded + 1 };
  return step < steps.length - 1 ? { step: step + 1, yielded } : null;
}
