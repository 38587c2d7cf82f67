import { describe, expect, it } from 'vitest';

import type { Finding } from '@/lib/alert/judgement';
import type { Incident } from '@/lib/case/case-state';
import { findingPriority } from '@/lib/chart/finding-priority';

const watch: Finding = { kind: 'amplitude-watch', priority: 'watch', mayBecomeAlert: false };
const fall: Finding = { kind: 'amplitude-fall', priority: 'notice', mayBecomeAlert: true };
const open = (level: 'notice' | 'alert') => ({ level }) as Incident;

describe('findingPriority', () => {
  it.each([
    [[], undefined, null],
    [[], open('alert'), null],
    [[watch], undefined, 'watch'],
    [[watch], open('alert'), 'watch'],
    [[fall], undefined, 'notice'],
    [[fall], open('notice'), 'notice'],
    [[watch, fall], open('alert'), 'alert'],
  ] as const)('of %o with %o is %s', (findings, incident, priority) => expect(findingPriority(findings, incident)).toBe(priority));
});
