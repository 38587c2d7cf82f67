import { describe, expect, it } from 'vitest';

import type { NoVelocityReason, SegmentJudgement } from '@/lib/alert/judgement';
import { velocityText } from '@/lib/chart/velocity-text';

const segment: SegmentJudgement = {
  nerveId: 'ulnar', channelId: 'adm', proximalSiteId: 'above-elbow', distalSiteId: 'below-elbow',
  proximalAt: '2027-01-14T10:00:00.000Z', distalAt: '2027-01-14T10:01:00.000Z',
  velocity: { kind: 'velocity', velocityMps: 54.05, standardErrorMps: 1.8, distanceMm: 100, isShort: false, isImplausible: false },
  conductionTimeMs: 1.85, timeChangeMs: 0, timeChangePercent: 0, ratioChangePercent: 0, findings: [],
};

function withReason(reason: NoVelocityReason): SegmentJudgement {
  return { ...segment, velocity: { kind: 'not-computable', reason } };
}

describe('velocityText', () => {
  it('gives the velocity with its unit', () => expect(velocityText(segment, 'current').text).toBe('54\u00a0m/s'));
  it('marks a short segment', () => {
    const short = { ...segment, velocity: { ...segment.velocity, distanceMm: 60, isShort: true } } as SegmentJudgement;
    expect(velocityText(short, 'current')).toEqual({ text: '54\u00a0m/s, short', shortText: '54\u00a0m/s, short' });
  });
  it('says how an older or not compared velocity stands', () => {
    expect(velocityText(segment, 'older').text).toBe('was 54\u00a0m/s');
    expect(velocityText(segment, 'not-compared').text).toBe('54\u00a0m/s, not compared');
    expect(velocityText(withReason('no-response'), 'older').text).toBe('was no response');
  });
  it('leaves a reason as it is: it holds now', () => expect(velocityText(withReason('distances-not-measured'), 'older').text).toBe('distance not measured'));
  it('is empty before the first pair', () => expect(velocityText(undefined, 'older').text).toBe(''));

  it.each([
    ['partner-not-tested', 'not tested'],
    ['spans-risk-step', 'no fresh pair'],
    ['distances-not-measured', 'distance not measured'],
    ['onset-not-read', 'onset not read'],
    ['no-response', 'no response'],
    ['latencies-exchanged', 'latencies exchanged'],
    ['latencies-equal', 'latencies equal'],
  ] as const)('says why there is no velocity: %s', (reason, words) => expect(velocityText(withReason(reason), 'current').text).toBe(words));
});
