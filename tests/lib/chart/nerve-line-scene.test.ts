import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { NerveLineSegment, NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineScene } from '@/lib/chart/nerve-line-scene';
import type { Scene, Shape } from '@/lib/chart/scene';

type Text = Extract<Shape, { kind: 'text' }>;

const segmentBase: NerveLineSegment = {
  key: 'a', fromMm: 0, toMm: 100, amplitudeShare: 1, velocityShare: 1, text: '54\u00a0m/s', shortText: '54\u00a0m/s',
  priority: null, textPriority: null, isUntested: false, isNotCompared: false, isDim: false, isBroken: false, isShort: false,
};

/** Two sites 100 mm apart, no end, and between them the segment given. */
function twoSites(segment: Partial<NerveLineSegment>): NerveLineView {
  const site = { priority: null, textPriority: null, isDim: false, ageText: '20\u00a0s' };
  return {
    nerveId: 'ulnar', nerveName: 'Ulnar', description: 'Ulnar nerve.', end: null,
    sites: [{ ...site, siteId: 'a', name: 'Above elbow', positionMm: 0, text: '98\u00a0%' }, { ...site, siteId: 'b', name: 'Below elbow', positionMm: 100, text: '98\u00a0%' }],
    segments: [{ ...segmentBase, ...segment }],
  };
}

const options = { widthPx: 800, textPx: 16, hasAges: true };
const lineOf = (scene: Scene, role: string) => scene.shapes.filter((shape) => shape.kind === 'line' && shape.role === role) as Extract<Shape, { kind: 'line' }>[];
const texts = (scene: Scene) => scene.shapes.filter((shape): shape is Text => shape.kind === 'text');

describe('nerveLineScene', () => {
  it('draws the kept amplitude as thickness over its baseline ghost', () => {
    const scene = nerveLineScene(twoSites({ amplitudeShare: 0.39 }), options);
    const [ghost] = lineOf(scene, 'ghost');
    const [segment] = lineOf(scene, 'segment');
    expect(segment!.widthPx / ghost!.widthPx).toBeCloseTo(0.39, 6);
  });
  it.each([0.57, 1.3, 0.16])('draws %s of the velocity as exactly that share of dash and gap', (velocityShare) => {
    const scene = nerveLineScene(twoSites({ velocityShare }), options);
    const [baseDash, baseGap] = lineOf(scene, 'ghost')[0]!.dashPx!;
    const [dash, gap] = lineOf(scene, 'segment')[0]!.dashPx!;
    expect(dash! / baseDash!).toBeCloseTo(velocityShare, 9);
    expect(gap! / baseGap!).toBeCloseTo(velocityShare, 9);
  });
  it('lays kept velocity on the dashes of its ghost, whatever the length', () => {
    fc.assert(
      fc.property(fc.integer({ min: 200, max: 4000 }), (widthPx) => {
        const scene = nerveLineScene(twoSites({}), { ...options, widthPx });
        const dashesOf = (role: string) => lineOf(scene, role).map(({ x1, x2, dashPx, dashOffsetPx }) => ({ x1, x2, dashPx, dashOffsetPx }));
        expect(dashesOf('segment')).toEqual(dashesOf('ghost'));
        // The same pattern in every segment: a gap is never stretched to fit.
        expect(dashesOf('segment')[0]!.dashPx).toEqual([16 * 0.95, 16 * 0.2]);
      }),
    );
  });
  it('draws a bar without dashes where the velocity is not known', () => {
    expect(lineOf(nerveLineScene(twoSites({ velocityShare: null }), options), 'segment')[0]!.dashPx).toBeNull();
  });
  it.each([{ isUntested: true }, { amplitudeShare: null }])('draws an outline only for %o', (segment) => {
    const scene = nerveLineScene(twoSites(segment), options);
    expect(scene.shapes.filter((shape) => shape.role === 'outline')).toHaveLength(1);
    expect(lineOf(scene, 'segment')).toEqual([]);
  });
  it('draws a break with two end bars and no segment across it', () => {
    const scene = nerveLineScene(twoSites({ isBroken: true, amplitudeShare: 0, priority: 'alert' }), options);
    const bars = lineOf(scene, 'break').filter((line) => line.x1 === line.x2);
    expect(bars).toHaveLength(2);
    expect(lineOf(scene, 'break').every((line) => line.tone === 'high')).toBe(true);
    expect(lineOf(scene, 'segment')).toEqual([]);
  });
  it.each([{}, { isUntested: true }, { isBroken: true, amplitudeShare: 0 }])('lays an edge under all that is yellow, which white would swallow: %o', (segment) => {
    const shapes = nerveLineScene(twoSites({ ...segment, priority: 'notice' }), options).shapes;
    const yellow = shapes.filter((shape) => shape.tone === 'medium' && shape.kind !== 'text');
    expect(yellow.length).toBeGreaterThan(0);
    yellow.forEach((shape) => {
      const under = shapes.slice(0, shapes.indexOf(shape)).find((other) => other.key === `edge-${shape.key}`);
      expect(under?.tone).toBe('medium-edge');
    });
  });
  it('draws to scale', () => {
    const view = twoSites({});
    const third = { ...view.sites[1]!, siteId: 'c', name: 'Wrist', positionMm: 310 };
    const nodes = nerveLineScene({ ...view, sites: [...view.sites, third] }, options).shapes.filter((shape) => shape.kind === 'node');
    const [a, b, c] = nodes.map((node) => (node.kind === 'node' ? node.x : 0));
    expect((c! - b!) / (b! - a!)).toBeCloseTo(2.1, 6);
  });
  it('gives a number the tone of its own priority, not of its place', () => {
    const view = twoSites({ priority: 'alert', textPriority: null });
    const scene = nerveLineScene({ ...view, sites: view.sites.map((site) => ({ ...site, priority: 'notice', textPriority: null })) }, options);
    expect(lineOf(scene, 'segment')[0]!.tone).toBe('high');
    expect(texts(scene).filter((text) => ['high', 'medium', 'low'].includes(text.tone))).toEqual([]);
  });
  it('leaves out ages only when asked', () => {
    expect(texts(nerveLineScene(twoSites({}), options)).filter((text) => text.role === 'age')).toHaveLength(2);
    expect(texts(nerveLineScene(twoSites({}), { ...options, hasAges: false })).filter((text) => text.role === 'age')).toEqual([]);
  });
  it.each([{ widthPx: 199 }, { textPx: 5 }, { emphasis: 4 }, { widthPx: Number.NaN }])('refuses %o', (wrong) => {
    expect(() => nerveLineScene(twoSites({}), { ...options, ...wrong })).toThrow(RangeError);
  });
});

