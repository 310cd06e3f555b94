import { expect, it } from "vitest";
import { woodSpecies } from "#shared/materials/wood-species.ts";
import { checkReference } from "../support/check-reference.ts";
import { referenceCsv } from "../support/reference-data.ts";

const source = "Wood Handbook GTR-190 / GTR-282, table 5-3";
/** The table's own names where ours, after the table of movements, are wider. */
const nameInTable: Readonly<Record<string, string>> = {
  "red oak, commercial": "northern red oak",
  "white oak, commercial": "white oak",
};
const rows = new Map(referenceCsv("fpl-specific-gravity.csv").map((row) => [row.species, row]));
const listed = woodSpecies.filter(({ species }) => rows.has(nameInTable[species] ?? species));

it("gravities at 12 % are the table's", () => {
  // The interior Douglas-firs and white fir are not in the extract at hand.
  expect(woodSpecies.length - listed.length).toBe(3);
  for (const { species, gravity, hardness } of listed) {
    const row = rows.get(nameInTable[species] ?? species);
    checkReference({ what: `gravity of ${species}`, source, expected: Number(row?.G_12), got: gravity, within: 1e-9 });
    expect(row?.class).toBe(hardness);
  }
});
