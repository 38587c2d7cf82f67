'use client';

import { useEffect } from 'react';

import type { Viewer } from '@/app/_live/live-socket';
import { emptyFeed, useLiveStore, type CaseFeed, type Link } from '@/app/_live/live-store';
import { tabClient } from '@/app/_live/tab-client';

/** A followed case with the state of the link. */
export type FollowedCase = CaseFeed & { readonly link: Link };

/**
 * Follows a case for as long as the component stands. `person` sits at the desk and counts as the desk's presence;
 * `follow` reads only; `wall` is a paired screen.
 */
export function useCaseFeed(caseId: string, viewer: 'person' | 'follow' | 'wall'): FollowedCase {
  useEffect(() => {
    const as: Viewer = viewer === 'person' ? 'desk' : viewer;
    let release: (() => void) | null = null;
    let isOver = false;
    void tabClient().then((client) => {
      if (!isOver) release = client.follow(caseId, as);
    });
    return () => {
      isOver = true;
      release?.();
    };
  }, [caseId, viewer]);
  const feed = useLiveStore((store) => store.feeds[caseId] ?? emptyFeed);
  const link = useLiveStore((store) => store.link);
  return { ...feed, link };
}
