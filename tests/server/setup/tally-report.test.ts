import { expect, it } from 'vitest';
import { exitStatusOf, tallySentence } from '@/tests/support/tally';
import { tallyReport } from '@/tests/support/tally-report';

const report = (...files: { status: string; tests: string[] }[]) =>
  JSON.stringify({ testResults: files.map(({ status, tests }) => ({ status, assertionResults: tests.map((one) => ({ status: one })) })) });

it.each([
  ['counts tests', report({ status: 'failed', tests: ['passed', 'failed', 'pending', 'passed'] }), 1, { passed: 2, failed: 1, skipped: 1 }],
  ['counts a file that could not be loaded as a failure', report({ status: 'failed', tests: [] }, { status: 'passed', tests: ['passed'] }), 1, { passed: 1, failed: 1, skipped: 0 }],
  ['counts a failed hook after passed tests', report({ status: 'failed', tests: ['passed'] }), 1, { passed: 1, failed: 1, skipped: 0 }],
  ['counts a bad end that the report does not show', report({ status: 'passed', tests: ['passed'] }), 1, { passed: 1, failed: 1, skipped: 0 }],
  ['counts a missing report as a failure', null, 0, { passed: 0, failed: 1, skipped: 0 }],
  ['counts a broken report as a failure', '{"testResults":', 0, { passed: 0, failed: 1, skipped: 0 }],
  ['counts a level without tests as nothing', report(), 0, { passed: 0, failed: 0, skipped: 0 }],
] as const)('tallyReport %s', (_promise, text, exitStatus, tally) => {
  expect(tallyReport(text, exitStatus)).toEqual(tally);
});

it.each([
  [{ passed: 3, failed: 0, skipped: 0 }, '3 passed, 0 failed', 0],
  [{ passed: 3, failed: 1, skipped: 2 }, '3 passed, 1 failed, 2 skipped', 1],
  [{ passed: 0, failed: 0, skipped: 4 }, '0 passed, 0 failed, 4 skipped', 1],
] as const)('the last line and the exit status of %j', (tally, sentence, status) => {
  expect([tallySentence(tally), exitStatusOf(tally)]).toEqual([sentence, status]);
});
