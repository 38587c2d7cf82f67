import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { Finding, FindingKind } from '@/lib/alert/judgement';
import { worstFinding } from '@/lib/alert/worst-finding';

/** From worst to least, as the product says it: lost, amplitude with onset, amplitude, the rest. */
const order: readonly FindingKind[] = [
  'response-lost', 'amplitude-and-onset', 'amplitude-fall', 'segment-slowed', 'onset-late', 'threshold-rise', 'ratio-fall', 'amplitude-watch',
];
const finding = (kind: FindingKind): Finding => ({ kind, priority: 'notice', mayBecomeAlert: false });

describe('worstFinding', () => {
  it('worstFinding gives null for none', () => expect(worstFinding([])).toBeNull());

  it('worstFinding gives the worst of any, in any order, and does not modify them', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([...order], { minLength: 1 }), (kinds) => {
        const findings = kinds.map(finding);
        const copy = [...findings];
        expect(worstFinding(findings)?.kind).toBe(order.find((kind) => kinds.includes(kind)));
        expect(findings).toEqual(copy);
      }),
    );
  });
});
