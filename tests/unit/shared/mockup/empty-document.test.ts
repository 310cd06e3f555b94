import { expect, it } from "vitest";
import { standardWoods } from "#shared/materials/standard-stock.ts";
import { documentSchema } from "#shared/mockup/document.ts";
import { emptyDocument } from "#shared/mockup/empty-document.ts";

it.each(standardWoods.map(({ wood }) => wood))("an empty board of $name is a valid document", (backer) => {
  const document = emptyDocument({ backer });
  expect(documentSchema.parse(document)).toEqual(document);
  expect(document).toMatchObject({ board: { width: 600, height: 400 }, backer: { thickness: 18 }, layers: [] });
});

it("takes size, thickness, quantity, distance and wall from the brief", () => {
  const [stock] = standardWoods;
  if (!stock) throw new Error("There is no wood.");
  const document = emptyDocument({
    backer: stock.wood,
    widthMm: 800,
    heightMm: 300,
    thicknessMm: 25,
    quantity: 2,
    viewingDistanceMm: 6000,
    wall: "#112233",
  });
  expect(document).toMatchObject({
    board: { width: 800, height: 300 },
    backer: { thickness: 25 },
    quantity: 2,
    presentation: { viewingDistance: 6000, wall: "#112233" },
  });
});
