'use client';

import Link from 'next/link';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { useLiveStore } from '@/app/_live/live-store';
import { StatusDot } from '@/app/_ui/status-dot';
import { clockTime } from '@/lib/text/format';
import { connectedWords, deskWords } from '@/lib/text/today-facts';

/** Which case this is, whether it is live, and who is there. */
export function CaseTitle() {
  const { caseId, state, feed, timeZone, isLive, head } = useFollowCase();
  const session = useLiveStore((store) => store.session);
  const viewer = { personId: 'personId' in session ? session.personId : '', role: head.role };
  return (
    <header className="flex flex-wrap items-baseline gap-x-6 gap-y-1 border-b border-rule px-4 py-3 sm:px-6">
      <h1 className="text-[1.3em] leading-snug font-bold">{state.plan.title}</h1>
      <span className="text-second">{`${state.plan.theatre}, ${head.reference}`}</span>
      <StatusDot isOn={isLive}>{isLive ? 'Live' : `Not live since ${clockTime(feed.checkedAt ?? state.phaseAt, timeZone, { seconds: true })}`}</StatusDot>
      <StatusDot isOn={isLive && feed.deskConnected}>{deskWords({ ...feed, timeZone, isLive })}</StatusDot>
      <span className="text-second">{isLive ? wallWords(feed.wallsConnected) : 'Wall not known'}</span>
      <span className="text-second">{connectedWords({ ...feed, viewer, isLive })}</span>
      {state.status === 'closed' ? <Link href={`/cases/${caseId}/record`} className="font-semibold text-stain underline underline-offset-4">Record</Link> : null}
    </header>
  );
}

function wallWords(wallsConnected: number): string {
  if (wallsConnected === 0) return 'No wall connected';
  return wallsConnected === 1 ? '1 wall connected' : `${wallsConnected} walls connected`;
}
