/**
 * @typedef {object} Tally
 * @property {number} passed
 * @property {number} failed
 * @property {string[]} remarks what went wrong beside failed tests
 *
 * @typedef {{ status: string, assertionResults: unknown[] }} SuiteReport one test file
 * @typedef {{ numPassedTests: number, numFailedTests: number, testResults: SuiteReport[] }} VitestReport
 */

/**
 * Counts vitest's JSON report. A file that could not be loaded, a run that broke down and a run without tests are
 * failures too, one each, though no single test failed.
 * @param {VitestReport | undefined} report undefined when vitest wrote none
 * @param {number} code vitest's exit code
 * @returns {Tally}
 */
export function countVitest(report, code) {
  if (report === undefined) return { passed: 0, failed: 1, remarks: [`vitest broke down (exit code ${code}).`] };
  const { numPassedTests: passed, numFailedTests } = report;
  const unloaded = report.testResults.filter(
    ({ status, assertionResults }) => status === "failed" && assertionResults.length === 0,
  );
  const failed = numFailedTests + unloaded.length;
  const remarks =
    unloaded.length > 0 ? [`${unloaded.length} test file(s) could not be loaded; each counts as one failure.`] : [];
  if (failed === 0 && passed === 0)
    return { passed, failed: 1, remarks: ["No test was run, which counts as a failure."] };
  if (failed === 0 && code !== 0) {
    return {
      passed,
      failed: 1,
      remarks: [`vitest ended with code ${code} although no test failed; see the errors above.`],
    };
  }
  return { passed, failed, remarks };
}

/**
 * @param {readonly Tally[]} tallies
 * @returns {Tally}
 */
export function sumTallies(tallies) {
  return {
    passed: tallies.reduce((sum, { passed }) => sum + passed, 0),
    failed: tallies.reduce((sum, { failed }) => sum + failed, 0),
    remarks: tallies.flatMap(({ remarks }) => remarks),
  };
}
