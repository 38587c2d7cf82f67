/** What the program that migrates tells: how many it applied, and the one that failed (null: none, or failed before any) with the reason. */
export interface MigrationsReport {
  readonly applied: number;
  readonly failed: string | null;
  readonly reason: string | null;
}

/** The report in a program's output, or null when it ended without one. */
export function readMigrationsReport(output: string): MigrationsReport | null {
  const line = output.split('\n').findLast((one) => one.startsWith('{"applied":'));
  try {
    return line === undefined ? null : (JSON.parse(line) as MigrationsReport);
  } catch {
    return null;
  }
}
