/** How many tests passed and failed by Vitest's report; a run or file that broke outside its tests counts as one failure. */

import { existsSync, readFileSync } from 'node:fs';

export function countTests(reportFile, exitCode) {
  if (!existsSync(reportFile)) return { passed: 0, failed: 1 };
  const report = JSON.parse(readFileSync(reportFile, 'utf8'));
  const brokenFiles = report.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  ).length;
  const failed = report.numFailedTests + brokenFiles;
  return { passed: report.numPassedTests, failed: exitCode !== 0 && failed === 0 ? 1 : failed };
}
