import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { stimulusCurrent, type StimulusCurrent } from '@/lib/change/stimulus-current';

const plain = (intensityMa: number): StimulusCurrent => ({ intensityMa, isSupramaximal: false, maximalResponseMa: null });
const ticked = (intensityMa: number): StimulusCurrent => ({ ...plain(intensityMa), isSupramaximal: true });
const measured = (intensityMa: number, maximalResponseMa: number): StimulusCurrent => ({ ...plain(intensityMa), maximalResponseMa });

describe('stimulusCurrent', () => {
  it.each([
    ['the same current', plain(20), plain(20), 'equal'],
    ['exactly 5 % more', plain(21), plain(20), 'equal'],
    ['exactly 5 % less', plain(19), plain(20), 'equal'],
    ['exactly 5 % more at the exposed nerve', plain(0.63), plain(0.6), 'equal'],
    ['a hair over 5 % more', plain(21.01), plain(20), 'raised'],
    ['a hair over 5 % less', plain(18.99), plain(20), 'lower'],
    ['both ticked supramaximal', ticked(25), ticked(20), 'supramaximal'],
    ['both exactly 1.2 times the largest response', measured(24, 20), measured(12, 10), 'supramaximal'],
    ['one ticked, one measured', ticked(30), measured(12, 10), 'supramaximal'],
    ['1.19 times only', measured(23.8, 20), measured(12, 10), 'raised'],
    ['1.19 times only at the exposed nerve', measured(1.19, 1), measured(0.6, 0.5), 'raised'],
    ['a raised current over a baseline not known supramaximal', ticked(30), plain(20), 'raised'],
    ['a lower current under a supramaximal baseline', plain(10), ticked(20), 'not-supramaximal'],
    ['no current at all in both', plain(0), plain(0), 'equal'],
    ['no current, called 1.2 times nothing', measured(0, 0), ticked(20), 'not-supramaximal'],
  ] as const)('%s', (_case, run, baseline, expected) => {
    expect(stimulusCurrent(run, baseline)).toBe(expected);
  });

  it('never calls a current lower that is not', () => {
    const current = fc.integer({ min: 0, max: 10_000 }).map((steps) => steps / 100);
    fc.assert(
      fc.property(current, current, (runMa, baselineMa) => {
        const relation = stimulusCurrent(plain(runMa), plain(baselineMa));
        if (relation === 'lower') expect(runMa).toBeLessThan(baselineMa);
        if (relation === 'raised') expect(runMa).toBeGreaterThan(baselineMa);
        expect(['equal', 'lower', 'raised']).toContain(relation);
      }),
    );
  });

  it.each([-0.01, 100.01, Number.NaN])('refuses %s mA', (intensityMa) => {
    expect(() => stimulusCurrent(plain(intensityMa), plain(1))).toThrow(RangeError);
    expect(() => stimulusCurrent(plain(1), plain(intensityMa))).toThrow(RangeError);
  });
});
