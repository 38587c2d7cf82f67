import type { Tally } from './tally';

type FileReport = Readonly<{ status: string; assertionResults: readonly Readonly<{ status: string }>[] }>;

/**
 * Counts a test run by its report. A file that failed without a single test (it could not be loaded) counts as one
 * failure; so does a run that ended badly for a reason that its report does not show, and one without a report.
 */
export function tallyReport(report: string | null, exitStatus: number): Tally {
  const files = report === null ? null : readFiles(report);
  if (files === null) return { passed: 0, failed: 1, skipped: 0 };
  const results = files.flatMap((file) => file.assertionResults.map(({ status }) => status));
  const passed = results.filter((status) => status === 'passed').length;
  const failedTests = results.filter((status) => status === 'failed').length;
  const brokenFiles = files.filter((file) => file.status === 'failed' && !file.assertionResults.some(({ status }) => status === 'failed')).length;
  const failed = failedTests + brokenFiles;
  return { passed, failed: failed === 0 && exitStatus !== 0 ? 1 : failed, skipped: results.length - passed - failedTests };
}

function readFiles(report: string): readonly FileReport[] | null {
  try {
    const parsed = JSON.parse(report) as { testResults?: readonly FileReport[] };
    return parsed.testResults ?? null;
  } catch {
    return null;
  }
}
