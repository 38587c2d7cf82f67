import type { FactColumn } from '@/app/_features/record/facts-table';
import { pathName } from '@/app/_features/record/path-name';
import type { PathEnds } from '@/lib/case/course/nerve-ends';
import type { CasePlan } from '@/lib/case/plan';
import { clockTime, milliseconds, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { amplitudeWords, readingWords } from '@/lib/text/reading-words';
import { notComparedWords } from '@/lib/text/reason-words';

/** Columns of "opening against last run". */
export const closingColumns: readonly FactColumn[] = [
  { heading: 'Path' },
  { heading: 'Opening onset', isNumeric: true },
  { heading: 'Opening amplitude', isNumeric: true },
  { heading: 'Last run' },
  { heading: 'At', isNumeric: true },
  { heading: '% of opening', isNumeric: true },
  { heading: 'Onset, change', isNumeric: true },
  { heading: 'Remark' },
];

/** One path, its opening baseline against its last run. */
export function closingCells(path: PathEnds, plan: CasePlan, timeZone: string): readonly string[] {
  const kind = plan.channels.find((channel) => channel.id === path.channelId)?.kind ?? 'muscle';
  const { opening, closing } = path;
  return [
    pathName(plan, path.pathId),
    opening === null || opening.onsetMs === null ? 'none' : milliseconds(opening.onsetMs),
    opening === null || opening.amplitudeUv === null ? 'none' : amplitudeWords(opening.amplitudeUv, kind),
    closing === null ? 'not tested' : readingWords(closing.reading, kind),
    closing === null ? '' : clockTime(closing.at, timeZone, { seconds: true }),
    path.percentOfOpening === null ? '' : percent(path.percentOfOpening),
    path.onsetChangeMs === null ? '' : `${signed(path.onsetChangeMs, 2)}${nonBreakingSpace}ms`,
    remarkOf(path),
  ];
}

function remarkOf({ opening, closing, isAfterLastRiskStep, percentOfOpening }: PathEnds): string {
  const remarks = [
    opening === null ? 'no baseline accepted' : '',
    closing !== null && closing.notCompared !== null && closing.notCompared !== 'no-baseline' ? `not compared, ${notComparedWords[closing.notCompared]}` : '',
    closing !== null && opening !== null && closing.notCompared === null && percentOfOpening === null && closing.at <= opening.at ? 'baseline run, not tested after it' : '',
    closing !== null && !isAfterLastRiskStep ? 'not tested after the last risk step' : '',
  ].filter((remark) => remark !== '');
  return remarks.join('; ');
}
