import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { scheduleRows, scheduleTotal } from "#shared/drawing/schedule.ts";
import { drawScheduleTable } from "#shared/drawing/schedule-table.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

describe("the schedule", () => {
  it("lists the backer and the layers from the wall outward", () => {
    const document = orreryBooks();
    const rows = scheduleRows(document, computeFigures(document, kernel), "mm");
    expect(rows.map(({ key }) => key).join("")).toBe("ABCDEFG");
    // 600 × 400 × 20 mm of pine, 1000 · 0.35 · 1.09 = 381.5 kg/m³: 1.831 kg. The lightest layer weighs less than 10 g: three places.
    expect(rows[0]).toMatchObject({ thickness: "20", heldBy: "cleat", offset: "–", topAt: "20", mass: "1.831 kg" });
    // π 130² less four holes of 8 mm, 4.5 mm thick, 1190 kg/m³: 283 g.
    expect(rows[1]).toEqual({
      key: "B",
      what: "Night disc",
      stock: "Midnight, gloss",
      thickness: "4.5",
      heldBy: "4 standoffs, Standoff 15 × 19, brushed",
      offset: "19",
      topAt: "43.5",
      pieces: "1",
      mass: "0.283 kg",
    });
    expect(rows[2]?.heldBy).toBe("bond on B, Bodied acrylic cement");
    expect(rows[6]?.heldBy).toBe("bond on A, Thick cyanoacrylate");
  });

  it("gives all masses in one unit, with as many places as its lightest layer needs", () => {
    const document = orreryBooks();
    const figures = computeFigures(document, kernel);
    const light = {
      ...figures,
      layers: figures.layers.map((layer) => (layer.key === "G" ? { ...layer, massG: 3.6 } : layer)),
    };
    const masses = scheduleRows(document, light, "mm").map(({ mass }) => mass);
    expect([masses[0], masses[1], masses[6]]).toEqual(["1.831 kg", "0.283 kg", "0.004 kg"]);
  });

  it("says a layer that stands on nothing stands on nothing", () => {
    const document = orreryBooks();
    const lettering = document.layers[5];
    for (const piece of lettering?.pieces ?? []) piece.placement.y += 2000;
    const rows = scheduleRows(document, computeFigures(document, kernel), "mm");
    expect(rows[6]?.heldBy).toBe("bond on –, Thick cyanoacrylate");
  });

  it("sums up mass, depth and quantity", () => {
    const document = { ...orreryBooks(), quantity: 3 };
    expect(scheduleTotal(document, computeFigures(document, kernel), "mm")).toBe(
      "Mass about 2.20 kg without hardware. Stands 53.5 mm off the wall, 6 mm of gap behind it included. 3 signs.",
    );
  });
});

describe("the schedule's table", () => {
  const rows = Array.from({ length: 12 }, (_, index) => ({
    key: String.fromCharCode(65 + index),
    what: "Rings and planets of a long name that must be broken",
    stock: "Brass",
    thickness: "3",
    heldBy: "bond",
    offset: "–",
    topAt: "46.5",
    pieces: "8",
    mass: "0.05 kg",
  }));

  it("gives back the rows that don't fit, in order", () => {
    const { table, rest } = drawScheduleTable(rows, { widthMm: 190, heightMm: 60 });
    expect(table.heightMm).toBeLessThanOrEqual(60);
    expect(rest.length).toBeGreaterThan(0);
    expect(rest.at(-1)?.key).toBe("L");
    const whole = drawScheduleTable(rows, { widthMm: 190 });
    expect(whole.rest).toEqual([]);
  });

  it("always draws one row, or a set of sheets would never end", () => {
    expect(drawScheduleTable(rows, { widthMm: 190, heightMm: 1 }).rest).toHaveLength(11);
  });
});
