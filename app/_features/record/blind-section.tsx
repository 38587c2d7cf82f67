import { BlindPicture } from '@/app/_features/record/blind-picture';
import { FactsTable } from '@/app/_features/record/facts-table';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import { nonBreakingSpace, percent } from '@/lib/text/format';
import { nerveTitle } from '@/lib/text/nerve-title';
import { blindRows } from '@/lib/text/record-blind-words';
import { spanWords } from '@/lib/text/span-words';

/** How long, when and why the nerves at risk could not be seen while the case was monitored. */
export function BlindSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  const { blind, final } = course;
  const steps = course.steps.filter((step) => step.body.isRisk).map((step) => ({ atMs: Date.parse(step.eventAt), label: step.body.since }));
  return (
    <RecordSection id="blind-time" heading="Blind time" isComputed>
      {blind.monitoringMs === 0 ? <p className="text-second">Nothing was monitored</p> : null}
      {blind.monitoringMs > 0 ? (
        <div className="record-whole">
          <p className="max-w-4xl">
            {`Some nerve at risk could not be seen for ${spanWords(blind.whole.blindMs)} of ${spanWords(blind.monitoringMs)} of monitoring. Where several causes held at once, the first in the order of the theatre screen is counted. Dotted uprights are risk steps.`}
          </p>
          <BlindPicture blind={blind} steps={steps} timeZone={timeZone} />
          <div className="h-4" />
          <FactsTable
            caption="Blind time by nerve"
            columns={[{ heading: 'Nerve' }, { heading: 'Blind', isNumeric: true }, { heading: 'Of monitoring', isNumeric: true }, { heading: 'Causes' }]}
            rows={blind.nerves.map(({ nerveId, time }) => ({
              key: nerveId,
              cells: [nerveTitle(final.plan, nerveId), spanWords(time.blindMs), percent((100 * time.blindMs) / blind.monitoringMs), causesOf(blindRows(time, blind.monitoringMs))],
            }))}
          />
          <p className="mt-2 text-sm text-second">
            {`By the times at which things were done, so a late entry counts at its own time. Freshness limit ${final.plan.rules.freshnessMinutes}${nonBreakingSpace}min, custom.`}
          </p>
        </div>
      ) : null}
    </RecordSection>
  );
}

function causesOf(rows: ReturnType<typeof blindRows>): string {
  return rows.length === 0 ? 'None' : rows.map((row) => `${row.name} ${spanWords(row.ms)}`).join(', ');
}
