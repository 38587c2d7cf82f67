/** Where one moment stands on the time axis and where its words stand; px. */
export interface TimelinePlace {
  readonly tickPx: number;
  readonly labelPx: number;
}

/** A time line laid out along one direction. */
export interface TimelineLayout {
  readonly isUpright: boolean;
  readonly lengthPx: number;
  readonly places: readonly TimelinePlace[];
}

const leastColumnRem = 7;
const rowRem = 2.2;
const edgeRem = 0.75;

/**
 * Places on a true time axis, with their words at even distances beside it, so that seconds and minutes can both be read.
 * Lying while every word has its column, else upright.
 */
export function timelineLayout(atMs: readonly number[], widthPx: number, remPx: number): TimelineLayout {
  const isUpright = widthPx / Math.max(1, atMs.length) < leastColumnRem * remPx;
  const lengthPx = isUpright ? atMs.length * rowRem * remPx : widthPx;
  const first = Math.min(...atMs);
  const spanMs = Math.max(1, Math.max(...atMs) - first);
  const edgePx = edgeRem * remPx;
  const slotPx = lengthPx / Math.max(1, atMs.length);
  const places = atMs.map((ms, index) => ({
    tickPx: edgePx + ((ms - first) / spanMs) * (lengthPx - 2 * edgePx),
    labelPx: (index + 0.5) * slotPx,
  }));
  return { isUpright, lengthPx, places };
}