const names = fc.constantFrom('Axilla', 'Above elbow', 'Below elbow', 'Wrist', 'Lateral part, above field', 'Erb', 'Popliteal fossa');
const values = fc.constantFrom('98\u00a0%', '142\u00a0%', 'none', 'not tested', '8.7\u00a0mV', 'not usable');
const ages = fc.constantFrom(null, '9\u00a0s', '12\u00a0min', '1\u00a0h 21\u00a0min');
const words = fc.constantFrom('61\u00a0m/s', '56\u00a0m/s, short', 'distance not measured', 'no response up to 25\u00a0mA', '2.90\u00a0ms', '');

/** Any nerve: one to nine sites at any distances, with or without an end. */
const anyLine: fc.Arbitrary<NerveLineView> = fc
  .record({ gaps: fc.array(fc.integer({ min: 1, max: 400 }), { minLength: 1, maxLength: 9 }), hasEnd: fc.boolean(), seed: fc.array(fc.tuple(names, values, ages, words), { minLength: 9, maxLength: 9 }) })
  .map(({ gaps, hasEnd, seed }) => {
    const positions = gaps.map((_, index) => gaps.slice(0, index).reduce((sum, gap) => sum + gap, 0));
    const sites = positions.map((positionMm, index) => ({ siteId: `s${index}`, name: seed[index]![0], positionMm, text: seed[index]![1], ageText: seed[index]![2], priority: null, textPriority: null, isDim: index % 3 === 0 }));
    const end = hasEnd ? { caption: 'Muscle', name: 'ADM', positionMm: positions.at(-1)! + gaps.at(-1)! } : null;
    const stops = [...positions, ...(end === null ? [] : [end.positionMm])];
    const segments = stops.slice(1).map((toMm, index) => ({ ...segmentBase, key: `g${index}`, fromMm: stops[index]!, toMm, text: seed[index]![3], shortText: seed[index]![3] }));
    return { nerveId: 'n', nerveName: 'N', description: '', sites, segments, end };
  });

function boxOf(text: Text) {
  return { left: text.x - text.widthPx / 2, right: text.x + text.widthPx / 2, top: text.y - text.sizePx * 0.7, bottom: text.y + text.sizePx * 0.2 };
}

function overlap(one: Text, other: Text): boolean {
  const [a, b] = [boxOf(one), boxOf(other)];
  return a.left < b.right - 0.05 && b.left < a.right - 0.05 && a.top < b.bottom - 0.05 && b.top < a.bottom - 0.05;
}

describe('nerveLineScene of any nerve at any width', () => {
  const sized = fc.record({ view: anyLine, widthPx: fc.integer({ min: 300, max: 3800 }), textPx: fc.integer({ min: 11, max: 60 }), hasAges: fc.boolean() }).filter(({ widthPx, textPx }) => widthPx >= textPx * 24);

  it('lays no text over another and lets none leave the picture', () => {
    fc.assert(
      fc.property(sized, ({ view, ...size }) => {
        const scene = nerveLineScene(view, size);
        const drawn = texts(scene);
        drawn.forEach((text, index) => {
          const box = boxOf(text);
          expect([box.left >= -0.05, box.right <= scene.widthPx + 0.05, box.top >= -0.05, box.bottom <= scene.heightPx + 0.05]).toEqual([true, true, true, true]);
          expect(drawn.slice(index + 1).filter((other) => overlap(text, other)).map((other) => `${text.text} over ${other.text}`)).toEqual([]);
        });
      }),
      { numRuns: 300 },
    );
  });

  it('shows every response, velocity and age, whole', () => {
    fc.assert(
      fc.property(sized, ({ view, ...size }) => {
        const drawn = texts(nerveLineScene(view, size)).map((text) => text.text);
        const wanted = [...view.sites.map((site) => site.text), ...view.segments.map((segment) => segment.text).filter((text) => text !== '')];
        expect(wanted.filter((text) => !drawn.includes(text))).toEqual([]);
        if (size.hasAges) expect(view.sites.filter((site) => site.ageText !== null && !drawn.includes(`${site.ageText} ago`))).toEqual([]);
      }),
    );
  });

  it('gives every shape a key of its own', () => {
    fc.assert(
      fc.property(sized, ({ view, ...size }) => {
        const keys = nerveLineScene(view, size).shapes.map((shape) => shape.key);
        expect(new Set(keys).size).toBe(keys.length);
      }),
    );
  });
});
