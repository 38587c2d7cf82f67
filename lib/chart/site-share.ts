import type { PathRecord } from '@/lib/case/case-state';

/**
 * What is kept of the response from a site, against its baseline.
 * @param record what the path showed last; undefined before its first run
 * @returns a share, 1 for all, 0 for no response; null without a comparable amplitude
 * @source house rule: no response counts as 0 here, and as "none" in words
 * @accuracy exact
 * @example
 * siteShare(undefined) // => null
 */
export function siteShare(record: PathRecord | undefined): number | null {
  const compared = record?.compared ?? null;
  if (compared === null) return null;
  if (compared.reading.kind === 'absent') return 0;
  return compared.change.percentOfBaseline === null ? null : compared.change.percentOfBaseline / 100;
}
