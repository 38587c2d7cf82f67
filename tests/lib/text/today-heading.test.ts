import { describe, expect, it } from 'vitest';

import { todayHeading, tooManyWords } from '@/lib/text/today-heading';

describe('todayHeading', () => {
  it.each([
    [[], 'No live case'],
    [['calm'], '1 live case'],
    [['calm', 'not-stable', 'advice-or-baseline-waits', 'desk-away', 'not-monitored'], '5 live cases'],
    [['alert-not-told', 'calm'], '2 live cases, 1 needs you'],
    [['alert-told', 'not-live', 'notice', 'message-waits', 'cannot-be-judged'], '5 live cases, 5 need you'],
  ] as const)('%j: %s', (needs, words) => {
    expect(todayHeading(needs.map((need) => ({ need })))).toBe(words);
  });
});

describe('tooManyWords', () => {
  it('warns from the fourth case on', () => {
    expect([0, 3, 4].map(tooManyWords)).toEqual([null, null, '4 cases at once: no more than 3 are recommended. Hand some over to another physician.']);
  });
});
