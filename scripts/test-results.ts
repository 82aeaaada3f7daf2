/** How one part of the tests ended. */
export interface Counts {
  passed: number;
  failed: number;
  skipped: number;
}

/** What vitest's JSON reporter writes; the part we read. */
interface VitestReport {
  success: boolean;
  numPassedTests: number;
  numFailedTests: number;
  numPendingTests: number;
  numTodoTests: number;
  testResults: { status: string; assertionResults: unknown[] }[];
}

/** What Playwright's JSON reporter writes; the part we read. */
interface PlaywrightReport {
  stats: { expected: number; unexpected: number; flaky: number; skipped: number };
  errors: unknown[];
}

/** Counts a run of vitest. A file that does not even load has no tests, so it counts as a failed one. */
export function countVitest(report: VitestReport): Counts {
  const brokenFiles = report.testResults.filter(
    (file) => file.status === "failed" && file.assertionResults.length === 0,
  ).length;
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests + brokenFiles,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

/** Counts a run of Playwright. What goes wrong outside of tests counts as a failed one. */
export function countPlaywright({ stats, errors }: PlaywrightReport): Counts {
  return { passed: stats.expected + stats.flaky, failed: stats.unexpected + errors.length, skipped: stats.skipped };
}

/** One check that has no tests inside. */
export function countCheck(passed: boolean): Counts {
  return { passed: passed ? 1 : 0, failed: passed ? 0 : 1, skipped: 0 };
}

/**
 * What a program's tests came to: its report, or one failed where it left none.
 * A program that ends with an error though its report shows none has one failed, too.
 */
export function countRun(exitCode: number, counted: Counts | null): Counts {
  if (!counted) return countCheck(false);
  return exitCode !== 0 && counted.failed === 0 ? { ...counted, failed: 1 } : counted;
}

export function sum(counts: Counts[]): Counts {
  return counts.reduce((all, one) => ({
    passed: all.passed + one.passed,
    failed: all.failed + one.failed,
    skipped: all.skipped + one.skipped,
  }));
}

/** The last line of a run. */
export function countsLine({ passed, failed, skipped }: Counts): string {
  return `${passed} passed, ${failed} failed${skipped ? `, ${skipped} skipped` : ""}`;
}
