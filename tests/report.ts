import { z } from 'zod';

/** What the counting needs of Vitest's JSON report. */
export const reportSchema = z.object({
  testResults: z.array(
    z.object({
      name: z.string(),
      status: z.string(),
      message: z.string().optional(),
      assertionResults: z.array(z.object({ status: z.string(), fullName: z.string() })),
    }),
  ),
});

export type Report = z.infer<typeof reportSchema>;

/** Passed and failed, and why where a failure is not a test's own. */
export interface Count {
  readonly passed: number;
  readonly failed: number;
  readonly reasons: readonly string[];
}

export function sumOfCounts(counts: readonly Count[]): Count {
  return {
    passed: counts.reduce((sum, { passed }) => sum + passed, 0),
    failed: counts.reduce((sum, { failed }) => sum + failed, 0),
    reasons: counts.flatMap(({ reasons }) => reasons),
  };
}

function countFile({ name, status, assertionResults }: Report['testResults'][number]): Count {
  const reasons: string[] = [];
  const passed = assertionResults.filter((test) => test.status === 'passed').length;
  const failed = assertionResults.length - passed;
  for (const test of assertionResults) {
    if (test.status !== 'passed' && test.status !== 'failed') {
      reasons.push(`${name}: “${test.fullName}” was not run (${test.status})`);
    }
  }
  if (assertionResults.length === 0) reasons.push(`${name}: no test was run`);
  else if (status === 'failed' && failed === 0) reasons.push(`${name}: failed outside its tests`);
  else return { passed, failed, reasons };
  return { passed, failed: failed + 1, reasons };
}

/**
 * Counts a run of Vitest. A test that was skipped counts as failed, and so do a file without a test, a file expected
 * but not run, and a run that ended badly although no test failed (an unhandled error, a crash).
 *
 * @param report as parsed from the file; undefined when there is none
 * @param exitCode of the process
 * @param expectedFiles the files that must have been run, by their full paths
 */
export function countReport(
  report: Report | undefined,
  exitCode: number,
  expectedFiles: readonly string[],
): Count {
  if (report === undefined) return { passed: 0, failed: 1, reasons: ['Vitest ended without a report'] };
  const run = new Set(report.testResults.map(({ name }) => name));
  const missing = expectedFiles.filter((file) => !run.has(file));
  const counted = sumOfCounts([
    ...report.testResults.map(countFile),
    { passed: 0, failed: missing.length, reasons: missing.map((file) => `${file}: was not run`) },
  ]);
  if (exitCode === 0 || counted.failed > 0) return counted;
  const reason = `Vitest ended with code ${String(exitCode)} although no test failed: an unhandled error`;
  return { passed: counted.passed, failed: 1, reasons: [reason] };
}
