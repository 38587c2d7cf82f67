'use client';

import { useContext } from 'react';

import { LogContext, type LogCase } from '@/app/_features/log/log-context';
import { monitoringWords } from '@/app/_features/log/monitoring-words';
import { usePageKept } from '@/app/_features/log/use-page-kept';
import { useLiveStore } from '@/app/_live/live-store';
import { useIsLive } from '@/app/_live/use-is-live';
import { useNow } from '@/app/_live/use-now';
import { StatusDot } from '@/app/_ui/status-dot';
import { clockTime } from '@/lib/text/format';

/** Which case this is, where, and how long it has been monitored. */
export function LogHeaderTitle() {
  const held = useContext(LogContext);
  const nowMs = useNow(1000);
  if (held === null) return null;
  const { state } = held;
  return (
    <div className="flex min-w-0 flex-wrap items-baseline gap-x-6">
      <h1 className="font-bold">{state.plan.title}</h1>
      <span className="text-second">{state.plan.theatre}</span>
      <span className="text-second">{monitoringWords(state, held.entries, nowMs, held.timeZone)}</span>
    </div>
  );
}

/** Whether the page outlives its link, whether the wall sees the case, whether all is saved, and the theatre's time. */
export function LogHeaderAside({ caseId }: { readonly caseId: string }) {
  const held = useContext(LogContext);
  const isLive = useIsLive(caseId);
  const wallsConnected = useLiveStore((store) => store.feeds[caseId]?.wallsConnected ?? 0);
  const nowMs = useNow(1000);
  const { isKept, short } = usePageKept();
  return (
    <>
      {held === null ? null : (
        <>
          <StatusDot isOn={isKept}>{short}</StatusDot>
          <StatusDot isOn={isLive && wallsConnected > 0}>{wallWords(isLive, wallsConnected)}</StatusDot>
          <StatusDot isOn={isLive && held.waiting.length === 0}>{savedWords(held, isLive)}</StatusDot>
        </>
      )}
      <time className="font-mono text-xl" aria-label="Theatre time">
        {nowMs === 0 ? '--:--:--' : clockTime(new Date(nowMs).toISOString(), held?.timeZone ?? 'UTC', { seconds: true })}
      </time>
    </>
  );
}

function wallWords(isLive: boolean, wallsConnected: number): string {
  if (!isLive) return 'Wall not known';
  if (wallsConnected === 0) return 'No wall';
  return wallsConnected === 1 ? 'Wall live' : `${wallsConnected} walls live`;
}

function savedWords({ waiting, state, waitingEntries }: LogCase, isLive: boolean): string {
  const count = waiting.filter((one) => one.status === 'waiting').length;
  if (count > 0) return isLive ? `${count} waiting` : `No link, ${count} waiting`;
  if (!isLive) return 'No link';
  return `Saved, entry ${state.seq - waitingEntries.length}`;
}
