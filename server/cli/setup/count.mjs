/**
 * Passed and failed tests of a vitest JSON report. A test that was skipped has not passed, and a file that could not
 * be run has failed.
 */
export function count({ testResults }, complain) {
  const tests = testResults.flatMap((file) => file.assertionResults);
  const passed = tests.filter((test) => test.status === 'passed').length;
  const notRun = testResults.filter((file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'));
  for (const file of notRun) complain(`Not run: ${file.name}`);
  for (const test of tests.filter(({ status }) => status !== 'passed' && status !== 'failed')) complain(`Skipped, so not passed: ${test.fullName}`);
  return { passed, failed: tests.length - passed + notRun.length };
}
