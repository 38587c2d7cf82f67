import type { CasePresence, PresentViewer } from '@/db/repositories/presence/elsewhere';
import type { PulseMessage } from '@/lib/contracts/channel/messages';

/** What a pulse says of who is at a case. */
export type WholePresence = Pick<PulseMessage['cases'][number], 'deskConnected' | 'deskSince' | 'wallsConnected' | 'peopleConnected'>;

/** One presence of what several processes know. `deskSince`: since when a desk is connected, or since when none is; null when there never was one. */
export function wholePresence(parts: readonly CasePresence[]): WholePresence {
  const viewers = parts.flatMap((part) => part.viewers);
  const desks = viewers.filter(({ isDesk }) => isDesk).map(({ since }) => since);
  const gone = parts.flatMap(({ deskGoneAt }) => deskGoneAt ?? []);
  return {
    deskConnected: desks.length > 0,
    deskSince: (desks.length > 0 ? desks.toSorted()[0] : gone.toSorted().at(-1)) ?? null,
    wallsConnected: wallsIn(viewers).size,
    peopleConnected: peopleIn(viewers),
  };
}

/** Ids of the walls among these viewers; one with two connections is one wall. */
export function wallsIn(viewers: readonly PresentViewer[]): ReadonlySet<string> {
  return new Set(viewers.flatMap(({ screenId }) => screenId ?? []));
}

/** Each person once in each role, from the first of their connections on. */
function peopleIn(viewers: readonly PresentViewer[]): WholePresence['peopleConnected'] {
  const people = new Map<string, WholePresence['peopleConnected'][number]>();
  for (const { personId, role, displayName, since } of viewers.toSorted((one, other) => (one.since < other.since ? -1 : 1))) {
    const key = `${personId} ${role}`;
    if (personId !== null && !people.has(key)) people.set(key, { personId, role, displayName, since });
  }
  return [...people.values()];
}
