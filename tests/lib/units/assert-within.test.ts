import { describe, expect, it } from 'vitest';

import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';

describe('assertWithin', () => {
  it('says what is wrong, with which value, what is allowed and why', () => {
    expect(() => assertWithin(0, bounds.onsetMs, 'distal onset')).toThrow(
      'Cannot use distal onset: 0 ms is outside 0.1 to 100 ms. Earlier than 0.1 ms is the stimulus artefact',
    );
  });

  it('leaves no gap in the sentence of a field without a unit', () => {
    expect(() => assertWithin(5, bounds.trainOfFourCount, 'count')).toThrow('Cannot use count: 5 is outside 0 to 4. Four');
  });

  it('refuses a number that is none', () => {
    expect(() => assertWithin(Number.NaN, bounds.onsetMs, 'onset')).toThrow('Cannot use onset: NaN is not a finite number');
  });
});
