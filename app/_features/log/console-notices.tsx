'use client';

import { SignedOutBar } from '@/app/_features/log/signed-out-bar';
import { usePageKept } from '@/app/_features/log/use-page-kept';
import type { FeedProblem } from '@/app/_live/live-store';
import { useLiveStore } from '@/app/_live/live-store';
import { dismissRefused } from '@/app/_live/send-command';
import type { FollowedCase } from '@/app/_live/use-case-feed';
import { Button } from '@/app/_ui/button';
import { NoticeBar } from '@/app/_ui/notice-bar';
import type { Refusal } from '@/lib/case/commands';

const problems: Readonly<Record<FeedProblem, string>> = {
  'newer-version': 'Newer version: this page cannot read the log any more. Load the page again',
  fork: 'Log differs: this browser holds entries that the server does not have. Load the page again and tell the administrator',
  'not-found': 'Not found: this case is not open to you any more',
  unreadable: 'Not readable: an entry came that this page cannot read. Load the page again',
};

interface ConsoleNoticesProps {
  readonly caseId: string;
  readonly feed: FollowedCase;
  readonly refusals: readonly { readonly commandId: string; readonly refusal: Refusal }[];
  readonly isSignedOut: boolean;
  readonly mayWrite: boolean;
}

/** What the program itself has to say: link, sign-in, refused entries. Never in a priority colour. */
export function ConsoleNotices({ caseId, feed, refusals, isSignedOut, mayWrite }: ConsoleNoticesProps) {
  const isStorageDurable = useLiveStore((store) => store.isStorageDurable);
  const pageKept = usePageKept();
  const refused = useLiveStore((store) => store.waiting).filter((one) => one.caseId === caseId && one.status === 'refused');
  return (
    <>
      {feed.problem === null ? null : <NoticeBar tone="strong">{problems[feed.problem]}</NoticeBar>}
      {isSignedOut ? <SignedOutBar /> : null}
      {isStorageDurable ? null : <NoticeBar tone="strong">This browser keeps nothing: entries that wait are lost when the page is loaded again</NoticeBar>}
      {pageKept.sentence === null || !mayWrite ? null : <NoticeBar tone="plain">{pageKept.sentence}</NoticeBar>}
      {mayWrite ? null : <NoticeBar tone="plain">Read only: entries are written by the neurophysiologist of this case</NoticeBar>}
      {refused.map((one) => (
        <NoticeBar key={one.commandId} tone="strong" action={<Button onClick={() => void dismissRefused(one.commandId)}>Read</Button>}>
          {`Not logged: ${one.refusal?.message ?? 'the server refused an entry'}`}
        </NoticeBar>
      ))}
      {refusals.map((one) => (
        <NoticeBar key={one.commandId} tone="plain">{`Waits, and will be refused as things stand: ${one.refusal.message}`}</NoticeBar>
      ))}
    </>
  );
}
