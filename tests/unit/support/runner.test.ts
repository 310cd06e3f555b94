import { describe, expect, it } from "vitest";
import { quantile, summarise } from "../../support/benchmark.ts";
import { readOptions } from "../../support/runner/options.mjs";
import { countVitest, sumTallies } from "../../support/runner/tally.mjs";

const everything = ["unit", "client", "reference", "api", "db", "e2e"];

describe("the test runner's command line", () => {
  it.each([
    { args: [], expected: { types: true, lint: true, projects: everything, files: [], bench: false } },
    {
      args: ["--long"],
      expected: { types: true, lint: true, projects: [...everything, "long"], files: [], bench: false },
    },
    { args: ["unit", "lint"], expected: { types: false, lint: true, projects: ["unit"], files: [], bench: false } },
    { args: ["types"], expected: { types: true, lint: false, projects: [], files: [], bench: false } },
    { args: ["long"], expected: { types: false, lint: false, projects: ["long"], files: [], bench: false } },
    {
      args: ["tests/api/jobs.test.ts"],
      expected: { types: false, lint: false, projects: everything, files: ["tests/api/jobs.test.ts"], bench: false },
    },
    { args: ["--bench"], expected: { types: true, lint: true, projects: everything, files: [], bench: true } },
  ])("$args", ({ args, expected }) => {
    expect(readOptions(args)).toEqual(expected);
  });

  it("refuses what it does not know", () => {
    expect(() => readOptions(["unti"])).toThrow("Unknown: unti.");
  });
});

describe("the totals", () => {
  const loaded = { status: "passed", assertionResults: [{}] };
  const report = { numPassedTests: 7, numFailedTests: 0, testResults: [loaded] };

  it("counts tests", () => {
    expect(countVitest(report, 0)).toEqual({ passed: 7, failed: 0, remarks: [] });
    expect(countVitest({ ...report, numFailedTests: 2 }, 1)).toEqual({ passed: 7, failed: 2, remarks: [] });
  });

  it("counts a file that could not be loaded as a failure, beside those of its tests", () => {
    const testResults = [
      loaded,
      { status: "failed", assertionResults: [] },
      { status: "failed", assertionResults: [{}] },
    ];
    expect(countVitest({ numPassedTests: 7, numFailedTests: 1, testResults }, 1)).toMatchObject({
      passed: 7,
      failed: 2,
    });
  });

  it.each([
    { what: "no report", report: undefined, code: 134, passed: 0 },
    { what: "no test", report: { numPassedTests: 0, numFailedTests: 0, testResults: [] }, code: 0, passed: 0 },
    { what: "an error outside every test", report, code: 1, passed: 7 },
  ])("is never green after $what", ({ report: given, code, passed }) => {
    const tally = countVitest(given, code);
    expect([tally.passed, tally.failed]).toEqual([passed, 1]);
    expect(tally.remarks).toHaveLength(1);
  });

  it("adds up what the steps say", () => {
    const steps = [
      { passed: 1, failed: 0, remarks: [] },
      { passed: 0, failed: 1, remarks: ["Style failed."] },
      { passed: 40, failed: 2, remarks: [] },
    ];
    expect(sumTallies(steps)).toEqual({ passed: 41, failed: 3, remarks: ["Style failed."] });
  });
});

describe("the bench's figures", () => {
  // Nearest rank, common practice, no source.
  it.each([
    { values: [15, 20, 35, 40, 50], share: 0.05, value: 15 },
    { values: [50, 40, 35, 20, 15], share: 0.3, value: 20 },
    { values: [15, 20, 35, 40, 50], share: 0.4, value: 20 },
    { values: [15, 20, 35, 40, 50], share: 0.5, value: 35 },
    { values: [15, 20, 35, 40, 50], share: 1, value: 50 },
    { values: [3], share: 0, value: 3 },
  ])("the $share quantile of $values is $value", ({ values, share, value }) => {
    expect(quantile(values, share)).toBe(value);
  });

  it("sums up measured values and leaves their order alone", () => {
    const values = Object.freeze([9, 1, 4]);
    expect(summarise("x", "kB", values)).toEqual({ name: "x", unit: "kB", median: 4, p95: 9, min: 1, max: 9, runs: 3 });
  });

  it("has no quantile of nothing", () => {
    expect(() => quantile([], 0.5)).toThrow("at least one value");
  });
});
