import type { FeedProblem } from '@/app/_live/live-store';

const reasons: Record<FeedProblem, string> = {
  'newer-version': 'The log holds entries that this screen cannot read yet. Load the page again, and ask the neurophysiologist.',
  fork: 'The log does not continue what was shown here. Ask the neurophysiologist.',
  'not-found': 'This case is not open to this screen any more. Ask the neurophysiologist.',
  unreadable: 'An entry arrived that this screen cannot read. Ask the neurophysiologist.',
};

/** Why the wall is not live, in a sentence that stays true however long it stands. */
export function notLiveReason(problem: FeedProblem | null): string {
  return problem === null ? 'No word from the log for more than 3 s. Ask the neurophysiologist.' : reasons[problem];
}
