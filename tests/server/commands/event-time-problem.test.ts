import { describe, expect, test } from 'vitest';

import { eventTimeProblem } from '@/server/commands/event-time-problem';

const nowMs = Date.parse('2027-03-14T10:00:00.000Z');
const at = (afterS: number) => new Date(nowMs + afterS * 1000).toISOString();
const codeOf = (afterS: number, sinceMs?: number) => eventTimeProblem(at(afterS), nowMs, sinceMs)?.reply.code ?? 'none';
const [hourS, dayS] = [3600, 86_400];

describe('eventTimeProblem', () => {
  test('takes 2 s ahead, asks for the same again up to a minute, and refuses what is further ahead', () => {
    expect([0, 2, 2.001, 60, 60.001, 31_536_000].map((afterS) => codeOf(afterS))).toEqual(['none', 'none', 'not-saved', 'not-saved', 'time-ahead', 'time-ahead']);
  });

  test('takes any past time from when the case was planned on, a minute of slack included, and none before', () => {
    const plannedMs = nowMs - 40 * dayS * 1000;
    expect([-1, -25 * hourS, -39 * dayS, -40 * dayS - 60].map((afterS) => codeOf(afterS, plannedMs))).toEqual(['none', 'none', 'none', 'none']);
    expect([-40 * dayS - 61, -50 * 365 * dayS].map((afterS) => codeOf(afterS, plannedMs))).toEqual(['time-too-old', 'time-too-old']);
  });

  test('takes a planning of the last day only', () => {
    expect([-dayS, -dayS - 61].map((afterS) => codeOf(afterS))).toEqual(['none', 'time-too-old']);
  });

  test('says in a sentence what is wrong, with the value and what is allowed', () => {
    expect(eventTimeProblem(at(12.3), nowMs)?.reply.message).toMatch(/^Not saved yet: 2027-03-14T10:00:12\.300Z is 13 s later than the server's clock; 2 s are allowed\. /);
    expect(eventTimeProblem(at(600), nowMs)?.reply.message).toMatch(/^Time ahead: 2027-03-14T10:10:00\.000Z is 10 min later than the server's clock; 2 s are allowed\. /);
    expect(eventTimeProblem('1970-01-01T00:00:00.000Z', nowMs, nowMs)?.reply.message).toMatch(/^Time too old: 1970-01-01T00:00:00\.000Z is before 2027-03-14T10:00:00\.000Z, from when on it can have happened\. /);
  });
});
