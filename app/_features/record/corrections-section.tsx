import { FactsTable } from '@/app/_features/record/facts-table';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import type { PathJudgement } from '@/lib/alert/judgement';
import { channelOfPath } from '@/lib/case/keys';
import type { CasePlan } from '@/lib/case/plan';
import { clockTime, percent } from '@/lib/text/format';
import { channelName, runSentence } from '@/lib/text/run-sentence';

/** Each corrected run with what it said before, beside what it says now. Nothing is removed. */
export function CorrectionsSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  const { plan } = course.final;
  const corrected = course.runs.flatMap((run) =>
    run.corrections.map((correction, index) => ({ run, correction, before: index === 0 ? run.original : (run.corrections[index - 1] ?? run.original) })),
  );
  return (
    <RecordSection id="corrections" heading="Corrections beside originals">
      {corrected.length === 0 ? <p className="text-second">No run was corrected</p> : (
        <FactsTable
          caption="Corrections"
          columns={[{ heading: 'Run', isNumeric: true }, { heading: 'Original' }, { heading: 'Correction' }, { heading: 'Reason' }, { heading: 'Corrected', isNumeric: true }]}
          rows={corrected.map(({ run, correction, before }) => ({
            key: String(correction.seq),
            cells: [
              `${run.seq}, ${clockTime(run.at, timeZone, { seconds: true })}`,
              before.run === null ? 'withdrawn' : `${runSentence(before.run, plan)}${shares(before.paths, plan)}`,
              correction.run === null ? 'Withdrawn' : `${runSentence(correction.run, plan)}${shares(correction.paths, plan)}`,
              `${correction.reason ?? ''} (${correction.by})`,
              `${correction.seq}, ${clockTime(correction.at, timeZone, { seconds: true })}`,
            ],
          }))}
        />
      )}
    </RecordSection>
  );
}

function shares(paths: readonly PathJudgement[], plan: CasePlan): string {
  const words = paths.flatMap((path) => (path.kind === 'compared' && path.change.percentOfBaseline !== null ? [`${channelName(plan, channelOfPath(path.pathId))} ${percent(path.change.percentOfBaseline)} of baseline`] : []));
  return words.length === 0 ? '' : `. ${words.join(', ')}`;
}
