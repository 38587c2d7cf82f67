import { RecordSection } from '@/app/_features/record/record-section';
import { TrendSection } from '@/app/_features/record/trend-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import type { WireEntry } from '@/lib/contracts/http/replies';
import { recordSentences } from '@/lib/text/record-sentences';

interface SummarySectionProps {
  readonly course: CaseCourse;
  readonly entries: readonly WireEntry[];
  readonly timeZone: string;
}

/** The case in sentences and its trend. */
export function SummarySection({ course, entries, timeZone }: SummarySectionProps) {
  return (
    <RecordSection id="summary" heading="Summary" isComputed>
      <dl className="max-w-4xl">
        {recordSentences(course, timeZone).map(({ id, heading, paragraphs }) => (
          <div key={id} className="border-b border-rule py-2.5 sm:grid sm:grid-cols-[9rem_1fr] sm:gap-6">
            <dt className="font-semibold">{heading}</dt>
            <dd className="flex flex-col gap-1.5">{paragraphs.map((sentences) => <p key={sentences[0]}>{sentences.join(' ')}</p>)}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-3 max-w-4xl text-sm text-second">
        The sentences say what the entries hold. They are no interpretation, no advice and no outlook. Limits marked custom are customary figures without a validating study.
      </p>
      <TrendSection entries={entries} plan={course.final.plan} timeZone={timeZone} />
    </RecordSection>
  );
}
