import { describe, expect, it } from "vitest";
import { rules } from "#shared/dry-fit/index.ts";
import { describeLimit, limitGroups, limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import { defaultLimits, limitsSchema } from "#shared/dry-fit/limits.ts";

const described = limitGroups.flatMap(({ limits }) => limits);

describe("the descriptions of the limits", () => {
  it("name each limit of the schema once, and no other", () => {
    const keys = described.map(({ key }) => key);
    expect(keys.toSorted()).toEqual(Object.keys(limitsSchema.shape).toSorted());
    expect(new Set(described.map(({ label }) => label)).size).toBe(keys.length);
  });

  it.each(described)("say what $key is, between which figures, and why", ({ key, rules: of, label, why, ...limit }) => {
    expect(label.length).toBeGreaterThan(5);
    expect(label.length).toBeLessThanOrEqual(60);
    expect(why).toMatch(/\.$/);
    expect(of.length).toBeGreaterThan(0);
    for (const rule of of) expect(rule >= 1 && rule <= 39).toBe(true);
    expect(limit.usual).toBe(defaultLimits[key]);
    expect(limit.least).toBeLessThanOrEqual(limit.usual);
    expect(limit.usual).toBeLessThanOrEqual(limit.most);
    expect(Number.isFinite(limit.least) && Number.isFinite(limit.most)).toBe(true);
  });

  it.each(limitKeys)("give the very bounds that the schema takes for %s", (key) => {
    const { least, most } = describeLimit(key);
    const takes = (value: number) => limitsSchema.safeParse({ [key]: value }).success;
    expect(takes(most)).toBe(true);
    expect(takes(most + 1e-6)).toBe(false);
    expect(takes(least - 1e-6)).toBe(false);
    expect(takes(least) || takes(least + 1e-6) || takes(least + 1)).toBe(true);
  });

  it("leave no group empty, and gather a group's rules in order", () => {
    expect(limitGroups.every(({ limits }) => limits.length > 0)).toBe(true);
    expect(limitGroups.find(({ id }) => id === "movement")?.rules).toEqual([6, 16, 17, 35]);
    expect(limitGroups.find(({ id }) => id === "support")).toMatchObject({
      title: "Support under bonded pieces",
      rules: [1],
    });
  });

  it("tell for each rule that keeps to a limit which one it is", () => {
    const numbers = new Set(rules.map(({ number }) => number));
    for (const rule of [1, 3, 6, 7, 11, 21, 23, 31, 33]) {
      expect(numbers.has(rule)).toBe(true);
      expect(described.some((limit) => limit.rules.includes(rule))).toBe(true);
    }
  });
});
