import { siteTitle } from '@/app/_features/record/path-name';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { pathIdOf } from '@/lib/case/keys';
import type { CourseRun, RunVersion } from '@/lib/case/course/course-runs';
import type { CasePlan } from '@/lib/case/plan';
import { findingNames } from '@/lib/text/alert-sentence';
import { nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { milliamperes, readingWords } from '@/lib/text/reading-words';
import { notComparedWords } from '@/lib/text/reason-words';
import { channelName } from '@/lib/text/run-sentence';

/** One channel of one run, as the original or as a correction has it. */
export interface RunLine {
  readonly key: string;
  readonly run: CourseRun;
  readonly version: RunVersion;
  /** First line of a version: it carries the time, the site and the current. */
  readonly isFirst: boolean;
  readonly versionName: 'run' | 'original' | 'correction' | 'withdrawal';
  readonly site: string;
  readonly current: string;
  readonly channel: string;
  readonly reading: string;
  readonly percent: string;
  readonly onset: string;
  readonly remark: string;
  readonly isPastLimit: boolean;
  readonly isNotCompared: boolean;
}

/** Every run line by line; a corrected run has its original and each correction under one another. */
export function runLines(runs: readonly CourseRun[], plan: CasePlan): readonly RunLine[] {
  return runs.flatMap((run) => [run.original, ...run.corrections].flatMap((version) => versionLines(run, version, plan)));
}

function versionLines(run: CourseRun, version: RunVersion, plan: CasePlan): readonly RunLine[] {
  const isOriginal = version.seq === run.seq;
  const base = { run, version, site: siteTitle(plan, run.siteId), isPastLimit: false, isNotCompared: false, percent: '', onset: '' };
  if (version.run === null) {
    return [{ ...base, key: `${version.seq}`, isFirst: true, versionName: 'withdrawal', current: '', channel: '', reading: 'withdrawn', remark: version.reason ?? '' }];
  }
  const { intensityMa, pulseWidthUs, isSupramaximal, readings, note, purpose } = version.run;
  const current = `${milliamperes(intensityMa)} × ${pulseWidthUs}${nonBreakingSpace}µs`;
  return readings.map(({ channelId, reading }, index) => {
    const kind = plan.channels.find((channel) => channel.id === channelId)?.kind ?? 'muscle';
    const judged = version.paths.find((path) => path.pathId === pathIdOf(run.siteId, channelId));
    const compared = judged?.kind === 'compared' ? judged : null;
    // What a baseline is made of cannot have one yet: that needs no remark.
    const isOwnBaseline = purpose === 'baseline' && judged?.kind === 'not-compared' && judged.reason === 'no-baseline';
    const remarks = [
      index === 0 && purpose !== 'check' ? `${purpose} run` : '',
      index === 0 && !isSupramaximal && !(judged?.kind === 'not-compared' && judged.reason === 'current-not-supramaximal') ? 'not known to be supramaximal' : '',
      judged?.kind === 'not-compared' && !isOwnBaseline && judged.reason !== 'not-read' ? `not compared, ${notComparedWords[judged.reason]}` : '',
      ...(compared?.findings.map((finding) => findingNames[finding.kind]) ?? []),
      index === 0 && version.reason !== null ? `reason: ${version.reason}` : '',
      index === 0 && note !== null ? `note: ${note}` : '',
    ].filter((remark) => remark !== '');
    return {
      ...base,
      key: `${version.seq}-${channelId}`,
      isFirst: index === 0,
      versionName: isOriginal ? (run.corrections.length === 0 ? 'run' : 'original') : 'correction',
      current,
      channel: channelName(plan, channelId),
      reading: readingWords(reading, kind),
      percent: compared === null || compared.change.percentOfBaseline === null ? '' : percent(compared.change.percentOfBaseline),
      onset: compared === null || compared.change.onsetChangeMs === null ? '' : `${signed(compared.change.onsetChangeMs, 2)}${nonBreakingSpace}ms`,
      remark: remarks.join('; '),
      isPastLimit: compared !== null && isAbnormal(compared.findings),
      isNotCompared: judged?.kind === 'not-compared' && judged.reason !== 'not-read' && !isOwnBaseline,
    };
  });
}
