import { describe, expect, it } from "vitest";
import { labelRows } from "@/features/mockup/model/label-rows.ts";

const at = (...xs: number[]) => xs.map((x) => ({ x, width: 20 }));

describe("labels beside one another", () => {
  it("stand on one row as long as each has 4 px to the next", () => {
    expect(labelRows(at(0, 24, 48), 2)).toEqual([0, 0, 0]);
    expect(labelRows(at(0, 23.9), 2)).toEqual([0, 1]);
  });

  it("are left out where neither row has room", () => {
    expect(labelRows(at(0, 5, 10, 30), 2)).toEqual([0, 1, null, 0]);
  });

  it("go round the one that is said whatever else must go", () => {
    const [a, b, c] = at(0, 5, 10);
    if (!a || !b || !c) throw new Error("three labels");
    expect(labelRows([a, b, { ...c, first: true }], 2)).toEqual([1, null, 0]);
  });

  it("are none for none", () => {
    expect(labelRows([], 2)).toEqual([]);
  });
});
