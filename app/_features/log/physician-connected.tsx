'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { emptyFeed, useLiveStore } from '@/app/_live/live-store';
import { useIsLive } from '@/app/_live/use-is-live';
import { StatusDot } from '@/app/_ui/status-dot';

/** Whether the physician has the case open, and who else; "not known" without a link. */
export function PhysicianConnected() {
  const { caseId } = useLogCase();
  const people = useLiveStore((store) => (store.feeds[caseId] ?? emptyFeed).peopleConnected);
  const isLive = useIsLive(caseId);
  const isConnected = people.some(({ role }) => role === 'physician');
  const others = [...new Set(people.filter(({ role }) => role !== 'physician' && role !== 'neurophysiologist').map(({ displayName }) => displayName))];
  const words = isConnected ? 'Physician connected' : 'No physician connected';
  return (
    <span className="text-sm">
      <StatusDot isOn={isLive && isConnected}>{isLive ? [words, ...others].join(', ') : 'Physician not known'}</StatusDot>
    </span>
  );
}
