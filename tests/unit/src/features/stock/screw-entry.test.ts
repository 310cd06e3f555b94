import { describe, expect, it } from "vitest";
import { blankScrew } from "@/features/stock/model/blank-entry.ts";
import { changeScrew } from "@/features/stock/model/screw-entry.ts";
import type { WrittenScrew } from "@/features/stock/model/written.ts";

const written = (...changes: Parameters<typeof changeScrew>[1][]) =>
  changes.reduce<WrittenScrew>((screw, change) => changeScrew(screw, change, "mm"), blankScrew);

describe("a screw that is being written", () => {
  it("gets shank and flat head from its number: No. 8 is 0.164 in with a head of 0.332 in (ASME B18.6.1)", () => {
    const screw = written({ gauge: 8 });
    expect(screw.diameter).toBeCloseTo(4.1656, 6);
    expect(screw.headDiameter).toBeCloseTo(8.4328, 6);
    expect(screw.headHeight).toBeCloseTo((8.4328 - 4.1656) / (2 * Math.tan((41 * Math.PI) / 180)), 6);
  });

  it("is named by number, length and head until it has a name of its own", () => {
    expect(written({ gauge: 8 }).name).toBe("");
    const screw = written({ gauge: 8 }, { length: 25 });
    expect(screw.name).toBe("No. 8 × 25, flat head");
    expect(changeScrew(screw, { head: "pan" }, "mm").name).toBe("No. 8 × 25, pan head");
    const own = changeScrew(screw, { name: "Brass, box 4" }, "mm");
    expect(changeScrew(own, { length: 32 }, "mm")).toMatchObject({ name: "Brass, box 4", length: 32 });
    expect(changeScrew(written({ diameter: 4 }), { length: 30 }, "mm").name).toBe("4 × 30, flat head");
    expect(changeScrew({ ...blankScrew, gauge: 6 }, { length: 15.875 }, "in").name).toBe("No. 6 × 5/8″, flat head");
  });

  it("keeps a head that the table does not have as it was measured", () => {
    const pan = written({ gauge: 8 }, { head: "pan" }, { headDiameter: 8, headHeight: 2.5 });
    expect(changeScrew(pan, { gauge: 10 }, "mm")).toMatchObject({ headDiameter: 8, headHeight: 2.5, diameter: 4.826 });
    expect(written({ headDiameter: 12 }, { gauge: 20 })).toMatchObject({ headDiameter: 12, headHeight: null });
  });

  it("loses the table's head with the number or the shape that it was of", () => {
    expect(written({ gauge: 8 }, { gauge: 20 })).toMatchObject({ headDiameter: null, headHeight: null });
    expect(written({ gauge: 8 }, { head: "round" })).toMatchObject({ headDiameter: null, gauge: 8 });
  });
});
