'use client';

import { usePathname } from 'next/navigation';

import { feedProblemWords } from '@/app/_live/feed-words';
import { emptyFeed, useLiveStore } from '@/app/_live/live-store';
import { dismissRefused } from '@/app/_live/send-command';
import { useDeskSession } from '@/app/_live/use-desk-session';
import { Button } from '@/app/_ui/button';
import { NoticeBar } from '@/app/_ui/notice-bar';

/** What the program itself has to say: why it is not live, that the person is signed out, what was refused. */
export function FollowNotices({ caseId }: { readonly caseId: string }) {
  const path = usePathname();
  const session = useDeskSession();
  const feed = useLiveStore((store) => store.feeds[caseId] ?? emptyFeed);
  const refused = useLiveStore((store) => store.waiting).filter((one) => one.caseId === caseId && one.status === 'refused');
  const problem = feedProblemWords(feed);
  return (
    <>
      {problem === null ? null : <NoticeBar tone="strong">{problem}</NoticeBar>}
      {session.status === 'signed-out' ? (
        <NoticeBar tone="strong" action={<a href={`/sign-in?next=${encodeURIComponent(path)}`} className="inline-flex min-h-9 items-center font-bold underline underline-offset-4">Sign in again</a>}>
          Signed out: what you write here waits in this browser for you
        </NoticeBar>
      ) : null}
      {refused.map((one) => (
        <NoticeBar key={one.commandId} tone="strong" action={<Button onClick={() => void dismissRefused(one.commandId)}>Read</Button>}>
          {`Not sent: ${one.refusal?.message ?? 'the server refused it'}`}
        </NoticeBar>
      ))}
    </>
  );
}
