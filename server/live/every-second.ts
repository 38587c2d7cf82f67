/**
 * Runs work about once a second, never twice at a time, and tells its faults instead of ending with them. Work that hangs
 * is given up after `patienceMs`, so that one lost answer does not end the beat for good.
 */
export function everySecond(work: () => Promise<void>, onFault: (cause: unknown) => void, periodMs = 1000, patienceMs = 10_000): { stop: () => void } {
  let runningSinceMs: number | null = null;
  const timer = setInterval(() => {
    const nowMs = performance.now();
    if (runningSinceMs !== null && nowMs - runningSinceMs < patienceMs) return;
    const sinceMs = nowMs;
    runningSinceMs = sinceMs;
    work()
      .catch(onFault)
      .finally(() => {
        if (runningSinceMs === sinceMs) runningSinceMs = null;
      });
  }, periodMs);
  return { stop: () => clearInterval(timer) };
}
