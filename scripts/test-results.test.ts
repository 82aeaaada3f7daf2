import { expect, it } from "vitest";
import { countPlaywright, countRun, countsLine, countVitest, sum } from "./test-results.ts";

const vitest = {
  success: true,
  numPassedTests: 7,
  numFailedTests: 0,
  numPendingTests: 2,
  numTodoTests: 0,
  testResults: [],
};

it("counts vitest's tests", () => {
  expect(countVitest({ ...vitest, numFailedTests: 1 })).toEqual({ passed: 7, failed: 1, skipped: 2 });
});

it("counts a file that does not load as failed", () => {
  const testResults = [
    { status: "failed", assertionResults: [] },
    { status: "passed", assertionResults: [{}] },
  ];
  expect(countVitest({ ...vitest, testResults })).toEqual({ passed: 7, failed: 1, skipped: 2 });
});

it("counts Playwright's tests, and errors outside of them", () => {
  const stats = { expected: 5, unexpected: 1, flaky: 0, skipped: 3 };
  expect(countPlaywright({ stats, errors: [] })).toEqual({ passed: 5, failed: 1, skipped: 3 });
  expect(countPlaywright({ stats, errors: [{}] }).failed).toBe(2);
});

it("lets nothing pass that left no report or ended with an error", () => {
  const good = { passed: 3, failed: 0, skipped: 0 };
  expect(countRun(0, good)).toEqual(good);
  expect(countRun(1, null)).toEqual({ passed: 0, failed: 1, skipped: 0 });
  expect(countRun(0, null)).toEqual({ passed: 0, failed: 1, skipped: 0 });
  expect(countRun(1, good)).toEqual({ passed: 3, failed: 1, skipped: 0 });
  expect(countRun(1, { passed: 3, failed: 2, skipped: 0 }).failed).toBe(2);
});

it("says it in one line", () => {
  const all = sum([
    { passed: 3, failed: 0, skipped: 0 },
    { passed: 1, failed: 1, skipped: 0 },
  ]);
  expect(countsLine(all)).toBe("4 passed, 1 failed");
  expect(countsLine({ ...all, skipped: 2 })).toBe("4 passed, 1 failed, 2 skipped");
});
