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
 * Places labels over their points so that none touches another: pushed aside a little, else in more rows.
 *
 * Method: with one row, then two, and so on, each label takes the first row where it has room as it stands, else the row
 * that leaves it the most; inside a row each is pushed right of its neighbour, then back from the right edge. The first number of rows in which nobody is pushed by more than about a third
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
  const rowOf = rowsTaken(labels, rows, roomPx, gapPx);
  const packed = Array.from({ length: rows }, (_, row) => packRow(labels.filter((__, index) => rowOf[index] === row), roomPx, gapPx));
  if (packed.some((centres) => centres === null)) return null;
  return labels.map((label, index) => {
    const row = rowOf[index] ?? 0;
    const before = rowOf.slice(0, index).filter((other) => other === row).length;
    return { row, centrePx: packed[row]?.[before] ?? label.centrePx };
  });
}

function rowsTaken(labels: readonly Label[], rows: number, roomPx: number, gapPx: number): readonly number[] {
  const endsPx = Array.from({ length: rows }, () => -Infinity);
  return labels.map((label) => {
    const leftPx = clampCentre(label, roomPx) - label.widthPx / 2;
    const free = endsPx.findIndex((endPx) => endPx + gapPx <= leftPx);
    const row = free === -1 ? endsPx.indexOf(Math.min(...endsPx)) : free;
    endsPx[row] = Math.max(leftPx, (endsPx[row] ?? -Infinity) + gapPx) + label.widthPx;
    return row;
  });
}

/** One row: each label pushed right of its neighbour, then all pushed back from the right edge. */
function packRow(labels: readonly Label[], roomPx: number, gapPx: number): readonly number[] | null {
  let leftPx = -Infinity;
  const pushed = labels.map((label) => {
    const centrePx = Math.max(clampCentre(label, roomPx), leftPx + label.widthPx / 2);
    leftPx = centrePx + label.widthPx / 2 + gapPx;
    return { label, centrePx };
  });
  let rightPx = Math.max(roomPx, pushed.at(-1)?.label.widthPx ?? 0);
  const centres = pushed.toReversed().map(({ label, centrePx }) => {
    const backPx = Math.min(centrePx, rightPx - label.widthPx / 2);
    rightPx = backPx - label.widthPx / 2 - gapPx;
    return { label, centrePx: backPx };
  });
  const isPlaced = labels.length === 1 || centres.every(({ label, centrePx }) => fits(label, centrePx, roomPx));
  return isPlaced ? centres.toReversed().map(({ centrePx }) => centrePx) : null;
}

function fits(label: Label, centrePx: number, roomPx: number): boolean {
  const shift = Math.abs(centrePx - clampCentre(label, roomPx));
  return shift <= label.widthPx * mostShift && centrePx - label.widthPx / 2 >= -0.01 && centrePx + label.widthPx / 2 <= roomPx + 0.01;
}

function clampCentre(label: Label, roomPx: number): number {
  if (label.widthPx >= roomPx) return roomPx / 2;
  return Math.min(Math.max(label.centrePx, label.widthPx / 2), roomPx - label.widthPx / 2);
}
