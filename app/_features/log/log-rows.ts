import type { LogRow } from '@/app/_features/log/log-row-model';
import { runRows, type LoggedRun } from '@/app/_features/log/run-rows';
import type { CaseEntry, EntryBodies } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import { entrySentence } from '@/lib/text/entry-sentence';
import { siteNames } from '@/lib/text/site-name';

interface Written {
  seq: number;
  at: string;
  run: LoggedRun['run'];
  judged: EntryBodies['run.judged'] | null;
  notes: string[];
  isAlert: boolean;
  isCorrected: boolean;
  isWaiting: boolean;
}

/** Rows of the log, newest first: runs with what was computed of them, every other entry as its sentence. */
export function logRows(entries: readonly CaseEntry[], plan: CasePlan, timeZone: string, committedSeq: number): readonly LogRow[] {
  const written: (Written | CaseEntry)[] = [];
  /** The row that speaks for a run now: its own, or its newest correction's. */
  const current = new Map<number, Written>();
  const alertNerves = new Set<string>();
  for (const entry of entries) {
    const isWaiting = entry.seq > committedSeq;
    const start = (run: LoggedRun['run'], notes: string[]): Written => {
      const row = { seq: entry.seq, at: entry.eventAt, run, judged: null, notes, isAlert: alertNerves.has(nerveOf(plan, run.siteId)), isCorrected: false, isWaiting };
      written.push(row);
      return row;
    };
    switch (entry.kind) {
      case 'run.logged':
        current.set(entry.seq, start(entry.body, []));
        break;
      case 'run.corrected': {
        const original = current.get(entry.body.runSeq);
        if (original !== undefined) {
          original.isCorrected = true;
          original.notes.push(entry.body.run === null ? `withdrawn: ${entry.body.reason}` : `corrected by entry ${entry.seq}`);
        }
        if (entry.body.run === null) current.delete(entry.body.runSeq);
        else current.set(entry.body.runSeq, start(entry.body.run, [`correction of entry ${entry.body.runSeq}: ${entry.body.reason}`]));
        break;
      }
      case 'run.judged': {
        const row = current.get(entry.body.runSeq);
        if (row !== undefined) row.judged = entry.body;
        break;
      }
      default:
        if (!noteOnRun(entry, current, alertNerves, plan)) written.push(entry);
    }
  }
  return written.reverse().flatMap((row): readonly LogRow[] =>
    'kind' in row
      ? [{ kind: 'sentence', key: String(row.seq), seq: row.seq, at: row.eventAt, text: entrySentence(row, plan, timeZone), isWaiting: row.seq > committedSeq }]
      : runRows(row, plan),
  );
}

/** Says on the run's own row what it raised. False for an entry that needs a row of its own. */
function noteOnRun(entry: CaseEntry, current: ReadonlyMap<number, Written>, alertNerves: Set<string>, plan: CasePlan): boolean {
  if (entry.kind === 'alert.raised') alertNerves.add(entry.body.nerveId);
  if (entry.kind === 'alert.ended' || entry.kind === 'alert.withdrawn') alertNerves.delete(entry.body.alertId.replace(/-\d+$/, ''));
  const note = runNote(entry, plan);
  if (note === null) return false;
  const row = current.get(note.runSeq);
  if (row === undefined) return false;
  row.notes.push(note.words);
  if (entry.kind === 'alert.raised' || entry.kind === 'alert.worsened') row.isAlert = true;
  return true;
}

function runNote(entry: CaseEntry, plan: CasePlan): { readonly runSeq: number; readonly words: string } | null {
  switch (entry.kind) {
    case 'notice.raised':
      return { runSeq: entry.body.runSeq, words: 'notice, repeat asked' };
    case 'notice.settled':
      return { runSeq: entry.body.runSeq, words: 'notice settled' };
    case 'alert.raised':
      return entry.body.isRepeated ? { runSeq: entry.body.runSeq, words: 'confirmed: alert' } : null;
    case 'alert.worsened':
      return { runSeq: entry.body.runSeq, words: 'alert, worse' };
    case 'alert.located': {
      const { location, runSeq } = entry.body;
      if (location.kind === 'segment') return { runSeq, words: `located: ${siteNames(plan, location.proximalSiteId, location.distalSiteId)}` };
      return { runSeq, words: location.kind === 'outside' ? 'not between the tested sites' : 'where not known yet' };
    }
    case 'alert.recovered':
      return { runSeq: entry.body.runSeq, words: 'back inside its limits' };
    default:
      return null;
  }
}

function nerveOf(plan: CasePlan, siteId: string): string {
  return plan.nerves.find((nerve) => nerve.sites.some((site) => site.id === siteId))?.id ?? '';
}
