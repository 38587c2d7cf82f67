import type { EntryKind } from '@/lib/case/entry-bodies';
import type { WireEntry } from '@/lib/contracts/http/replies';

/** Fields of each body that a wall may read. A kind that is not listed travels as number and hashes only. */
const wallFields: { readonly [K in EntryKind]?: readonly string[] } = {
  'case.planned': ['plan'],
  'plan.revised': ['plan'],
  'case.opened': ['clockOffsetMs'],
  'timeout.confirmed': ['side'],
  'phase.changed': ['phase', 'reason'],
  'run.logged': ['siteId', 'electrodeId', 'family', 'purpose', 'intensityMa', 'pulseWidthUs', 'isSupramaximal', 'maximalResponseMa', 'readings'],
  'run.judged': ['runSeq', 'judgeVersion', 'paths', 'segments'],
  'run.corrected': ['runSeq', 'run'],
  'baseline.accepted': ['family', 'electrodeId', 'runSeqs', 'pathIds', 'isOpening', 'isProvisional', 'setAfterPercent', 'values'],
  'condition.logged': ['condition'],
  'step.logged': ['stepId', 'label', 'since', 'isRisk', 'voidsDistances'],
  'distances.measured': ['nerveId', 'positions'],
  'notice.raised': ['*'],
  'notice.settled': ['*'],
  'alert.raised': ['*'],
  'alert.worsened': ['*'],
  'alert.located': ['*'],
  'alert.recovered': ['*'],
  'alert.withdrawn': ['*'],
  'alert.told': ['alertId'],
  'alert.read-back': ['alertId'],
  'alert.acted': ['alertId', 'action'],
  'alert.ended': ['alertId', 'outcome', 'cause'],
  'case.closed': [],
};

/**
 * The entry as a wall may read it: number, times and hashes always; author by role only; body cut to the allow-list.
 * @param entry a committed entry as it travels to people; not modified
 * @returns a new entry; `body` is null when the kind is not for walls
 * @source house rule: no identity beyond theatre, procedure and side on the wall
 */
export function wallEntry(entry: WireEntry): WireEntry {
  const fields = wallFields[entry.kind as EntryKind];
  return {
    ...entry,
    author: { id: '', role: entry.author.role, displayName: '' },
    commandDigest: '',
    body: fields === undefined || entry.body === null ? null : cut(entry.body, fields),
  };
}

function cut(body: Record<string, unknown>, fields: readonly string[]): Record<string, unknown> {
  if (fields[0] === '*') return body;
  return Object.fromEntries(fields.filter((field) => field in body).map((field) => [field, body[field]]));
}
