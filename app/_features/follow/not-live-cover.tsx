'use client';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { feedProblemWords } from '@/app/_live/feed-words';
import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { clockTime } from '@/lib/text/format';
import { pastHeadline, staysLarge } from '@/lib/text/past-headline';
import { stateMark } from '@/lib/text/state-mark';
import { theatreView } from '@/lib/text/theatre-view';

/** The case when it is not live: hatched, in the past tense with its time. An alert that was open keeps its mark and its size. */
export function NotLiveCover() {
  const { state, feed, timeZone } = useFollowCase();
  const checkedAt = feed.checkedAt ?? state.phaseAt;
  const view = theatreView(state, Date.parse(checkedAt), timeZone);
  return (
    <section aria-label="Not live" className="sticky top-0 flex flex-col gap-4 px-4 py-6 sm:px-6">
      <div>
        <h2 className="text-[1.7em] leading-tight font-bold">Not live</h2>
        <p className="mt-1">{feedProblemWords(feed) ?? 'No word from the log for more than 3 s. Call the desk if this lasts.'}</p>
      </div>
      <ul className="flex flex-col gap-3">
        {[view.lead, ...view.others].map((line) => (
          <li key={`${line.kind} ${line.nerveId ?? ''} ${line.headline}`} className={joinClasses('flex items-center gap-3', staysLarge(line) ? 'text-[1.7em] leading-tight font-bold' : 'text-second')}>
            {line.priority === null ? null : <PriorityMark kind={stateMark(line)} className="size-[1em] shrink-0" />}
            <span className="min-w-0">{pastHeadline(line)}</span>
          </li>
        ))}
      </ul>
      <p>{`State at ${clockTime(checkedAt, timeZone, { seconds: true })}. It may have changed.`}</p>
    </section>
  );
}
