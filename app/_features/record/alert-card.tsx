import { AlertTimeline } from '@/app/_features/record/alert-timeline';
import { FactsTable } from '@/app/_features/record/facts-table';
import { LateWords } from '@/app/_features/record/late-words';
import { RoundTable } from '@/app/_features/record/round-table';
import { Badge } from '@/app/_ui/badge';
import type { AlertCourse, PathValue } from '@/lib/case/course/alert-course';
import type { CasePlan } from '@/lib/case/plan';
import { alertMoments } from '@/lib/text/alert-moments';
import { causeNames, outcomeNames } from '@/lib/text/alert-sentence';
import { clockTime, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { nerveTitle } from '@/lib/text/nerve-title';
import { placeWords } from '@/lib/text/record-alert-words';
import { pathName } from '@/app/_features/record/path-name';

interface AlertCardProps {
  readonly alert: AlertCourse;
  readonly plan: CasePlan;
  readonly timeZone: string;
}

/** One notice or alert: what it was, where, between which times, what was done, how it ended. */
export function AlertCard({ alert, plan, timeZone }: AlertCardProps) {
  const time = (at: string) => clockTime(at, timeZone, { seconds: true });
  const isAlert = alert.level === 'alert';
  return (
    <article aria-label={`${isAlert ? 'Alert' : 'Notice'} ${alert.alertId}`} className="border-b border-rule py-5 first-of-type:pt-1 last-of-type:border-b-0">
      <div className="record-whole">
        <h3 className="flex flex-wrap items-center gap-x-3 gap-y-1 text-lg font-bold">
          <Badge priority={isAlert ? 'high' : 'medium'}>{isAlert ? 'Alert' : 'Notice'}</Badge>
          {`${nerveTitle(plan, alert.nerveId)}, ${placeWords(alert.location, plan)}`}
          <span className="text-base font-normal text-second">{alert.alertId}</span>
          <LateWords lateMs={alert.lateMs} />
        </h3>
        <dl className="mt-3 grid gap-x-8 gap-y-3 sm:grid-cols-2 lg:grid-cols-3">
          <Fact name="Onset">{onsetWords(alert, time)}</Fact>
          <Fact name="Repeat">{alert.repeatedAt === null ? 'Not repeated' : `Repeated ${time(alert.repeatedAt)}`}</Fact>
          <Fact name="End">{endWords(alert, time)}</Fact>
        </dl>
        <AlertTimeline moments={alertMoments(alert)} timeZone={timeZone} />
      </div>
      <RoundTable alert={alert} rules={plan.rules} timeZone={timeZone} />
      <FactsTable
        caption={`Paths of ${alert.alertId}`}
        columns={[{ heading: 'Path' }, { heading: 'Lowest amplitude', isNumeric: true }, { heading: 'Latest onset', isNumeric: true }, { heading: 'Last', isNumeric: true }]}
        rows={alert.paths.map(({ pathId, worst, slowest, last }) => ({
          key: pathId,
          cells: [pathName(plan, pathId), amplitude(worst, time), onset(slowest, time), last === null ? 'not compared' : `${amplitude(last, time)}`],
        }))}
      />
    </article>
  );
}

function Fact({ name, children }: { readonly name: string; readonly children: string }) {
  return (
    <div>
      <dt className="text-sm text-second">{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}

type Time = (at: string) => string;

function onsetWords(alert: AlertCourse, time: Time): string {
  const good = alert.lastGoodAt === null ? 'no good run before' : `last good ${time(alert.lastGoodAt)}`;
  const steps = alert.steps.map((step) => `${step.since} ${time(step.at)}${step.isEnteredLater ? ' (entered later)' : ''}`);
  return `First bad ${time(alert.firstBadAt)}, ${good}. Between: ${steps.length === 0 ? 'no step' : steps.join(', ')}`;
}

function endWords({ end, recoveredAt }: AlertCourse, time: Time): string {
  const back = recoveredAt === null ? 'Not seen back inside its limits' : `Back inside its limits ${time(recoveredAt)}`;
  if (end === null) return `${back}. Not ended`;
  if (end.kind === 'settled') return `Settled ${time(end.at)} by its repeat`;
  if (end.kind === 'withdrawn') return `Withdrawn ${time(end.at)}: run ${end.runSeq} was corrected`;
  return `${back}. Ended ${time(end.at)}, ${outcomeNames[end.outcome]}, cause ${causeNames[end.cause]}${end.text === null ? '' : `. ${end.text}`}`;
}

function amplitude(value: PathValue | null, time: Time): string {
  if (value === null) return 'not read';
  const share = value.percentOfBaseline === null ? 'not read' : value.isLost ? 'no response' : percent(value.percentOfBaseline);
  return `${share}, ${time(value.at)}`;
}

function onset(value: PathValue | null, time: Time): string {
  return value === null || value.onsetChangeMs === null ? 'not read' : `${signed(value.onsetChangeMs, 2)}${nonBreakingSpace}ms, ${time(value.at)}`;
}
