/** What a run of tests came to. */
export interface Tally {
  passed: number;
  failed: number;
  skipped: number;
}

export const NOTHING: Tally = { passed: 0, failed: 0, skipped: 0 };

export const addTallies = (a: Tally, b: Tally): Tally => ({
  passed: a.passed + b.passed,
  failed: a.failed + b.failed,
  skipped: a.skipped + b.skipped,
});

/** A step that is one check by itself, such as lint. */
export const tallyOfCheck = (exitCode: number): Tally => ({
  ...NOTHING,
  passed: exitCode === 0 ? 1 : 0,
  failed: exitCode === 0 ? 0 : 1,
});

/**
 * Counts one run of jest.
 *
 * A suite that could not be run holds tests that nobody counted, so each counts as one failed. So does a run that jest itself calls failed
 * while it counts none (nothing to run, a crash, no report): a project without a test is a mistake, not a pass.
 *
 * @param report what `jest --json` wrote; undefined when it wrote nothing
 */
export function tallyOfJest(report: unknown, exitCode: number): Tally {
  const count = (name: string): number => {
    const value: unknown = typeof report === 'object' && report !== null ? Reflect.get(report, name) : undefined;
    return typeof value === 'number' ? value : 0;
  };
  const passed = count('numPassedTests');
  const failed = count('numFailedTests') + count('numRuntimeErrorTestSuites');
  const skipped = count('numPendingTests') + count('numTodoTests');
  const silent = failed === 0 && (exitCode !== 0 || passed === 0);
  return { passed, failed: silent ? 1 : failed, skipped };
}

/** The last line of `npm test`. */
export function closingLine({ passed, failed, skipped }: Tally): string {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}

/** A run is good when something ran and nothing failed. */
export const exitCodeOf = ({ passed, failed }: Tally): number => (failed === 0 && passed > 0 ? 0 : 1);
