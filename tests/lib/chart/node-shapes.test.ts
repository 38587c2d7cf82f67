import { describe, expect, it } from 'vitest';

import type { Priority } from '@/lib/alert/judgement';
import { nerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import { nodeShapes } from '@/lib/chart/node-shapes';

const sizes = nerveLineSizes({ widthPx: 800, textPx: 16, hasAges: false });

function nodesOf(priority: Priority | null, isDim = false) {
  const site = { siteId: 's', name: 'Wrist', positionMm: 0, text: '98\u00a0%', ageText: null, priority, textPriority: priority, isDim };
  return nodeShapes({ nerveId: 'n', nerveName: 'N', description: '', segments: [], end: null, sites: [site] }, sizes, () => 100);
}

const fillingOf = (priority: Priority | null) =>
  nodesOf(priority).flatMap((shape) => (shape.kind === 'node' && shape.role === 'filling' ? [Math.round((100 * shape.radiusPx) / sizes.radiusPx)] : []));

describe('nodeShapes', () => {
  it.each([[null, []], ['watch', []], ['notice', [36]], ['alert', [66]]] as const)('fills the ring of %s so that greyscale tells it apart', (priority, filling) => {
    expect(fillingOf(priority)).toEqual(filling);
  });
  it('gives yellow an edge of its own', () => {
    expect(nodesOf('notice').map((shape) => shape.tone)).toEqual(['medium-edge', 'medium', 'medium']);
    expect(nodesOf('alert').map((shape) => shape.tone)).toEqual(['high', 'high']);
  });
  it('draws an old response in the second ink', () => expect(nodesOf(null, true)[0]?.tone).toBe('second'));
});
