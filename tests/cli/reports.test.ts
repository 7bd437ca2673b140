import { expect, test } from "vitest";
import { countPlaywright, countVitest, settleCounts } from "@/lib/cli/reports.mjs";

// Shapes: vitest's JSON reporter (jest's format) and Playwright's JSONReport type, cut down to what is read.
const vitestFile = (name: string, status: string, tests: [string, string][], message = "") => ({
  name, status, message,
  assertionResults: tests.map(([fullName, result]) => ({ fullName, status: result, failureMessages: result === "failed" ? ["expected 1 to be 2"] : [] })),
});

test("vitest: counts tests, leaves the skipped out, and names what failed", () => {
  const counts = countVitest({ testResults: [
    vitestFile("a.test.ts", "failed", [["adds", "passed"], ["divides", "failed"], ["waits", "skipped"], ["comes later", "todo"]]),
    vitestFile("b.test.ts", "passed", [["reads", "passed"]]),
  ] });
  expect(counts).toEqual({ passed: 2, failed: 1, skipped: 2, problems: ["a.test.ts › divides\nexpected 1 to be 2"] });
});

test("vitest: a file that could not be loaded, or whose hook failed after its tests passed, counts as one failure", () => {
  const counts = countVitest({ testResults: [
    vitestFile("broken.test.ts", "failed", [], "Cannot find module"),
    vitestFile("hook.test.ts", "failed", [["reads", "passed"]], "afterAll failed"),
  ] });
  expect(counts).toEqual({ passed: 1, failed: 2, skipped: 0, problems: ["broken.test.ts\nCannot find module", "hook.test.ts\nafterAll failed"] });
});

const spec = (title: string, status: string, message?: string) =>
  ({ title, tests: [{ status, results: [{ errors: message ? [{ message }] : [] }] }] });

test("playwright: counts through nested suites; a flaky test passed and is named", () => {
  const counts = countPlaywright({
    suites: [{ title: "slice.spec.ts", specs: [spec("opens", "expected")], suites: [
      { title: "refusals", specs: [spec("wrong role", "unexpected", "\u001b[31mexpected 404\u001b[39m"), spec("two tabs", "flaky", "timed out"), spec("later", "skipped")] },
    ] }],
    errors: [],
  });
  expect(counts).toMatchObject({ passed: 2, failed: 1, skipped: 1 });
  expect(counts.problems).toEqual([
    "slice.spec.ts › refusals › wrong role\nexpected 404",
    "slice.spec.ts › refusals › two tabs passed only when tried again\ntimed out",
  ]);
});

test("playwright: an error outside of every test is a failure", () => {
  expect(countPlaywright({ suites: [], errors: [{ message: "No tests found" }] })).toMatchObject({ passed: 0, failed: 1 });
});

const counted = { passed: 3, failed: 0, skipped: 0, problems: [] };

test.each([
  ["no report", undefined, 1, { passed: 0, failed: 1 }],
  ["a report without a test", { ...counted, passed: 0 }, 0, { passed: 0, failed: 1 }],
  ["a bad exit code though every test passed", counted, 1, { passed: 3, failed: 1 }],
  ["a failure that the report already counts", { ...counted, failed: 2 }, 1, { passed: 3, failed: 2 }],
  ["all well", counted, 0, { passed: 3, failed: 0 }],
])("%s", (_, counts, exitCode, expected) => {
  expect(settleCounts(counts, exitCode, "the log")).toMatchObject(expected);
});
