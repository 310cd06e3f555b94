import { describe, expect, it } from "vitest";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { removePieces } from "@/features/mockup/model/commands/pieces.ts";
import { raiseLayer } from "@/features/mockup/model/commands/set-hold.ts";
import { documentOfDrag, labelOfDrag } from "@/features/mockup/model/drag.ts";
import { nextEditor, startEditor } from "@/features/mockup/model/editor.ts";
import { depthScaleFor } from "@/features/mockup/model/section-scale.ts";
import { chooseLayer } from "@/features/mockup/model/selection.ts";
import { barrel, emptyMockup, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const sign = addPlate(emptyMockup(), {
  shape: { kind: "circle", diameter: 200 },
  id: "disc",
  name: "Disc",
  stock: midnight,
  thickness: 5,
  hold: { kind: "standoff", hardware: barrel(19) },
  site: inside,
});

describe("the editor", () => {
  it("chooses what an edit says, lets go of what an edit took away, and has it back after undo", () => {
    let editor = startEditor(sign);
    editor = nextEditor(editor, { kind: "choose", selection: chooseLayer(sign, "B") });
    editor = nextEditor(editor, {
      kind: "edit",
      label: "Remove",
      change: (before) => removePieces(before, { pieceIds: ["disc"] }),
    });
    expect(editor.selection).toEqual({ layerKey: "B", pieceIds: [], holeId: null });
    editor = nextEditor(editor, { kind: "undo" });
    expect(editor.history.present).toBe(sign);
    editor = nextEditor(editor, { kind: "redo" });
    expect(editor.history.present.layers[0]?.pieces).toEqual([]);
  });

  it("is the same after what changes nothing", () => {
    const editor = startEditor(sign);
    expect(nextEditor(editor, { kind: "undo" })).toBe(editor);
    expect(nextEditor(editor, { kind: "edit", label: "None", change: (before) => before })).toBe(editor);
    expect(nextEditor(editor, { kind: "choose", selection: editor.selection })).toBe(editor);
  });
});

describe("a drag", () => {
  it("shows what letting go would do, for pieces, holes and raised layers", () => {
    const pieces = documentOfDrag(sign, { kind: "pieces", pieceIds: ["disc"], dx: 7, dy: 0, guides: [], measures: [] });
    expect(pieces.layers[0]?.pieces[0]?.placement.x).toBe(307);
    const hole = documentOfDrag(sign, { kind: "hole", holeId: "disc-h-1", x: 250, y: 151 });
    expect(hole.layers[0]?.hold).toMatchObject({ holes: [{ x: 250, y: 151 }, {}, {}, {}] });
    const raise = { kind: "raise" as const, key: "B", offset: 25, hardware: barrel(25) };
    expect(documentOfDrag(sign, raise)).toEqual(raiseLayer(sign, raise));
    expect(labelOfDrag(raise)).toBe("Raise B");
    expect(documentOfDrag(sign, null)).toBe(sign);
  });
});

describe("the section's depth", () => {
  const deep = (nominal: number) => ({ depth: { nominal, least: nominal, most: nominal } });
  it.each([
    // 300 px at 1 px a mm, of which 36 paper mm of 3.8 mm each are beside the depth: 163 mm are left.
    { depth: 50, gap: 5, scale: 2.5 },
    { depth: 20, gap: 0, scale: 8 },
    { depth: 900, gap: 100, scale: 0.1 },
  ])("of $depth mm and a gap of $gap mm is drawn $scale times as large as the height", ({ depth, gap, scale }) => {
    expect(depthScaleFor({ figures: deep(depth), gap }, { widthPx: 300, scale: 1, paperScale: 3.8 })).toBe(scale);
  });
});
