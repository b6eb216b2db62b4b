/**
 * Counts what a vitest JSON report says. A file that fails as a whole (it cannot be imported, a hook breaks) counts as one
 * failure, or it would vanish from the total.
 * @param report the parsed report, or null when vitest left none
 * @param exitCode vitest's exit code: a failure it does not count itself (an unhandled error, no test found) counts as one
 * @returns { passed, failed, skipped: names of skipped tests }
 */
export function countTestResults(report, exitCode) {
  const files = report?.testResults ?? [];
  const tests = files.flatMap((file) => file.assertionResults.map((test) => ({ ...test, file: file.name })));
  const ofStatus = (...statuses) => tests.filter(({ status }) => statuses.includes(status));
  const brokenFiles = files.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some(({ status }) => status === 'failed'),
  );
  const failed = ofStatus('failed').length + brokenFiles.length;
  return {
    passed: ofStatus('passed').length,
    failed: failed === 0 && (exitCode !== 0 || report === null) ? 1 : failed,
    skipped: ofStatus('skipped', 'pending', 'todo', 'disabled').map(
      ({ file, fullName, title }) => `${file}: ${(fullName ?? title).trim()}`,
    ),
  };
}

/** The last line of `npm test`. */
export function formatTotals({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}
