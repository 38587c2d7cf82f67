/** A confirmation of a wall that an entry's state, or its alert, stands on the glass. */
export interface Painted {
  readonly caseId: string;
  readonly screenId: string;
  readonly seq: number;
  readonly alertId: string | null;
  readonly paintedAt: string;
}

/** The newest confirmation of each wall, in memory. */
export interface PaintedAlerts {
  note(painted: Painted): void;
  newestOf(caseId: string): readonly Painted[];
}

const mostWalls = 5_000;

/** Keeps the highest number that each wall has confirmed; the oldest walls go first. */
export function makePaintedAlerts(): PaintedAlerts {
  const newest = new Map<string, Painted>();
  return {
    note(painted) {
      const before = newest.get(painted.screenId);
      if (before !== undefined && before.seq > painted.seq) return;
      newest.delete(painted.screenId);
      newest.set(painted.screenId, painted);
      const oldest = newest.keys().next().value;
      if (newest.size > mostWalls && oldest !== undefined) newest.delete(oldest);
    },
    newestOf: (caseId) => [...newest.values()].filter((painted) => painted.caseId === caseId),
  };
}
