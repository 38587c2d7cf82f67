/** The value below which a share of the sorted values lies; the nearest one that was measured, never one in between. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((one, other) => one - other);
  const rank = Math.min(sorted.length, Math.max(1, Math.ceil(share * sorted.length)));
  const value = sorted[rank - 1];
  if (value === undefined) throw new RangeError('No values: a quantile needs at least one');
  return value;
}
