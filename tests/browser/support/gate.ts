/**
 * Some of the browser checks are not yet steady enough to stand in everybody's way: they run where HOLDWATER_ALL_BROWSER_TESTS is set, and
 * are reported as skipped, by name, where it is not.
 */
export const isEveryBrowserTestRun = process.env.HOLDWATER_ALL_BROWSER_TESTS !== undefined;
