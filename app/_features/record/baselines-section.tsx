import { FactsTable } from '@/app/_features/record/facts-table';
import { pathName } from '@/app/_features/record/path-name';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import type { CourseBaseline } from '@/lib/case/course/course-baselines';
import type { CasePlan } from '@/lib/case/plan';
import { clockTime, decimal, milliseconds, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { amplitudeWords, milliamperes } from '@/lib/text/reading-words';
import { familyNames } from '@/lib/text/run-sentence';

/** Every accepted baseline: by whom, with which reason, and what could be seen against it. */
export function BaselinesSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  return (
    <RecordSection id="baselines" heading="Baselines">
      {course.baselines.length === 0 ? <p className="text-second">No baseline was accepted</p> : null}
      {course.baselines.map((one) => <BaselineArticle key={one.seq} one={one} plan={course.final.plan} timeZone={timeZone} />)}
    </RecordSection>
  );
}

function BaselineArticle({ one, plan, timeZone }: { readonly one: CourseBaseline; readonly plan: CasePlan; readonly timeZone: string }) {
  const time = clockTime(one.at, timeZone, { seconds: true });
  const electrode = plan.electrodes.find((candidate) => candidate.id === one.electrodeId)?.name ?? one.electrodeId;
  const limit = plan.rules.amplitudeNoticeFallPercent;
  return (
    <article aria-label={`Baseline ${time}`} className="mb-6">
      <h3 className="font-bold">{`${one.isOpening ? 'Opening baseline' : 'Working baseline'}, ${time}`}</h3>
      <p>{`${familyNames[one.family]}, ${electrode}. ${acceptance(one, timeZone)}`}</p>
      {one.setAfterPercent === null ? null : <p className="font-bold">{`Set after ${signed(one.setAfterPercent, 0)}${nonBreakingSpace}%`}</p>}
      {one.reason === null ? null : <p>{`Reason given: ${one.reason}`}</p>}
      {one.correctedBySeqs.length === 0 ? null : <p className="font-bold">{`A run it was made of was corrected later: entry ${one.correctedBySeqs.join(', ')}`}</p>}
      <FactsTable
        caption={`Paths of the baseline of ${time}`}
        columns={[{ heading: 'Path' }, { heading: 'Runs', isNumeric: true }, { heading: 'Current', isNumeric: true }, { heading: 'Onset', isNumeric: true }, { heading: 'Amplitude', isNumeric: true }, { heading: 'Scatter', isNumeric: true }, { heading: 'Smallest loss to be seen', isNumeric: true }]}
        rows={one.paths.map((path) => ({
          key: path.pathId,
          cells: [
            pathName(plan, path.pathId),
            path.runSeqs.length,
            milliamperes(path.intensityMa),
            path.onsetMs === null ? 'not read' : milliseconds(path.onsetMs),
            path.amplitudeUv === null ? 'not read' : amplitudeWords(path.amplitudeUv, kindOf(plan, path.pathId)),
            `${decimal(100 * path.amplitudeScatter, 1)}${nonBreakingSpace}%${path.isScatterAssumed ? ', assumed' : ''}`,
            `${percent(path.smallestLossPercent)}${path.smallestLossPercent >= limit ? ', not monitorable by amplitude' : ''}`,
          ],
        }))}
      />
    </article>
  );
}

function acceptance(one: CourseBaseline, timeZone: string): string {
  if (!one.isProvisional) return 'Accepted by the physician';
  const provisional = `Accepted provisionally by the ${one.byRole}`;
  return one.confirmedAt === null ? `${provisional}, not accepted by a physician` : `${provisional}, accepted by the physician ${clockTime(one.confirmedAt, timeZone, { seconds: true })}`;
}

function kindOf(plan: CasePlan, pathId: string) {
  return plan.channels.find((channel) => pathId.endsWith(`/${channel.id}`))?.kind ?? 'muscle';
}
