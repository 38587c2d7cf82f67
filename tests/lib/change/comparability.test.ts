import { describe, expect, it } from 'vitest';

import { comparability, type RunConditions } from '@/lib/change/comparability';

const baseline: RunConditions = {
  electrode: 'hand-probe',
  family: 'exposed',
  pulseWidthUs: 200,
  convention: 'baseline-to-peak',
  intensityMa: 2,
  isSupramaximal: false,
  maximalResponseMa: null,
};

describe('comparability', () => {
  it.each([
    ['electrode-differs', { electrode: 'hook' }],
    ['family-differs', { family: 'through-skin' }],
    ['pulse-width-differs', { pulseWidthUs: 100 }],
    ['convention-differs', { convention: 'peak-to-peak' }],
    ['current-lower', { intensityMa: 1.5 }],
  ] as const)('does not compare: %s', (reason, other) => {
    expect(comparability({ ...baseline, ...other }, baseline)).toEqual({ kind: 'not-compared', reason });
  });

  it('does not compare a current that may no longer be supramaximal', () => {
    const strong = { ...baseline, isSupramaximal: true };
    expect(comparability({ ...baseline, intensityMa: 1 }, strong)).toEqual({ kind: 'not-compared', reason: 'current-not-supramaximal' });
  });

  it('compares at an equal current', () => {
    expect(comparability(baseline, baseline)).toEqual({ kind: 'comparable', current: 'equal' });
  });

  it('compares at different currents when both are supramaximal', () => {
    const strong = { ...baseline, isSupramaximal: true };
    expect(comparability({ ...strong, intensityMa: 5 }, strong)).toEqual({ kind: 'comparable', current: 'supramaximal' });
  });

  it('sets a raised current apart', () => {
    expect(comparability({ ...baseline, intensityMa: 3 }, baseline)).toEqual({ kind: 'raised' });
  });

  it('names the first difference where there are several', () => {
    expect(comparability({ ...baseline, electrode: 'hook', intensityMa: 1 }, baseline)).toEqual({
      kind: 'not-compared',
      reason: 'electrode-differs',
    });
  });
});
