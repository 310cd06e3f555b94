import { describe, expect, it } from "vitest";
import { woodMovements } from "#shared/materials/wood-movement.ts";
import { boardOfSpecies, speciesOfBoard, woodSpecies } from "#shared/materials/wood-species.ts";

describe("species of the Wood Handbook", () => {
  it("are those whose movement is known, each once", () => {
    expect(woodSpecies.map(({ species }) => species).sort()).toEqual(
      woodMovements.map(({ species }) => species).sort(),
    );
  });

  it("fill a board's figures by how it is sawn", () => {
    // Wood Handbook GTR-190: gravity from table 5-3, movement from table 13-5.
    expect(boardOfSpecies("black walnut", "flatsawn")).toMatchObject({ gravity: 0.55, movementPerPoint: 0.00274 });
    expect(boardOfSpecies("black walnut", "quartersawn")).toMatchObject({
      hardness: "hardwood",
      movementPerPoint: 0.0019,
    });
    expect(boardOfSpecies("cardboard", "flatsawn")).toBeNull();
  });

  it.each(
    woodSpecies.flatMap(({ species }) => (["flatsawn", "quartersawn"] as const).map((sawn) => ({ species, sawn }))),
  )("$species, $sawn, is known again by its figures", (board) => {
    const figures = boardOfSpecies(board.species, board.sawn);
    expect(figures && speciesOfBoard(figures)).toEqual(board);
  });

  it("are not guessed from figures of the shop's own", () => {
    expect(speciesOfBoard({ gravity: 0.55, movementPerPoint: 0.003 })).toBeNull();
  });
});
