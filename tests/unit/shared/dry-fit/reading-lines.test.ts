import createClipper from "clipper2-wasm";
import { beforeAll, describe, expect, it } from "vitest";
import { letterHeightMm, lettersOf } from "#shared/dry-fit/lettering.ts";
import { linesOf } from "#shared/dry-fit/reading-lines.ts";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { layWords, type Setting } from "#shared/lettering/lay-words.ts";
import { lettersOnBoard } from "#shared/lettering/letters-on-board.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { addLettering } from "@/features/mockup/model/commands/add-lettering.ts";
import { mirrorPieces, movePieces, turnPieces } from "@/features/mockup/model/commands/pieces.ts";
import { openFaceOf } from "../../../support/open-faces.ts";
import { emptyMockup, epoxy, midnight } from "../../src/features/mockup/sample-mockup.ts";
import { inside } from "../../src/features/mockup/sites.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = clipperKernel(await createClipper());
});

const plain: Omit<Setting, "words"> = {
  capHeight: 30,
  letterSpacing: 0,
  kerning: true,
  lineSpacing: 48,
  align: "centre",
  along: { kind: "line" },
};

function withWords(
  document: MockupDocument,
  id: string,
  setting: Partial<Setting> & { words: string },
): MockupDocument {
  const whole = { ...plain, ...setting };
  const outcome = layWords(whole, openFaceOf("bitter-700"), kernel);
  if (!outcome.ok || !outcome.laid.box) throw new Error("Not laid.");
  const lettering = { ...whole, id, face: "bitter-700", fontSha256: "b".repeat(64) };
  return addLettering(document, {
    set: { lettering, letters: outcome.laid.letters, box: outcome.laid.box },
    id: `${id}-p`,
    into: {
      kind: "new",
      layer: { name: id, stock: midnight, thickness: 3, hold: { kind: "bond", adhesive: epoxy } },
      site: inside,
    },
  });
}
const board = () =>
  emptyMockup({ board: { outline: { kind: "rectangle" }, width: 900, height: 600, measures: "body" } });
const idsOf = (document: MockupDocument, id: string) => lettersOnBoard(document, id).map(({ piece }) => piece.id);
function linesRead(document: MockupDocument): string[] {
  const letters = lettersOf({ document, figures: computeFigures(document, kernel) });
  return linesOf(letters, document.lettering).map((line) => line.map(({ piece }) => piece.reads).join(""));
}

describe("words that were set", () => {
  it("are read with comma, hyphen and quotes on their line, though these lie low or high", () => {
    expect(linesRead(withWords(board(), "w", { words: "“Marlow, Pike-Co.”\nest. 1987" }))).toEqual([
      "“Marlow,Pike-Co.”",
      "est.1987",
    ]);
  });

  it.each([
    { side: "over" as const, words: "ORRERY BOOKS AND MAPS" },
    { side: "under" as const, words: "ORRERY BOOKS AND MAPS" },
    { side: "over" as const, words: "ORRERY\nBOOKS" },
  ])("are read along an arc, $side: $words", ({ side, words }) => {
    const document = withWords(board(), "w", { words, along: { kind: "arc", radius: 130, side } });
    expect(linesRead(document).join("")).toBe(words.replace(/\s/g, ""));
    expect(linesRead(document)).toHaveLength(words.split("\n").length);
  });

  it("are read round a badge from its crown to its bowl", () => {
    const over = withWords(board(), "top", { words: "ORRERY", along: { kind: "arc", radius: 150, side: "over" } });
    const both = withWords(over, "bottom", { words: "BOOKS", along: { kind: "arc", radius: 150, side: "under" } });
    const all = withWords(both, "middle", { words: "1987" });
    const up = movePieces(all, { pieceIds: idsOf(all, "top"), dx: 0, dy: -130 });
    const down = movePieces(up, { pieceIds: idsOf(up, "bottom"), dx: 0, dy: 130 });
    expect(linesRead(down)).toEqual(["ORRERY", "1987", "BOOKS"]);
  });

  it("are read in their own plane when they are turned or mirrored", () => {
    const document = withWords(board(), "w", { words: "PIKE, CO" });
    for (const by of [90, -90, 35, 180])
      expect(linesRead(turnPieces(document, { pieceIds: idsOf(document, "w"), by }))).toEqual(["PIKE,CO"]);
    expect(linesRead(mirrorPieces(document, { pieceIds: idsOf(document, "w"), way: "across" }))).toEqual(["PIKE,CO"]);
  });

  it("are read as they lie, not as they were set: a letter moved past another changes places with it", () => {
    for (const along of [{ kind: "line" as const }, { kind: "arc" as const, radius: 200, side: "over" as const }]) {
      const document = withWords(board(), "w", { words: "PIKE", along });
      const [p, i, k] = lettersOnBoard(document, "w").map(({ piece }) => piece);
      if (!p || !i || !k) throw new Error("No letters.");
      const dx = k.placement.x - i.placement.x + 12;
      expect(linesRead(movePieces(document, { pieceIds: [i.id], dx, dy: 0 }))).toEqual(["PKIE"]);
    }
  });

  it("are read together with letters that are no lettering, on one line", () => {
    const document = withWords(board(), "w", { words: "IKE" });
    const [first] = lettersOnBoard(document, "w");
    if (!first) throw new Error("No letters.");
    const drawn = {
      ...first.piece,
      id: "drawn",
      reads: "P",
      source: { kind: "plate" as const },
      placement: { ...first.piece.placement, x: first.piece.placement.x - 30 },
    };
    const layers = document.layers.map((layer) => ({ ...layer, pieces: [...layer.pieces, drawn] }));
    expect(linesRead({ ...document, layers })).toEqual(["PIKE"]);
  });
});

describe("the height that letters are read by", () => {
  it("is the capitals' whatever way the letters are turned: a W is no taller for being wide", () => {
    const document = withWords(board(), "w", { words: "WMW", along: { kind: "arc", radius: 90, side: "over" } });
    const letters = lettersOf({ document, figures: computeFigures(document, kernel) });
    expect(letterHeightMm(letters)?.heightMm).toBeCloseTo(30, 0);
    expect(letterHeightMm(letters)?.heightMm).toBeLessThan(31);
  });
});
