/** A case whose log has grown, and the number it has grown to. */
export interface Ring {
  readonly caseId: string;
  readonly seq: number;
}

export const BELL_CHANNEL = 'fascicle_bell';

/** PostgreSQL takes less than 8,000 bytes; one ring is at most 36 + 16 + 8 of them. */
export const RINGS_PER_PAYLOAD = 100;

export function writePayload(rings: readonly Ring[]): string {
  return JSON.stringify(rings.map(({ caseId, seq }) => [caseId, seq]));
}

/** The rings of a payload, or null when something else was sent on the channel: a reader then relies on its poll. */
export function readPayload(payload: string): Ring[] | null {
  let parsed: unknown;
  try {
    parsed = JSON.parse(payload);
  } catch {
    return null;
  }
  if (!Array.isArray(parsed)) return null;
  const rings: Ring[] = [];
  for (const pair of parsed as unknown[]) {
    if (!Array.isArray(pair)) return null;
    const [caseId, seq] = pair as unknown[];
    if (typeof caseId !== 'string' || !Number.isSafeInteger(seq)) return null;
    rings.push({ caseId, seq: Number(seq) });
  }
  return rings;
}
