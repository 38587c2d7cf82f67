import { describe, expect, it } from 'vitest';

import { conductionTime } from '@/lib/conduction/conduction-time';

describe('conductionTime', () => {
  it('takes the distal from the proximal onset', () => {
    expect(conductionTime({ proximalOnsetMs: 7.8, distalOnsetMs: 3.8 })).toEqual({ kind: 'time', conductionTimeMs: 4 });
  });

  it.each([
    ['equal onsets', 2.7, 2.7, 'latencies-equal'],
    ['onsets equal at the resolution of the marker', 2.7004, 2.7, 'latencies-equal'],
    ['a proximal onset earlier than the distal one', 2.7, 6.5, 'latencies-exchanged'],
  ] as const)('gives no time for %s', (_case, proximalOnsetMs, distalOnsetMs, reason) => {
    expect(conductionTime({ proximalOnsetMs, distalOnsetMs })).toEqual({ kind: 'not-computable', reason });
  });

  it('gives the shortest time that the marker can show', () => {
    expect(conductionTime({ proximalOnsetMs: 2.701, distalOnsetMs: 2.7 })).toEqual({ kind: 'time', conductionTimeMs: 0.001 });
  });

  it.each([0, -1, 0.09, 100.1, Number.NaN])('refuses an onset of %s ms', (onsetMs) => {
    expect(() => conductionTime({ proximalOnsetMs: onsetMs, distalOnsetMs: 2 })).toThrow(RangeError);
    expect(() => conductionTime({ proximalOnsetMs: 2, distalOnsetMs: onsetMs })).toThrow(RangeError);
  });
});
