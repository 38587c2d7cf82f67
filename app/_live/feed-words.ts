import type { CaseFeed, FeedProblem } from '@/app/_live/live-store';

const problems: Readonly<Record<FeedProblem, string>> = {
  'newer-version': 'Newer version: this page cannot read the log any more. Load the page again',
  fork: 'Log differs: this browser holds entries that the server does not have. Load the page again and tell the administrator',
  'not-found': 'Not found: this case is not open to you any more',
  unreadable: 'Not readable: an entry came that this page cannot read. Load the page again',
};
const endings = {
  revoked: 'Ended: you may not follow this case any more',
  'signed-out': 'Signed out: sign in again to follow',
  'case-closed': 'Case closed: it is not followed any more',
} as const;

/** Why a case is not live, apart from a missing link, in a sentence that stays true however long it stands; null when only the link is missing. */
export function feedProblemWords({ problem, ended }: Pick<CaseFeed, 'problem' | 'ended'>): string | null {
  if (problem !== null) return problems[problem];
  return ended === null ? null : endings[ended];
}
