export type Tally = Readonly<{ passed: number; failed: number; skipped: number }>;

export const nothing: Tally = { passed: 0, failed: 0, skipped: 0 };

export function addTallies(tallies: readonly Tally[]): Tally {
  return tallies.reduce((sum, one) => ({ passed: sum.passed + one.passed, failed: sum.failed + one.failed, skipped: sum.skipped + one.skipped }), nothing);
}

/** The last line of `npm test`. */
export function tallySentence({ passed, failed, skipped }: Tally): string {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}

/** Nothing that ran is no success: it is what a wrong filter or a broken set-up looks like. */
export function exitStatusOf({ passed, failed }: Tally): 0 | 1 {
  return failed > 0 || passed === 0 ? 1 : 0;
}
