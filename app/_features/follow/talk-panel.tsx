'use client';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { TalkForm } from '@/app/_features/follow/talk-form';
import { joinClasses } from '@/app/_ui/join-classes';
import { clockTime } from '@/lib/text/format';
import { talkLines, talkNote } from '@/lib/text/talk-lines';

/** Messages and advice in the order of their times, what waits in this browser last, and the box to write. */
export function TalkPanel() {
  const { state, entries, waitingEntries, timeZone, head } = useFollowCase();
  const lines = talkLines(entries, waitingEntries);
  const mayWrite = state.status !== 'closed' && (head.role === 'physician' || head.mayWrite);
  return (
    <aside aria-label="Messages and advice" className="flex min-w-0 flex-col border-rule px-4 py-3 max-lg:border-b sm:px-6 lg:row-span-2 lg:border-l">
      <h2 className="mb-1 font-bold">Messages and advice</h2>
      {lines.length === 0 ? <p className="mb-3 text-second">What the desk and the physician write to each other stands here</p> : null}
      <ol className="mb-3 lg:max-h-[60dvh] lg:overflow-y-auto" tabIndex={lines.length > 0 ? 0 : undefined} aria-label="Written so far">
        {lines.map((line) => (
          <li key={line.key} className={joinClasses('border-b border-rule py-1.5', line.isWaiting && 'text-second')}>
            <span className="font-mono text-[0.9em] text-second">{clockTime(line.at, timeZone)}</span> <b>{line.who}</b>
            {line.isAdvice ? <strong> Advice:</strong> : null} {line.text}
            {talkNote(line, timeZone) === '' ? null : <span className="block text-[0.9em] font-semibold">{talkNote(line, timeZone)}</span>}
          </li>
        ))}
      </ol>
      {mayWrite ? <TalkForm /> : null}
    </aside>
  );
}
