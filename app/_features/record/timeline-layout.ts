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

const columnRem = 5.6;
const rowRem = 2.2;
const edgeRem = 0.75;

/**
 * Places on a true time axis, with their words as near as they fit without touching, so that seconds and minutes can both
 * be read. Lying while every word has its column, else upright.
 */
export function timelineLayout(atMs: readonly number[], widthPx: number, remPx: number): TimelineLayout {
  const isUpright = widthPx < atMs.length * columnRem * remPx;
  const slotPx = (isUpright ? rowRem : columnRem) * remPx;
  const lengthPx = isUpright ? atMs.length * slotPx : widthPx;
  const first = Math.min(...atMs);
  const spanMs = Math.max(1, Math.max(...atMs) - first);
  const edgePx = edgeRem * remPx;
  const ticks = atMs.map((ms) => edgePx + ((ms - first) / spanMs) * (lengthPx - 2 * edgePx));
  const labels = spread(ticks, slotPx, lengthPx);
  return { isUpright, lengthPx, places: ticks.map((tickPx, index) => ({ tickPx, labelPx: labels[index] ?? tickPx })) };
}

/** The same places, moved apart to a distance and kept inside the length; they have to fit. */
function spread(ticks: readonly number[], slotPx: number, lengthPx: number): readonly number[] {
  const places: number[] = [];
  for (const tick of ticks) places.push(Math.max(tick, (places.at(-1) ?? -slotPx / 2) + slotPx));
  let limit = lengthPx - slotPx / 2;
  for (let index = places.length - 1; index >= 0; index -= 1) {
    places[index] = Math.min(places[index] ?? limit, limit);
    limit = (places[index] ?? limit) - slotPx;
  }
  return places;
}
