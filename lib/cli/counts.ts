/** How many tests or checks passed and failed. */
export interface Counts {
  passed: number;
  failed: number;
}

/** No tests at all. */
export const NOTHING: Counts = { passed: 0, failed: 0 };

/** The sum of two counts. */
export function addCounts(a: Counts, b: Counts): Counts {
  return { passed: a.passed + b.passed, failed: a.failed + b.failed };
}

/** The line a test run ends with. */
export function formatCounts({ passed, failed }: Counts): string {
  return `${passed} passed, ${failed} failed`;
}

/** The part of vitest's JSON report that is counted. */
interface VitestReport {
  numPassedTests?: number;
  numFailedTests?: number;
  testResults?: readonly { status?: string; assertionResults?: readonly unknown[] }[];
}

/** The part of Playwright's JSON report that is counted. */
interface PlaywrightReport {
  stats?: { expected?: number; unexpected?: number; flaky?: number };
  errors?: readonly unknown[];
}

/** Counts a vitest report; a file that could not even be loaded counts as one failure. */
export function countVitest(report: VitestReport): Counts {
  const unloaded = (report.testResults ?? []).filter(
    ({ status, assertionResults }) => status === 'failed' && (assertionResults ?? []).length === 0,
  );
  return { passed: report.numPassedTests ?? 0, failed: (report.numFailedTests ?? 0) + unloaded.length };
}

/** Counts a Playwright report; errors outside any test count, and so does a test that passed only when repeated. */
export function countPlaywright({ stats = {}, errors = [] }: PlaywrightReport): Counts {
  return { passed: stats.expected ?? 0, failed: (stats.unexpected ?? 0) + (stats.flaky ?? 0) + errors.length };
}

/**
 * Makes the exit code count: a part that ended badly without naming a failed test, and a part that ran no test at
 * all, are one failure each, so that no part can fall away unseen.
 */
export function withExitCode(counts: Counts, code: number): Counts {
  if (counts.failed > 0) return counts;
  const broken = code !== 0 || counts.passed === 0;
  return broken ? { ...counts, failed: 1 } : counts;
}
