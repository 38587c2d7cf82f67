import type { EntryKind } from '@/lib/case/entry-bodies';

/**
 * Every entry kind with the newest version this program can read. Older versions are brought up by upcasters.
 * @source house rule: kinds are for ever; versions are whole numbers from 1
 */
export const knownKinds: { readonly [K in EntryKind]: number } = {
  'case.planned': 1,
  'team.assigned': 1,
  'plan.revised': 1,
  'case.opened': 1,
  'timeout.confirmed': 1,
  'phase.changed': 1,
  'run.logged': 1,
  'run.judged': 1,
  'run.corrected': 1,
  'baseline.accepted': 1,
  'baseline.confirmed': 1,
  'examination.recorded': 1,
  'condition.logged': 1,
  'step.logged': 1,
  'distances.measured': 1,
  'notice.raised': 1,
  'notice.settled': 1,
  'alert.raised': 1,
  'alert.worsened': 1,
  'alert.located': 1,
  'alert.recovered': 1,
  'alert.withdrawn': 1,
  'alert.told': 1,
  'alert.read-back': 1,
  'alert.acted': 1,
  'alert.ended': 1,
  'alert.painted': 1,
  'advice.given': 1,
  'advice.confirmed': 1,
  'message.sent': 1,
  'case.closed': 1,
};
