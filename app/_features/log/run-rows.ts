import { shownAmplitude } from '@/app/_features/log/run-from-draft';
import type { RowTone, RunRow } from '@/app/_features/log/log-row-model';
import { velocityWithError } from '@/app/_features/log/velocity-with-error';
import type { Finding, PathJudgement, SegmentJudgement } from '@/lib/alert/judgement';
import type { EntryBodies } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { Reading } from '@/lib/response/reading';
import { decimal, signed } from '@/lib/text/format';
import { readingWords } from '@/lib/text/reading-words';
import { notComparedWords, noVelocityWords } from '@/lib/text/reason-words';
import { channelName } from '@/lib/text/run-sentence';
import { siteName, siteNames } from '@/lib/text/site-name';

/** One run with all that the log says of it. */
export interface LoggedRun {
  readonly seq: number;
  readonly at: string;
  readonly run: RunBody;
  readonly judged: EntryBodies['run.judged'] | null;
  readonly notes: readonly string[];
  /** True when an alert of its nerve was open or was raised with it. */
  readonly isAlert: boolean;
  readonly isCorrected: boolean;
  readonly isWaiting: boolean;
}

const dash = '–';

/** A run as rows, one for each channel that was looked at; channels not read are named in the note of the first. */
export function runRows(logged: LoggedRun, plan: CasePlan): readonly RunRow[] {
  const { run } = logged;
  const looked = run.readings.filter((row) => row.reading.kind !== 'not-read');
  const shown = looked.length > 0 ? looked : run.readings.slice(0, 1);
  const unread = run.readings.filter((row) => row.reading.kind === 'not-read' && !shown.includes(row)).map((row) => `${channelName(plan, row.channelId)} not read`);
  return shown.map((row, index) => {
    const channel = plan.channels.find((candidate) => candidate.id === row.channelId);
    const path = logged.judged?.paths.find((candidate) => candidate.pathId === `${run.siteId}/${row.channelId}`);
    const segment = shownSegment(logged.judged?.segments.filter((candidate) => candidate.channelId === row.channelId) ?? [], run.siteId);
    const own = index === 0 ? [...purposeNotes(run), ...logged.notes] : [];
    const last = index === 0 ? [...unread, ...(run.note === null ? [] : [run.note])] : [];
    const notes = [...own, ...pathNotes(path, row.reading, run), ...segmentNotes(segment, run.siteId, plan, index === 0), ...last];
    return {
      kind: 'run',
      key: `${logged.seq}-${row.channelId}`,
      seq: logged.seq,
      at: logged.at,
      siteName: upper(siteName(plan, run.siteId)),
      channelName: channelName(plan, row.channelId),
      intensity: decimal(run.intensityMa, run.intensityMa < 1 ? 2 : 1),
      ...values(row.reading, shownAmplitude(channel ?? { kind: 'muscle' }).factor),
      ...changes(path, logged.isAlert),
      ...velocity(segment, logged.isAlert),
      note: notes.join(', '),
      isFirst: index === 0,
      isCorrected: logged.isCorrected,
      isWaiting: logged.isWaiting,
    };
  });
}

function values(reading: Reading, factor: number): Pick<RunRow, 'onset' | 'amplitude'> {
  if (reading.kind !== 'measured') return { onset: dash, amplitude: dash };
  return {
    onset: reading.onsetMs === null ? 'not read' : decimal(reading.onsetMs, 2),
    amplitude: reading.amplitudeUv === null ? 'not read' : `${decimal(reading.amplitudeUv / factor, 1)}${factor === 1 ? ' µV' : ''}`,
  };
}

function changes(path: PathJudgement | undefined, isAlert: boolean): Pick<RunRow, 'change' | 'changeTone' | 'percent' | 'percentTone'> {
  if (path?.kind !== 'compared') return { change: dash, changeTone: 'plain', percent: dash, percentTone: 'plain' };
  const { onsetChangeMs, percentOfBaseline } = path.change;
  return {
    change: onsetChangeMs === null ? dash : signed(onsetChangeMs, 2),
    changeTone: toneOf(path.findings, ['onset-late', 'amplitude-and-onset'], isAlert),
    percent: percentOfBaseline === null ? dash : decimal(Math.round(percentOfBaseline), 0),
    percentTone: toneOf(path.findings, ['response-lost', 'amplitude-and-onset', 'amplitude-fall', 'amplitude-watch', 'threshold-rise'], isAlert),
  };
}

function velocity(segment: SegmentJudgement | undefined, isAlert: boolean): Pick<RunRow, 'velocity' | 'velocityTone'> {
  if (segment?.velocity.kind !== 'velocity') return { velocity: dash, velocityTone: 'plain' };
  const { velocityMps, standardErrorMps } = segment.velocity;
  return {
    velocity: velocityWithError(velocityMps, standardErrorMps),
    velocityTone: toneOf(segment.findings, ['segment-slowed', 'ratio-fall'], isAlert),
  };
}

function toneOf(findings: readonly Finding[], kinds: readonly Finding['kind'][], isAlert: boolean): RowTone {
  const found = findings.filter((finding) => kinds.includes(finding.kind));
  if (found.some((finding) => finding.priority === 'notice')) return isAlert ? 'high' : 'medium';
  return found.length > 0 ? 'low' : 'plain';
}

function purposeNotes(run: RunBody): readonly string[] {
  return run.purpose === 'check' ? [] : [run.purpose];
}

function pathNotes(path: PathJudgement | undefined, reading: Reading, run: RunBody): readonly string[] {
  const words = reading.kind === 'absent' || reading.kind === 'unusable' ? [readingWords(reading, 'muscle')] : [];
  if (path?.kind !== 'not-compared' || path.reason === 'unusable') return words;
  if (path.reason === 'not-read') return ['not read'];
  if (path.reason === 'no-baseline') return run.purpose === 'baseline' ? words : [...words, 'no baseline yet'];
  return [...words, `not compared, ${notComparedWords[path.reason]}`];
}

/** The segment that begins at this site; where it has no velocity, the one that the run completed from the other side. */
function shownSegment(segments: readonly SegmentJudgement[], siteId: string): SegmentJudgement | undefined {
  const own = segments.find((segment) => segment.proximalSiteId === siteId);
  const other = segments.find((segment) => segment.distalSiteId === siteId && segment.velocity.kind === 'velocity' && segment.proximalAt !== segment.distalAt);
  return own?.velocity.kind === 'velocity' ? own : (other ?? own);
}

function segmentNotes(segment: SegmentJudgement | undefined, siteId: string, plan: CasePlan, isFirst: boolean): readonly string[] {
  if (segment === undefined) return [];
  if (segment.velocity.kind === 'velocity') {
    const short = segment.velocity.isShort ? [`${segment.velocity.distanceMm} mm, short`] : [];
    return segment.distalSiteId === siteId ? [...short, `m/s ${siteNames(plan, segment.proximalSiteId, segment.distalSiteId)}`] : short;
  }
  const { reason } = segment.velocity;
  const isSaid = reason === 'partner-not-tested' || reason === 'no-response' || reason === 'onset-not-read';
  return isSaid || !isFirst ? [] : [reason === 'spans-risk-step' ? 'no fresh pair' : noVelocityWords[reason]];
}

function upper(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
