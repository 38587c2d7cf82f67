/** Who of a case is connected to this process. */
export interface PresenceOfCase {
  readonly deskConnected: boolean;
  /** Since when the desk is connected, or since when it no longer is; null when it never was. */
  readonly deskSince: string | null;
  readonly wallsConnected: number;
}

/** Presence of desks and walls, by case. */
export interface Presence {
  arrive(caseId: string, socketId: string, as: { readonly desk: boolean; readonly screenId: string | null }): void;
  leave(caseId: string, socketId: string): void;
  of(caseId: string): PresenceOfCase;
  wallsOf(caseId: string): ReadonlySet<string>;
}

interface Present {
  readonly desks: Set<string>;
  readonly walls: Map<string, string>;
  deskSince: string | null;
}

const mostCases = 5_000;

/** Keeps presence in memory. A case that nobody is at stays known, so that "desk not connected since" can be said. */
export function makePresence(nowMs: () => number): Presence {
  const cases = new Map<string, Present>();
  const find = (caseId: string): Present => {
    const found = cases.get(caseId) ?? { desks: new Set<string>(), walls: new Map<string, string>(), deskSince: null };
    cases.set(caseId, found);
    return found;
  };
  return {
    arrive(caseId, socketId, { desk, screenId }) {
      const present = find(caseId);
      if (screenId !== null) present.walls.set(socketId, screenId);
      if (!desk) return;
      if (present.desks.size === 0) present.deskSince = new Date(nowMs()).toISOString();
      present.desks.add(socketId);
    },
    leave(caseId, socketId) {
      const present = cases.get(caseId);
      if (present === undefined) return;
      present.walls.delete(socketId);
      if (present.desks.delete(socketId) && present.desks.size === 0) present.deskSince = new Date(nowMs()).toISOString();
      if (cases.size > mostCases && present.desks.size === 0 && present.walls.size === 0) cases.delete(caseId);
    },
    of(caseId) {
      const present = cases.get(caseId);
      return {
        deskConnected: (present?.desks.size ?? 0) > 0,
        deskSince: present?.deskSince ?? null,
        wallsConnected: new Set(present?.walls.values()).size,
      };
    },
    wallsOf: (caseId) => new Set(cases.get(caseId)?.walls.values()),
  };
}
