import { FactsTable } from '@/app/_features/record/facts-table';
import { LateWords } from '@/app/_features/record/late-words';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import { clockTime } from '@/lib/text/format';

/** Messages, and advice with its confirmation. */
export function TalkSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  const time = (at: string) => clockTime(at, timeZone, { seconds: true });
  return (
    <RecordSection id="messages" heading="Messages and advice">
      {course.talk.length === 0 ? <p className="text-second">No message and no advice was sent</p> : (
        <FactsTable
          caption="Messages and advice"
          columns={[{ heading: 'Time', isNumeric: true }, { heading: 'Kind' }, { heading: 'By' }, { heading: 'Text' }, { heading: 'Confirmed by the desk' }]}
          rows={course.talk.map(({ seq, at, lateMs, kind, byRole, text, confirmed }) => ({
            key: String(seq),
            cells: [
              time(at),
              kind === 'advice' ? 'Advice' : 'Message',
              byRole,
              <span key="text">{text}<LateWords lateMs={lateMs} /></span>,
              kind === 'message' ? '' : confirmed === null ? 'not confirmed' : `${time(confirmed.at)}${confirmed.text === null ? '' : `, ${confirmed.text}`}`,
            ],
          }))}
        />
      )}
    </RecordSection>
  );
}
