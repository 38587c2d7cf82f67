import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import { packLabels, type PlacedLabel } from '@/lib/chart/pack-labels';
import type { Shape, Tone } from '@/lib/chart/scene';
import { shortenText } from '@/lib/chart/shorten-text';
import { textWidth } from '@/lib/chart/text-width';
import { toneOf } from '@/lib/chart/tone-of';
import { wrapName } from '@/lib/chart/wrap-name';

/** One block above the line: a name of one or two lines, and the response under it. */
interface Block {
  readonly key: string;
  readonly x: number;
  readonly nameLines: readonly string[];
  readonly value: string;
  /** Measured values stand larger than words about them. */
  readonly valueSizePx: number;
  readonly tone: Tone;
  readonly widthPx: number;
}

type PlacedBlock = Block & { readonly place: PlacedLabel };

/** The blocks above the line, drawn upwards from 0, and the height they take. */
export interface SiteLabels {
  readonly shapes: readonly Shape[];
  readonly heightPx: number;
}

/**
 * Names and responses above the nerve, none over another.
 *
 * Method: full names in one row; else names on two lines; else two rows; else names cut to the width of the responses
 * and as many rows as it takes. A response is never cut or left out. Blocks away from their site get a leader.
 *
 * @param view the nerve line; not modified
 * @param sizes its lengths
 * @param toX from mm to px
 * @returns shapes with y = 0 at the top edge of the line and upwards negative, and the height in px
 * @source house rule
 * @accuracy tests/lib/chart/nerve-line-scene.test.ts (property test)
 * @example
 * siteLabels(view, sizes, lineScale(view, sizes)).heightPx
 */
export function siteLabels(view: NerveLineView, sizes: NerveLineSizes, toX: (positionMm: number) => number): SiteLabels {
  const single = blocksOf(view, sizes, toX, (name) => [name]);
  const wrapped = blocksOf(view, sizes, toX, wrapName);
  const cut = blocksOf(view, sizes, toX, (name, valueWidthPx) => [shortenText(name, sizes.textPx, Math.max(valueWidthPx, sizes.textPx * 4))]);
  const tries = [[single, 1], [wrapped, 1], [single, 2], [wrapped, 2], [cut, Infinity]] as const;
  for (const [blocks, mostRows] of tries) {
    const placed = packLabels(blocks.map((block) => ({ centrePx: block.x, widthPx: block.widthPx })), sizes.widthPx, sizes.labelGapPx, mostRows);
    const fits = blocks.every((block) => block.widthPx <= sizes.widthPx) || mostRows === Infinity;
    if (placed === null || !fits) continue;
    return draw(blocks.map((block, index) => ({ ...block, place: placed[index] ?? { row: index, centrePx: block.x } })), sizes);
  }
  return { shapes: [], heightPx: 0 };
}

function blocksOf(
  view: NerveLineView,
  sizes: NerveLineSizes,
  toX: (positionMm: number) => number,
  linesOf: (name: string, valueWidthPx: number) => readonly string[],
): readonly Block[] {
  const block = (key: string, positionMm: number, name: string, value: string, tone: Tone): Block => {
    const valueSizePx = /\d|^none$/.test(value) || key === 'end' ? sizes.valuePx : sizes.textPx;
    const valueWidthPx = textWidth(value, valueSizePx, true);
    const nameLines = linesOf(name, valueWidthPx);
    const widthPx = Math.max(valueWidthPx, ...nameLines.map((line) => textWidth(line, sizes.textPx, false)));
    return { key, x: toX(positionMm), nameLines, value, valueSizePx, tone, widthPx };
  };
  const sites = view.sites.map((site) =>
    block(site.siteId, site.positionMm, site.name, site.text, toneOf(site.textPriority, site.isDim ? 'second' : 'ink')),
  );
  return view.end === null ? sites : [...sites, block('end', view.end.positionMm, view.end.caption, view.end.name, 'second')];
}

function draw(blocks: readonly PlacedBlock[], sizes: NerveLineSizes): SiteLabels {
  const nameRows = Math.max(...blocks.map((block) => block.nameLines.length), 1);
  const rowHeightPx = nameRows * sizes.lineHeightPx + sizes.valuePx * 1.1;
  const clearPx = sizes.textPx * 0.5;
  const rows = Math.max(...blocks.map((block) => block.place.row), 0) + 1;
  const shapes = blocks.flatMap((block) => {
    const valueY = -clearPx - block.place.row * rowHeightPx;
    const value: Extract<Shape, { kind: 'text' }> = {
      ...blockText(block, `value-${block.key}`, 'response', block.value, valueY),
      tone: block.tone,
      sizePx: block.valueSizePx,
      widthPx: textWidth(block.value, block.valueSizePx, true),
      isMono: true,
      isBold: true,
    };
    const names = block.nameLines.map<Shape>((line, index) => ({
      ...blockText(block, `name-${block.key}-${index}`, 'site', line, valueY - sizes.valuePx * 1.05 - (block.nameLines.length - 1 - index) * sizes.lineHeightPx),
      tone: 'second',
      sizePx: sizes.textPx,
      widthPx: textWidth(line, sizes.textPx, false),
      isMono: false,
      isBold: false,
    }));
    return [...leader(block, blocks, valueY, sizes), ...ground(value), value, ...names];
  });
  return { shapes, heightPx: clearPx + rows * rowHeightPx };
}

/** What yellow words stand on where they cannot stand on white. */
function ground(value: Extract<Shape, { kind: 'text' }>): readonly Shape[] {
  if (value.tone !== 'medium') return [];
  const { x, y, widthPx, sizePx } = value;
  return [{ kind: 'rect', key: `ground-${value.key}`, role: 'ground', tone: 'medium-back', x: x - widthPx / 2, y: y - sizePx * 0.78, widthPx, heightPx: sizePx * 0.9, strokePx: null, dashPx: null }];
}

function blockText(block: PlacedBlock, key: string, role: string, text: string, y: number) {
  return { kind: 'text', key, role, text, x: block.place.centrePx, y } as const;
}

/** A thin line from a raised block to its site, where it crosses no other block. */
function leader(block: PlacedBlock, blocks: readonly PlacedBlock[], valueY: number, sizes: NerveLineSizes): readonly Shape[] {
  if (block.place.row === 0) return [];
  const half = block.widthPx / 2;
  const x = Math.min(Math.max(block.x, block.place.centrePx - half), block.place.centrePx + half);
  const crosses = blocks.some((other) => other.place.row < block.place.row && Math.abs(other.place.centrePx - x) < other.widthPx / 2 + 2);
  if (crosses) return [];
  const widthPx = Math.max(1, sizes.textPx / 14);
  return [{ kind: 'line', key: `leader-${block.key}`, role: 'leader', tone: 'rule', x1: x, y1: valueY + sizes.textPx * 0.3, x2: x, y2: -2, widthPx, dashPx: null }];
}
