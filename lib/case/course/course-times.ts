import type { CaseEntry, Phase } from '@/lib/case/entry-bodies';

/** The moments of a case; null for one that did not come. */
export interface CourseTimes {
  readonly plannedAt: string | null;
  readonly openedAt: string | null;
  readonly timeoutAt: string | null;
  readonly baselineAt: string | null;
  readonly monitoringAt: string | null;
  /** Take-down, or closing where no take-down was logged. */
  readonly monitoringEndedAt: string | null;
  readonly closedAt: string | null;
  readonly lastEntryAt: string | null;
  readonly phases: readonly { readonly seq: number; readonly at: string; readonly phase: Phase; readonly reason: string | null }[];
}

/**
 * The moments of a case by their event times.
 * @param entries readable entries in the order of the log; not modified
 * @returns the first of each moment; the last end of monitoring
 * @source house rule
 * @accuracy exact; tests/lib/case/course/case-course.test.ts
 * @example
 * courseTimes(entries).openedAt
 */
export function courseTimes(entries: readonly CaseEntry[]): CourseTimes {
  const first = (kind: CaseEntry['kind']) => entries.find((entry) => entry.kind === kind)?.eventAt ?? null;
  const phases = entries.filter((entry) => entry.kind === 'phase.changed').map(({ seq, eventAt, body }) => ({ seq, at: eventAt, ...body }));
  const monitoringAt = phases.find(({ phase }) => phase === 'monitoring')?.at ?? null;
  const closedAt = first('case.closed');
  const lastPhase = phases.at(-1);
  const times = entries.map((entry) => entry.eventAt);
  return {
    plannedAt: first('case.planned'),
    openedAt: first('case.opened'),
    timeoutAt: first('timeout.confirmed'),
    baselineAt: first('baseline.accepted'),
    monitoringAt,
    monitoringEndedAt: monitoringAt === null ? null : lastPhase?.phase === 'take-down' ? lastPhase.at : closedAt,
    closedAt,
    lastEntryAt: times.reduce<string | null>((latest, at) => (latest === null || at > latest ? at : latest), null),
    phases,
  };
}
