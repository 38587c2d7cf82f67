const stepsMs = [10, 30, 60, 120, 300, 600, 900, 1800, 3600, 7200].map((seconds) => seconds * 1000);
const mostTicks = 8;

/** Whole times on a time axis, at most eight, and whether they need seconds. */
export function timeTicks(fromMs: number, toMs: number): { readonly atMs: readonly number[]; readonly hasSeconds: boolean } {
  const stepMs = stepsMs.find((step) => (toMs - fromMs) / step < mostTicks) ?? Math.ceil((toMs - fromMs) / mostTicks / 3_600_000) * 3_600_000;
  const first = Math.ceil(fromMs / stepMs) * stepMs;
  const atMs: number[] = [];
  for (let tick = first; tick <= toMs; tick += stepMs) atMs.push(tick);
  return { atMs, hasSeconds: stepMs < 60_000 };
}
