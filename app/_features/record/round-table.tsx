import { FactsTable } from '@/app/_features/record/facts-table';
import type { AlertCourse } from '@/lib/case/course/alert-course';
import { isInTime, type CourseInterval } from '@/lib/case/course/course-interval';
import { roundIntervals } from '@/lib/case/course/round-intervals';
import { handlingLimits, type AlertAct, type AlertRound } from '@/lib/case/course/alert-round';
import type { RuleSet } from '@/lib/alert/rule-set';
import { findingNames, worseningNames } from '@/lib/text/alert-sentence';
import { clockTime, nonBreakingSpace, percent } from '@/lib/text/format';
import { secondsWords } from '@/lib/text/span-words';

interface RoundTableProps {
  readonly alert: AlertCourse;
  readonly rules: RuleSet;
  readonly timeZone: string;
}

const kindNames = { notice: 'Notice', alert: 'Alert', worse: 'Worse' } as const;

/** Every raise with what was done about it, each time counted from the raise. */
export function RoundTable({ alert, rules, timeZone }: RoundTableProps) {
  const time = (at: string) => clockTime(at, timeZone, { seconds: true });
  const seconds = (count: number) => `${count}${nonBreakingSpace}s`;
  return (
    <div className="my-3">
      <FactsTable
        caption={`Raises of ${alert.alertId}`}
        columns={[{ heading: 'Raised', isNumeric: true }, { heading: 'As' }, { heading: 'Painted' }, { heading: 'Told' }, { heading: 'Read back' }, { heading: 'Surgeon’s action' }, { heading: 'Tested again' }]}
        rows={alert.rounds.map((round) => {
          const intervals = roundIntervals(round, rules);
          return {
            key: String(round.seq),
            cells: [time(round.raisedAt), raiseWords(round), after(intervals.painted), after(intervals.told, round.told), after(intervals.readBack, round.readBack), after(intervals.acted, round.acted), after(intervals.retest)],
          };
        })}
      />
      {alert.level === 'notice' ? null : (
        <p className="mt-1.5 text-sm text-second">
          {`Counted from the raise. Limits for an alert, custom: told ${seconds(rules.tellWithinSeconds)}, read back ${seconds(handlingLimits.readBackSeconds)}, tested again ${seconds(handlingLimits.retestSeconds)}.`}
        </p>
      )}
    </div>
  );
}

function raiseWords(round: AlertRound): string {
  const isOfTime = round.finding === 'onset-late' || round.finding === 'segment-slowed';
  const share = round.percentOfBaseline === null || isOfTime ? '' : `, ${percent(round.percentOfBaseline)}`;
  const how = round.worsening.length > 0 ? round.worsening.map((word) => worseningNames[word]).join(', ') : findingNames[round.finding];
  const repeat = round.isRepeated === null ? '' : round.isRepeated ? ', confirmed' : ', not repeated';
  return `${kindNames[round.kind]}: ${how}${share}${repeat}`;
}

/** "9 s" and the words that were said; over its limit in bold and in words. */
function after(interval: CourseInterval | null, act: AlertAct | null = null) {
  if (interval === null) return <span className="text-second">not logged</span>;
  const isOver = isInTime(interval) === false;
  return (
    <>
      <span className={isOver ? 'font-bold' : undefined}>
        {interval.ms === null ? 'before the raise arrived' : secondsWords(interval.ms)}
        {isOver ? ', over the limit' : ''}
      </span>
      {act === null || act.words === '' ? null : <span className="block text-sm text-second">{act.words}</span>}
    </>
  );
}
