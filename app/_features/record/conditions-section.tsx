import { FactsTable } from '@/app/_features/record/facts-table';
import { LateWords } from '@/app/_features/record/late-words';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import { lateMsOf } from '@/lib/case/course/late-after-ms';
import { conditionWords } from '@/lib/text/condition-words';
import { clockTime } from '@/lib/text/format';

/** Conditions of patient and theatre and the surgical steps, in the order of their times. */
export function ConditionsSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  const rows = [...course.conditions, ...course.steps].sort((first, second) => (first.eventAt === second.eventAt ? first.seq - second.seq : first.eventAt < second.eventAt ? -1 : 1));
  return (
    <RecordSection id="conditions" heading="Conditions and steps">
      {rows.length === 0 ? <p className="text-second">No condition and no step was logged</p> : (
        <FactsTable
          caption="Conditions and steps"
          columns={[{ heading: 'Time', isNumeric: true }, { heading: 'What' }, { heading: 'Value' }, { heading: 'As reported by' }]}
          rows={rows.map((entry) => {
            const isStep = entry.kind === 'step.logged';
            const words = isStep ? { name: entry.body.label, value: entry.body.isRisk ? 'risk step' : 'step' } : conditionWords(entry.body.condition);
            return {
              key: String(entry.seq),
              cells: [
                clockTime(entry.eventAt, timeZone, { seconds: true }),
                <span key="name">{words.name}<LateWords lateMs={lateMsOf(entry)} /></span>,
                words.value,
                isStep ? '' : (entry.body.reportedBy ?? ''),
              ],
            };
          })}
        />
      )}
    </RecordSection>
  );
}
