/** @typedef {{ passed: number, failed: number, notes: string[] }} Tally notes: failures that no test speaks of */

/**
 * Counts a run of one Vitest project. Whatever is not plainly a pass counts as a failure: a file that could not be loaded, a skipped test,
 * a run without tests, a run that was killed or that failed outside its tests.
 * @param {string} project
 * @param {{ testResults: { name: string, status: string, message?: string, assertionResults: { status: string, fullName?: string }[] }[] } | null} report of Vitest's JSON reporter; null when none was written
 * @param {{ code: number | null, signal: string | null }} end of the process
 * @param {{ filteredByName?: boolean }} [options] filteredByName: tests were chosen by title, so the others are skipped on purpose
 * @returns {Tally}
 */
export function tallyVitest(project, report, end, { filteredByName = false } = {}) {
  const how = end.signal ? `was ended by ${end.signal}` : `ended with exit code ${end.code}`;
  if (!report) return { passed: 0, failed: 1, notes: [`${project}: the run ${how} without a result.`] };
  const tally = { passed: 0, failed: 0, notes: [] };
  for (const file of report.testResults) {
    let failedHere = 0;
    for (const { status, fullName } of file.assertionResults) {
      if (status === 'passed') tally.passed += 1;
      else if (status === 'failed') failedHere += 1;
      else if (!filteredByName) {
        failedHere += 1;
        tally.notes.push(`${project}: "${fullName}" in ${file.name} did not run (${status}).`);
      }
    }
    if (file.status === 'failed' && failedHere === 0) {
      failedHere = 1;
      tally.notes.push(`${project}: ${file.name} could not be run.`);
    }
    tally.failed += failedHere;
  }
  if (tally.passed + tally.failed === 0) {
    return { passed: 0, failed: 1, notes: [`${project}: there were no tests to run.`] };
  }
  if (tally.failed === 0 && end.code !== 0) {
    tally.failed = 1;
    tally.notes.push(`${project}: every test passed, yet the run ${how}.`);
  }
  return tally;
}

/** @param {Tally[]} tallies */
export function addTallies(tallies) {
  return {
    passed: tallies.reduce((sum, { passed }) => sum + passed, 0),
    failed: tallies.reduce((sum, { failed }) => sum + failed, 0),
    notes: tallies.flatMap(({ notes }) => notes),
  };
}

/** The one last line of `npm test`. @param {{ passed: number, failed: number }} tally */
export function summaryLine({ passed, failed }) {
  return `${passed} passed, ${failed} failed`;
}
