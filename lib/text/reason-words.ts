import type { NotComparedReason, NoVelocityReason } from '@/lib/alert/judgement';

/**
 * Why a run is not compared, in the trade's words, to stand after a comma.
 * @source trade's words, common practice
 */
export const notComparedWords: { readonly [R in NotComparedReason]: string } = {
  'no-baseline': 'no baseline on this path',
  'not-timed-out': 'made before the time-out',
  'not-read': 'not read',
  unusable: 'trace unusable',
  'electrode-differs': 'other stimulating electrode',
  'family-differs': 'other baseline family',
  'pulse-width-differs': 'other pulse width',
  'convention-differs': 'amplitude read another way',
  'current-lower': 'lower current than baseline',
  'current-not-supramaximal': 'current not supramaximal',
  'current-raised': 'higher current than baseline',
  'path-unknown': 'path not in the plan',
};

/**
 * Why a segment has no velocity, in the trade's words.
 * @source trade's words, common practice
 */
export const noVelocityWords: { readonly [R in NoVelocityReason]: string } = {
  'partner-not-tested': 'neighbouring site not tested',
  'spans-risk-step': 'pair spans a step or the first change',
  'distances-not-measured': 'distances to be measured again',
  'onset-not-read': 'onset not read',
  'no-response': 'no response',
  'latencies-exchanged': 'latencies exchanged or wrong peak',
  'latencies-equal': 'latencies equal',
};
