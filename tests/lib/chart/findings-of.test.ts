import { describe, expect, it } from 'vitest';

import type { Finding, FindingKind } from '@/lib/alert/judgement';
import { findingsOf, type Measure } from '@/lib/chart/findings-of';

const found = (kind: FindingKind): Finding => ({ kind, priority: 'notice', mayBecomeAlert: true });

describe('findingsOf', () => {
  it.each<[FindingKind, readonly Measure[]]>([
    ['response-lost', ['amplitude']],
    ['amplitude-and-onset', ['amplitude', 'time']],
    ['amplitude-fall', ['amplitude']],
    ['amplitude-watch', ['amplitude']],
    ['ratio-fall', ['amplitude']],
    ['threshold-rise', ['amplitude']],
    ['segment-slowed', ['time']],
    ['onset-late', ['time']],
  ])('%s is found by %o', (kind, measures) => {
    const by = (['amplitude', 'time'] as const).filter((measure) => findingsOf([found(kind)], measure).length === 1);
    expect(by).toEqual(measures);
  });
});
