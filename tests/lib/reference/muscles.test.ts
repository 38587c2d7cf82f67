import { describe, expect, it } from 'vitest';

import { muscles } from '@/lib/reference/muscles';

describe('muscles', () => {
  it('holds every muscle of the templates once', () => {
    const shorts = muscles.map((muscle) => muscle.short);
    expect([...shorts].sort()).toEqual(['ADM', 'AH', 'APB', 'EDB', 'EHL', 'FCU', 'FDI', 'FL', 'GM', 'TA']);
  });

  it.each(muscles.map((muscle) => [muscle.short, muscle] as const))('%s names nerve, roots and origin', (_short, muscle) => {
    expect(muscle.nerve).not.toBe('');
    expect(muscle.roots.length).toBeGreaterThan(0);
    for (const root of muscle.roots) expect(root).toMatch(/^(C[3-8]|T1|L[1-5]|S[1-4])$/);
    expect(muscle.roots).toEqual(expect.arrayContaining([...muscle.mainRoots]));
    expect(muscle.source).toBe('memory');
  });
});
