/** A label that wants to stand centred on a place. */
export interface Label {
  readonly centrePx: number;
  readonly widthPx: number;
}

/** Where a label came to stand: its row, counted from the line outwards, and its centre. */
export interface PlacedLabel {
  readonly row: number;
  readonly centrePx: number;
}

/** How far a label may be pushed aside, as a share of its width: the place it names stays under it. */
const mostShift = 0.35;

/**
 * Places labels over their points so that none touches another: pushed aside a little, else in alternating rows.
 *
 * Method: with one row, then two, and so on, the labels take the rows in turn; inside a row each is pushed right of its
 * neighbour, then back from the right edge. The first number of rows in which nobody is pushed by more than about a third
 * of its width is taken; with one row for each label there is always room. Labels wider than the picture stand in
 * its middle and stick out: the caller shortens them first.
 *
 * @param labels wanted centre and width in px, ordered by centre; not modified
 * @param roomPx width of the picture in px
 * @param gapPx least distance between neighbours in px
 * @param mostRows rows the caller accepts; Infinity for as many as needed
 * @returns one place for each label in the same order; null when more rows than `mostRows` would be needed
 * @source house rule
 * @accuracy tests/lib/chart/pack-labels.test.ts (property test: no two labels of a row touch)
 * @example
 * packLabels([{ centrePx: 10, widthPx: 20 }, { centrePx: 15, widthPx: 20 }], 100, 2, Infinity)
 *   // => [{ row: 0, centrePx: 10 }, { row: 1, centrePx: 15 }]
 */
export function packLabels(labels: readonly Label[], roomPx: number, gapPx: number, mostRows: number): readonly PlacedLabel[] | null {
  for (let rows = 1; rows <= Math.min(mostRows, Math.max(1, labels.length)); rows += 1) {
    const placed = placeInRows(labels, rows, roomPx, gapPx);
    if (placed !== null) return placed;
  }
  return null;
}

function placeInRows(labels: readonly Label[], rows: number, roomPx: number, gapPx: number): readonly PlacedLabel[] | null {
  const placed: PlacedLabel[] = new Array<PlacedLabel>(labels.length);
  for (let row = 0; row < rows; row += 1) {
    const indexes = labels.map((_, index) => index).filter((index) => index % rows === row);
    const centres = packRow(indexes.map((index) => labels[index]!), roomPx, gapPx);
    if (centres === null) return null;
    indexes.forEach((index, position) => (placed[index] = { row, centrePx: centres[position]! }));
  }
  return placed;
}

function packRow(labels: readonly Label[], roomPx: number, gapPx: number): readonly number[] | null {
  const centres = labels.map((label) => clampCentre(label, roomPx));
  for (let index = 1; index < labels.length; index += 1) {
    centres[index] = Math.max(centres[index]!, centres[index - 1]! + distance(labels[index - 1]!, labels[index]!, gapPx));
  }
  for (let index = labels.length - 1; index >= 0; index -= 1) {
    const next = index + 1 < labels.length ? centres[index + 1]! - distance(labels[index]!, labels[index + 1]!, gapPx) : Infinity;
    centres[index] = Math.min(centres[index]!, next, Math.max(roomPx - labels[index]!.widthPx / 2, roomPx / 2));
  }
  const isAlone = labels.length === 1;
  return labels.every((label, index) => isAlone || fits(label, centres[index]!, roomPx)) ? centres : null;
}

function fits(label: Label, centrePx: number, roomPx: number): boolean {
  const shift = Math.abs(centrePx - clampCentre(label, roomPx));
  return shift <= label.widthPx * mostShift && centrePx - label.widthPx / 2 >= -0.01 && centrePx + label.widthPx / 2 <= roomPx + 0.01;
}

function clampCentre(label: Label, roomPx: number): number {
  if (label.widthPx >= roomPx) return roomPx / 2;
  return Math.min(Math.max(label.centrePx, label.widthPx / 2), roomPx - label.widthPx / 2);
}

function distance(left: Label, right: Label, gapPx: number): number {
  return (left.widthPx + right.widthPx) / 2 + gapPx;
}
