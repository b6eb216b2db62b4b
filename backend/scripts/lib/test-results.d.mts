export interface ReportedTest {
  status: string;
  title: string;
  fullName?: string;
}
export interface Report {
  testResults: { name: string; status: string; assertionResults: ReportedTest[] }[];
}
export function countTestResults(
  report: Report | null,
  exitCode: number,
): { passed: number; failed: number; skipped: string[] };
export function formatTotals(totals: { passed: number; failed: number; skipped: number }): string;
