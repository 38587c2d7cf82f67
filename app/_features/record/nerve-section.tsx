'use client';

import { FactsTable } from '@/app/_features/record/facts-table';
import { closingCells, closingColumns } from '@/app/_features/record/closing-cells';
import { RecordSection } from '@/app/_features/record/record-section';
import { NervePictures } from '@/app/_ui/nerve-pictures';
import type { CaseCourse } from '@/lib/case/course/case-course';
import type { NerveEnds } from '@/lib/case/course/nerve-ends';
import type { SegmentEnds } from '@/lib/case/course/segment-ends';
import { nerveLineView } from '@/lib/chart/nerve-line-view';
import { openingLineView } from '@/lib/chart/opening-line-view';
import type { CasePlan } from '@/lib/case/plan';
import { clockTime, metresPerSecond, nonBreakingSpace, signed } from '@/lib/text/format';
import { noVelocityWords } from '@/lib/text/reason-words';
import { channelName } from '@/lib/text/run-sentence';
import { siteNames } from '@/lib/text/site-name';

interface NerveSectionProps {
  readonly course: CaseCourse;
  readonly timeZone: string;
}

/** Each nerve as it was at its opening baseline and as it was last seen. */
export function NerveSection({ course, timeZone }: NerveSectionProps) {
  const shown = course.nerves.filter((one) => one.paths.length > 0);
  return (
    <RecordSection id="nerves" heading="Nerve by nerve" isComputed>
      {shown.length === 0 ? <p className="text-second">No path was run</p> : null}
      {shown.map((ends) => <NerveArticle key={ends.nerve.id} ends={ends} course={course} timeZone={timeZone} />)}
    </RecordSection>
  );
}

function NerveArticle({ ends, course, timeZone }: NerveSectionProps & { readonly ends: NerveEnds }) {
  const { nerve, paths } = ends;
  const { plan } = course.final;
  const segments = course.segments.filter((one) => one.nerveId === nerve.id);
  const lastMs = Date.parse(lastLookAt(course));
  const opening = openingLineView(course, nerve.id);
  return (
    <article aria-label={nerve.name} className="mb-8">
      <h3 className="text-lg font-bold">{nerve.name}</h3>
      {opening === null ? null : <Line heading={`Opening baseline, ${clockTime(course.times.baselineAt ?? '', timeZone)}`} view={opening} />}
      <Line heading={`As last seen, ${clockTime(lastLookAt(course), timeZone)}`} view={nerveLineView(course.final, nerve.id, lastMs)} />
      <FactsTable caption={`${nerve.name}, opening against last run`} columns={closingColumns} rows={paths.map((path) => ({ key: path.pathId, cells: closingCells(path, plan, timeZone) }))} />
      <div className="h-4" />
      {segments.length === 0 ? null : (
        <FactsTable
          caption={`${nerve.name}, velocities`}
          columns={[{ heading: 'Segment' }, { heading: 'Opening', isNumeric: true }, { heading: 'Last', isNumeric: true }, { heading: 'Conduction time, change', isNumeric: true }]}
          rows={segments.map((one) => ({ key: `${one.channelId}-${one.proximalSiteId}`, cells: segmentCells(one, plan) }))}
        />
      )}
    </article>
  );
}

function Line({ heading, view }: { readonly heading: string; readonly view: ReturnType<typeof nerveLineView> }) {
  return (
    <figure className="record-whole my-3">
      <figcaption className="text-sm text-second">{heading}</figcaption>
      <NervePictures views={[view]} />
    </figure>
  );
}

/** The end of monitoring, or the last run where that is later. */
function lastLookAt({ times, runs }: CaseCourse): string {
  const last = runs.reduce((latest, run) => (run.at > latest ? run.at : latest), '');
  const end = times.monitoringEndedAt ?? '';
  return end > last ? end : last === '' ? (times.lastEntryAt ?? '') : last;
}

function segmentCells({ channelId, proximalSiteId, distalSiteId, opening, closing }: SegmentEnds, plan: CasePlan) {
  const name = siteNames(plan, proximalSiteId, distalSiteId);
  return [
    `${name.charAt(0).toUpperCase()}${name.slice(1)}, ${channelName(plan, channelId)}`,
    opening === null ? 'no pair' : opening.kind === 'velocity' ? `${velocity(opening)}, ${opening.distanceMm}${nonBreakingSpace}mm${opening.isShort ? ', short' : ''}` : 'not computable',
    closing === null ? 'no pair' : closing.velocity.kind === 'velocity' ? `${velocity(closing.velocity)}, ${closing.velocity.distanceMm}${nonBreakingSpace}mm${closing.velocity.isShort ? ', short' : ''}` : noVelocityWords[closing.velocity.reason],
    closing === null || closing.timeChangeMs === null ? '' : `${signed(closing.timeChangeMs, 2)}${nonBreakingSpace}ms`,
  ];
}

function velocity({ velocityMps, standardErrorMps }: { readonly velocityMps: number; readonly standardErrorMps: number }): string {
  return `${metresPerSecond(velocityMps)} ± ${standardErrorMps.toFixed(1)}`;
}
