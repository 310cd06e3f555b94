import { readdirSync, readFileSync } from "node:fs";
import { expect, it } from "vitest";

const shared = new URL("../../../../shared/", import.meta.url);
const read = (path: string) => readFileSync(new URL(path, shared), "utf8");
const filesIn = (folder: string) => readdirSync(new URL(`${folder}/`, shared)).filter((name) => name.endsWith(".ts"));

const subjects = ["hardware", "plates", "bonds", "pieces", "legibility", "colour"];
/** Parts of calculations that are explained with the ones that use them. */
const parts = [
  "bonds/drying-hours-of-sign.ts",
  "bonds/surfaces.ts",
  "colour/finish-colour.ts",
  "hardware/check-hardware.ts",
  "hardware/driven-of.ts",
  "hardware/edge-places.ts",
  "hardware/nearest-place.ts",
  "hardware/over-panel.ts",
  "hardware/panel-hole.ts",
  "hardware/standoff-parts.ts",
  "legibility/accessible-limits.ts",
  "pieces/area-moments.ts",
  "pieces/name-of-part.ts",
  "pieces/outline-spread.ts",
  "pieces/reading-order.ts",
  "pieces/same-outline.ts",
  "pieces/template-islands.ts",
];

it("every calculation of a subject is explained, or is a part of one that is", () => {
  const explained = new Set(
    filesIn("calculations").flatMap((name) =>
      [...read(`calculations/${name}`).matchAll(/from "\.\.\/([^"]+)"/g)].map(([, path]) => path ?? ""),
    ),
  );
  const modules = subjects.flatMap((subject) => filesIn(subject).map((name) => `${subject}/${name}`));
  expect(modules.length).toBeGreaterThan(35);
  expect(modules.filter((path) => !explained.has(path)).toSorted()).toEqual(parts);
});
