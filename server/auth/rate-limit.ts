/** A bucket of tokens for each key: so many at once, and so many more each second. */
export interface RateLimit {
  readonly perSecond: number;
  /** Takes one token; false when the bucket is empty. */
  take(key: string): boolean;
  forget(key: string): void;
}

interface Bucket {
  tokens: number;
  atMs: number;
}

/** Keeps at most `mostKeys` buckets; past that the oldest go, so that strangers cannot fill the memory. */
export function makeRateLimit(options: { perSecond: number; burst: number; nowMs: () => number; mostKeys?: number }): RateLimit {
  const buckets = new Map<string, Bucket>();
  return {
    perSecond: options.perSecond,
    take(key) {
      const nowMs = options.nowMs();
      const before = buckets.get(key) ?? { tokens: options.burst, atMs: nowMs };
      const tokens = Math.min(options.burst, before.tokens + ((nowMs - before.atMs) / 1000) * options.perSecond);
      buckets.delete(key);
      buckets.set(key, { tokens: tokens >= 1 ? tokens - 1 : tokens, atMs: nowMs });
      const oldest = buckets.keys().next().value;
      if (buckets.size > (options.mostKeys ?? 10_000) && oldest !== undefined) buckets.delete(oldest);
      return tokens >= 1;
    },
    forget: (key) => void buckets.delete(key),
  };
}
