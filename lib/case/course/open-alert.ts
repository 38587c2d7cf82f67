import type { Location } from '@/lib/alert/judgement';
import type { AlertEnd, PathValue } from '@/lib/case/course/alert-course';
import type { AlertAct, AlertRound } from '@/lib/case/course/alert-round';
import { lateMsOf } from '@/lib/case/course/late-after-ms';
import type { CaseEntry } from '@/lib/case/entry-bodies';

/** Entries of a notice or alert. */
export type AlertEntry = Extract<CaseEntry, { kind: `alert.${string}` | `notice.${string}` }>;

/** Entries that raise a notice or alert, or raise it again. */
export type RaiseEntry = Extract<CaseEntry, { kind: 'notice.raised' | 'alert.raised' | 'alert.worsened' }>;

/** A notice or alert while its entries are being read. */
export interface OpenAlert {
  readonly alertId: string;
  readonly nerveId: string;
  readonly first: RaiseEntry;
  readonly last: RaiseEntry;
  readonly level: 'notice' | 'alert';
  readonly rounds: readonly AlertRound[];
  readonly location: Location;
  readonly repeatedAt: string | null;
  readonly recoveredAt: string | null;
  readonly end: AlertEnd | null;
  readonly entrySeqs: readonly number[];
  /** Compared runs of its paths, in the order of the log. */
  readonly values: ReadonlyMap<string, readonly PathValue[]>;
  /** Times of the runs that tested one of its paths. */
  readonly testedAts: readonly string[];
}

/** A notice or alert at its first raise. @returns it with one round @source house rule */
export function openedAlert(entry: RaiseEntry): OpenAlert {
  const { alertId, nerveId, location } = entry.body;
  const level = entry.kind === 'notice.raised' ? 'notice' : 'alert';
  const rest = { repeatedAt: null, recoveredAt: null, end: null, values: new Map(), testedAts: [] };
  return { alertId, nerveId, first: entry, last: entry, level, rounds: [roundOf(entry)], location, entrySeqs: [entry.seq], ...rest };
}

/**
 * A notice or alert after one more of its entries.
 * @param repeatAt RFC 3339, when the run of a repeat was made; null where the entry is no repeat
 * @returns a copy; what a person does belongs to the newest raise, and the first of each counts
 * @source house rule: one alert per nerve, told anew after each raise
 */
export function alertAfter(alert: OpenAlert, entry: AlertEntry, repeatAt: string | null): OpenAlert {
  const next = { ...alert, entrySeqs: [...alert.entrySeqs, entry.seq] };
  switch (entry.kind) {
    case 'notice.raised':
    case 'alert.raised':
    case 'alert.worsened':
      return { ...next, ...raised(alert, entry, repeatAt) };
    case 'alert.located':
      return { ...next, location: entry.body.location };
    case 'alert.recovered':
      return { ...next, recoveredAt: entry.eventAt };
    case 'notice.settled':
      return { ...next, repeatedAt: alert.repeatedAt ?? repeatAt, end: { kind: 'settled', at: entry.eventAt, seq: entry.seq } };
    case 'alert.withdrawn':
      return { ...next, end: { kind: 'withdrawn', at: entry.eventAt, seq: entry.seq, runSeq: entry.body.runSeq } };
    case 'alert.ended': {
      const { outcome, cause, text } = entry.body;
      return { ...next, end: { kind: 'ended', at: entry.eventAt, seq: entry.seq, outcome, cause, text } };
    }
    default:
      return { ...next, rounds: handled(alert.rounds, entry) };
  }
}

function raised(alert: OpenAlert, entry: RaiseEntry, repeatAt: string | null): Partial<OpenAlert> {
  const isRepeat = entry.kind === 'alert.raised' && entry.body.isRepeated;
  return {
    last: entry,
    level: entry.kind === 'notice.raised' ? alert.level : 'alert',
    rounds: [...alert.rounds, roundOf(entry)],
    location: entry.body.location,
    repeatedAt: alert.repeatedAt ?? (isRepeat ? repeatAt : null),
    recoveredAt: entry.kind === 'alert.worsened' ? null : alert.recoveredAt,
  };
}

function roundOf(entry: RaiseEntry): AlertRound {
  const handling = { paintedAt: null, told: null, readBack: null, acted: null, retestAt: null };
  return {
    seq: entry.seq,
    kind: entry.kind === 'notice.raised' ? 'notice' : entry.kind === 'alert.raised' ? 'alert' : 'worse',
    raisedAt: entry.recordedAt,
    finding: entry.body.finding,
    percentOfBaseline: entry.body.worstPercentOfBaseline,
    worsening: entry.kind === 'alert.worsened' ? entry.body.worsening : [],
    isRepeated: entry.kind === 'alert.raised' ? entry.body.isRepeated : null,
    ...handling,
  };
}

type HandlingEntry = Extract<AlertEntry, { kind: 'alert.painted' | 'alert.told' | 'alert.read-back' | 'alert.acted' }>;

function handled(rounds: readonly AlertRound[], entry: HandlingEntry): readonly AlertRound[] {
  const round = rounds.at(-1);
  if (round === undefined) return rounds;
  const act = (words: string): AlertAct => ({ seq: entry.seq, at: entry.eventAt, lateMs: lateMsOf(entry), words });
  const after = (): AlertRound => {
    switch (entry.kind) {
      case 'alert.painted':
        return { ...round, paintedAt: round.paintedAt ?? entry.body.paintedAt };
      case 'alert.told':
        return { ...round, told: round.told ?? act(`${entry.body.whom}, ${entry.body.how}: “${entry.body.words}”`) };
      case 'alert.read-back':
        return { ...round, readBack: round.readBack ?? act(entry.body.words === null ? '' : `“${entry.body.words}”`) };
      case 'alert.acted':
        return { ...round, acted: round.acted ?? act(entry.body.action) };
    }
  };
  return [...rounds.slice(0, -1), after()];
}
