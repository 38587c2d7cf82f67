import type { NoVelocityReason, SegmentJudgement } from '@/lib/alert/judgement';
import type { SegmentText } from '@/lib/chart/segment-text';
import { standingText, type Standing } from '@/lib/chart/standing-text';
import { metresPerSecond } from '@/lib/text/format';

const reasons: Record<NoVelocityReason, SegmentText> = {
  'partner-not-tested': { text: 'not tested', shortText: 'not tested' },
  'spans-risk-step': { text: 'no fresh pair', shortText: 'no pair' },
  'distances-not-measured': { text: 'distance not measured', shortText: 'no mm' },
  'onset-not-read': { text: 'onset not read', shortText: 'no onset' },
  'no-response': { text: 'no response', shortText: 'none' },
  'latencies-exchanged': { text: 'latencies exchanged', shortText: 'check ms' },
  'latencies-equal': { text: 'latencies equal', shortText: 'check ms' },
};

/**
 * What stands under a segment: its velocity, marked when short, else why there is none.
 *
 * Method: copies the judgement. A short segment says so, because its velocity carries a large error; the error itself
 * is in the log. A value that does not say how the nerve is now says so.
 *
 * @param segment the newest judgement of the segment; undefined before the first pair
 * @param standing whether its pair is current, older, or not compared
 * @returns text and short text; empty before the first pair, because the sites say that they are not tested
 * @source product rule: under 80 mm marked short, "not computable" with its reason
 * @accuracy tests/lib/chart/velocity-text.test.ts
 * @example
 * velocityText(undefined, 'current').text // => ''
 */
export function velocityText(segment: SegmentJudgement | undefined, standing: Standing): SegmentText {
  if (segment === undefined) return { text: '', shortText: '' };
  if (segment.velocity.kind === 'not-computable') {
    const words = reasons[segment.velocity.reason];
    return segment.velocity.reason === 'no-response' ? standingText(words, standing) : words;
  }
  const velocity = metresPerSecond(segment.velocity.velocityMps);
  const text = segment.velocity.isShort ? `${velocity}, short` : velocity;
  return standingText({ text, shortText: text }, standing);
}
