import type { CaseEntry } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import { entrySentence } from '@/lib/text/entry-sentence';
import { clockTime } from '@/lib/text/format';
import type { TheatreView } from '@/lib/text/theatre-line';

/** One line of the terminal: the clock, who did what and what the case made of it, and what the wall says now. */
export function stepLine(step: { entries: readonly CaseEntry[]; plan: CasePlan; view: TheatreView; timeZone: string; at: string }): string {
  const { entries, plan, view, timeZone, at } = step;
  const said = entries.filter((entry) => entry.kind !== 'run.judged').map((entry) => `${authorNames[entry.author.role] ?? entry.author.role}: ${entrySentence(entry, plan, timeZone)}`);
  return `${clockTime(at, timeZone, { seconds: true })}  ${said.join(' / ')}  →  wall: ${wallWords(view)}`;
}

const authorNames: Readonly<Record<string, string>> = { neurophysiologist: 'desk' };

/** What leads on the wall, and what else it says. */
function wallWords({ lead, others }: TheatreView): string {
  return [lead, ...others].map((line) => line.headline).join('. ');
}
