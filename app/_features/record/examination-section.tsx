import { FactsTable } from '@/app/_features/record/facts-table';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import { sensationNames } from '@/lib/text/examination-sentence';
import { clockTime } from '@/lib/text/format';

const whenNames = { 'before-operation': 'Before the operation', 'after-operation': 'After the operation' } as const;

/** Strength and sensation before and after the operation, as recorded. */
export function ExaminationSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  return (
    <RecordSection id="examination" heading="Examination">
      {course.examinations.length === 0 ? <p className="text-second">No examination was recorded</p> : (
        <FactsTable
          caption="Examinations"
          columns={[{ heading: 'Time', isNumeric: true }, { heading: 'When' }, { heading: 'By' }, { heading: 'Strength, 0 to 5' }, { heading: 'Sensation' }, { heading: 'Text' }]}
          rows={course.examinations.map(({ seq, eventAt, body }) => ({
            key: String(seq),
            cells: [
              clockTime(eventAt, timeZone),
              whenNames[body.when],
              body.examinedBy,
              body.muscles.map(({ muscle, grade }) => `${muscle} ${grade}`).join(', '),
              body.sensation.map(({ area, finding }) => `${area} ${sensationNames[finding]}`).join(', '),
              body.text ?? '',
            ],
          }))}
        />
      )}
    </RecordSection>
  );
}
