/** Counts what vitest reports. A file that could not be loaded, a skipped test, and a bad end without a failed test each count
 *  as one failure: nothing that did not run may look as if it had passed.
 *  @param report vitest's JSON report, null when there is none @param {number} code exit code of vitest
 *  @returns {{ passed: number, failed: number, remarks: string[] }} */
export function countTests(report, code) {
  if (!report) return { passed: 0, failed: 1, remarks: ['Vitest ended without a report.'] };
  const remarks = [];
  let passed = 0;
  let failed = 0;
  for (const file of report.testResults) {
    const failedBefore = failed;
    for (const test of file.assertionResults) {
      if (test.status === 'passed') passed += 1;
      else {
        failed += 1;
        if (test.status !== 'failed') remarks.push(`${file.name}: "${test.fullName}" did not run (${test.status}).`);
      }
    }
    if (file.status === 'failed' && failed === failedBefore) {
      failed += 1;
      remarks.push(`${file.name} failed outside its tests.`);
    }
  }
  if (passed + failed === 0) return { passed, failed: 1, remarks: ['No test was found.'] };
  if (code !== 0 && failed === 0) return { passed, failed: 1, remarks: [`Vitest ended with exit code ${code} although no test failed.`] };
  return { passed, failed, remarks };
}
