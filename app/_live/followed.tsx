'use client';

import { useCaseFeed } from '@/app/_live/use-case-feed';

/** Follows a case for as long as it stands on the page, and draws nothing: a page of several cases reads the store. */
export function Followed({ caseId }: { readonly caseId: string }) {
  useCaseFeed(caseId, 'follow');
  return null;
}
