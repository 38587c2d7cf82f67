/** A command that the server acknowledged, with the number it gave. */
export interface Acknowledged {
  readonly commandId: string;
  readonly seq: number;
}

/** One row of the log. */
export interface LogRow {
  readonly seq: number;
  readonly commandId: string;
  readonly commandPart: number;
}

/** What the log owes to those who were answered. All empty is right. */
export interface Losses {
  readonly missing: readonly string[];
  readonly renumbered: readonly string[];
  readonly duplicated: readonly string[];
  readonly reordered: readonly string[];
  readonly gaps: readonly number[];
}

/** Holds a journal of acknowledgements against the log. Knows nothing of how either was made. */
export function findLosses(acknowledged: readonly Acknowledged[], log: readonly LogRow[]): Losses {
  const firstSeq = new Map<string, number>();
  const parts = new Set<string>();
  const duplicated: string[] = [];
  for (const row of log) {
    const part = `${row.commandId}#${row.commandPart}`;
    if (parts.has(part)) duplicated.push(part);
    parts.add(part);
    if (row.commandPart === 0) firstSeq.set(row.commandId, row.seq);
  }
  const missing = acknowledged.filter((one) => !firstSeq.has(one.commandId)).map((one) => one.commandId);
  const renumbered = acknowledged
    .filter((one) => firstSeq.has(one.commandId) && firstSeq.get(one.commandId) !== one.seq)
    .map((one) => one.commandId);
  const reordered = acknowledged.filter((one, index) => index > 0 && one.seq <= (acknowledged[index - 1]?.seq ?? 0)).map((one) => one.commandId);
  const gaps = log.filter((row, index) => row.seq !== index + 1).map((row) => row.seq);
  return { missing, renumbered, duplicated, reordered, gaps };
}
