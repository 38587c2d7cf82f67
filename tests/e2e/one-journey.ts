import { afterEach, beforeEach } from 'vitest';

/** The tests of a file are legs of one journey: after one that failed the others cannot be walked, and say so by being skipped. */
export function oneJourney(): void {
  let isOver = false;
  beforeEach((context) => {
    if (isOver) context.skip('an earlier leg of this journey failed');
  });
  afterEach((context) => {
    isOver ||= context.task.result?.state === 'fail';
  });
}
