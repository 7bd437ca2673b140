import { readFileSync } from "node:fs";

/**
 * What a runner said about its tests. `skipped` counts neither way; `problems` are the failures, for people.
 * @typedef {{ passed: number, failed: number, skipped: number, problems: string[] }} Counts
 */

const MESSAGE_LINES = 14;
const COLOURS = new RegExp(`${String.fromCharCode(27)}\\[[0-9;]*m`, "g");
const short = (message = "") => message.replace(COLOURS, "").trim().split("\n").slice(0, MESSAGE_LINES).join("\n");

/**
 * A runner that gave no readable report, or that failed without naming a test, has failed once.
 * @param {Counts | undefined} counts
 * @param {number} exitCode
 * @param {string} lastLines  of the runner's log.
 * @returns {Counts}
 */
export function settleCounts(counts, exitCode, lastLines) {
  if (!counts) return { passed: 0, failed: 1, skipped: 0, problems: [`It made no report.\n${lastLines}`] };
  if (counts.passed + counts.failed === 0) return { ...counts, failed: 1, problems: [`It ran no test.\n${lastLines}`] };
  if (exitCode !== 0 && counts.failed === 0) return { ...counts, failed: 1, problems: [`It ended with code ${exitCode}.\n${lastLines}`] };
  return counts;
}

/**
 * Counts from vitest's JSON report. A file that could not even be loaded has no tests to fail and counts once.
 * @param {any} report
 * @returns {Counts}
 */
export function countVitest(report) {
  const counts = { passed: 0, failed: 0, skipped: 0, problems: [] };
  for (const file of report.testResults) {
    const failedBefore = counts.failed;
    for (const test of file.assertionResults) {
      if (test.status === "passed") counts.passed += 1;
      else if (test.status === "failed") {
        counts.failed += 1;
        counts.problems.push(`${file.name} › ${test.fullName}\n${short(test.failureMessages?.[0])}`);
      } else counts.skipped += 1;
    }
    if (file.status === "failed" && counts.failed === failedBefore) {
      counts.failed += 1;
      counts.problems.push(`${file.name}\n${short(file.message)}`);
    }
  }
  return counts;
}

/**
 * Counts from Playwright's JSON report. A test that passed only when tried again counts as passed and is named.
 * @param {any} report
 * @returns {Counts}
 */
export function countPlaywright(report) {
  const counts = { passed: 0, failed: 0, skipped: 0, problems: [] };
  const visit = (suite, path) => {
    for (const inner of suite.suites ?? []) visit(inner, [...path, inner.title]);
    for (const spec of suite.specs ?? []) {
      for (const test of spec.tests) {
        const name = [...path, spec.title].filter(Boolean).join(" › ");
        const message = short(test.results.flatMap((result) => result.errors ?? [])[0]?.message);
        if (test.status === "skipped") counts.skipped += 1;
        else if (test.status === "unexpected") {
          counts.failed += 1;
          counts.problems.push(`${name}\n${message}`);
        } else {
          counts.passed += 1;
          if (test.status === "flaky") counts.problems.push(`${name} passed only when tried again\n${message}`);
        }
      }
    }
  };
  for (const suite of report.suites ?? []) visit(suite, [suite.title]);
  for (const error of report.errors ?? []) {
    counts.failed += 1;
    counts.problems.push(short(error.message));
  }
  return counts;
}

/**
 * A runner's report, or undefined when there is none.
 * @param {string} path
 */
export function readReport(path) {
  try {
    return JSON.parse(readFileSync(path, "utf8"));
  } catch {
    return undefined;
  }
}
