// @ts-check
import { existsSync, readFileSync } from "node:fs";

/**
 * How many checks of a stage passed and failed.
 * @typedef {{ passed: number, failed: number, remarks: string[] }} Counts
 */

/**
 * A stage that is one check: types, lint, layers.
 * @param {number} code exit code of the program
 * @returns {Counts}
 */
export function countsOfProgram(code) {
  return code === 0 ? { passed: 1, failed: 0, remarks: [] } : { passed: 0, failed: 1, remarks: [] };
}

/**
 * Reads vitest's JSON report. A test that was not run (skipped, to do, left out by a focused one) counts as failed:
 * nobody would notice it otherwise.
 * @param {string} reportFile
 * @param {number} code
 * @returns {Counts}
 */
export function countsOfVitest(reportFile, code) {
  if (!existsSync(reportFile)) return neverRan("vitest wrote no report");
  const report = JSON.parse(readFileSync(reportFile, "utf8"));
  const notRun = report.numPendingTests + report.numTodoTests;
  const brokenFiles = report.testResults.filter(
    (/** @type {{ status: string, assertionResults: { status: string }[] }} */ file) =>
      file.status === "failed" && !file.assertionResults.some((test) => test.status === "failed"),
  ).length;
  const counts = {
    passed: report.numPassedTests,
    failed: report.numFailedTests + notRun + brokenFiles,
    remarks: [
      ...(notRun > 0 ? [`${notRun} skipped, unfinished or pushed aside by a focused test: counted as failed`] : []),
      ...(brokenFiles > 0 ? [`${brokenFiles} test files could not be loaded`] : []),
    ],
  };
  return settled(counts, code);
}

/**
 * Reads Playwright's JSON report; a skipped test and one that passed only when repeated count as failed.
 * @param {string} reportFile
 * @param {number} code
 * @returns {Counts}
 */
export function countsOfPlaywright(reportFile, code) {
  if (!existsSync(reportFile)) return neverRan("Playwright wrote no report");
  const { stats, errors } = JSON.parse(readFileSync(reportFile, "utf8"));
  const counts = {
    passed: stats.expected,
    failed: stats.unexpected + stats.skipped + stats.flaky + errors.length,
    remarks: stats.skipped > 0 ? [`${stats.skipped} skipped: counted as failed`] : [],
  };
  return settled(counts, code);
}

/**
 * A run that found nothing, or that went wrong outside a test, is no success.
 * @param {Counts} counts
 * @param {number} code
 * @returns {Counts}
 */
function settled(counts, code) {
  if (counts.failed > 0) return counts;
  if (counts.passed === 0) return neverRan("no test was found");
  if (code === 0) return counts;
  return { ...counts, failed: 1, remarks: ["the run ended with an error outside its tests"] };
}

/**
 * @param {string} why
 * @returns {Counts}
 */
function neverRan(why) {
  return { passed: 0, failed: 1, remarks: [why] };
}
