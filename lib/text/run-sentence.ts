import type { PathJudgement } from '@/lib/alert/judgement';
import type { EntryBodies } from '@/lib/case/entry-bodies';
import type { BaselineFamily, CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import { milliseconds, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { milliamperes, readingWords } from '@/lib/text/reading-words';
import { notComparedWords } from '@/lib/text/reason-words';
import { siteName } from '@/lib/text/site-name';

/** Baseline families in the trade's words. */
export const familyNames: { readonly [F in BaselineFamily]: string } = {
  'pre-position': 'before positioning',
  'through-skin': 'through the skin',
  exposed: 'exposed nerve',
};

const purposes: { readonly [P in RunBody['purpose']]: string } = { baseline: 'Baseline run', check: 'Run', closing: 'Closing run' };

/** Name of a channel. @returns "ADM"; the id when the plan has no such channel @source house rule */
export function channelName(plan: CasePlan, channelId: string): string {
  return plan.channels.find((channel) => channel.id === channelId)?.name ?? channelId;
}

/**
 * One stimulation in a sentence: where, how strong, what each channel showed.
 *
 * @param run a run; not modified
 * @param plan the plan it was made on
 * @returns a sentence without a full stop
 * @source minimum fields of a stimulation run, common practice
 * @accuracy tests/lib/text/entry-sentence.test.ts
 * @example
 * runSentence(run, plan) // => 'Run at above elbow, 18.0 mA × 200 µs: ADM onset 9.71 ms, 3.5 mV'
 */
export function runSentence(run: RunBody, plan: CasePlan): string {
  const readings = run.readings.map(({ channelId, reading }) => {
    const kind = plan.channels.find((channel) => channel.id === channelId)?.kind ?? 'muscle';
    return `${channelName(plan, channelId)} ${readingWords(reading, kind)}`;
  });
  const note = run.note === null ? '' : `. Note: ${run.note}`;
  const width = `${run.pulseWidthUs}${nonBreakingSpace}µs`;
  const supramaximal = run.isSupramaximal ? ', supramaximal' : '';
  return `${purposes[run.purpose]} at ${siteName(plan, run.siteId)}, ${milliamperes(run.intensityMa)} × ${width}${supramaximal}: ${readings.join('; ')}${note}`;
}

/** What the judge said of a run. @returns a sentence without a full stop @source house rule: one number for one fact */
export function judgedSentence(body: EntryBodies['run.judged'], plan: CasePlan): string {
  const paths = body.paths.filter((path) => path.kind === 'compared' || path.reason !== 'not-read');
  if (paths.length === 0) return `Run ${body.runSeq} judged: nothing was read`;
  return `Run ${body.runSeq} judged: ${paths.map((path) => pathWords(path, plan)).join('; ')}`;
}

function pathWords(path: PathJudgement, plan: CasePlan): string {
  const channel = channelName(plan, path.pathId.slice(path.pathId.indexOf('/') + 1));
  if (path.kind === 'not-compared') return `${channel} not compared, ${notComparedWords[path.reason]}`;
  const { percentOfBaseline, onsetChangeMs } = path.change;
  const amplitude = percentOfBaseline === null ? 'amplitude not compared' : `${percent(percentOfBaseline)} of baseline`;
  const sign = onsetChangeMs !== null && onsetChangeMs > 0 ? '+' : '';
  const onset = onsetChangeMs === null ? '' : `, onset ${onsetChangeMs < 0 ? `${signed(onsetChangeMs, 2)}${nonBreakingSpace}ms` : `${sign}${milliseconds(onsetChangeMs)}`}`;
  return `${channel} ${amplitude}${onset}`;
}
