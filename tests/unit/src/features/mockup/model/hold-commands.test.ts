import { describe, expect, it } from "vitest";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { bondLayer, letInLayer, setPocket, setTack, standLayer } from "@/features/mockup/model/commands/set-hold.ts";
import { setLayer } from "@/features/mockup/model/commands/set-layer.ts";
import { setReads, spreadWords } from "@/features/mockup/model/commands/set-reads.ts";
import { barrel, cement, emptyMockup, epoxy, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const disc = (): MockupDocument =>
  addPlate(emptyMockup(), {
    shape: { kind: "circle", diameter: 120 },
    site: inside,
    id: "disc",
    name: "Disc",
    stock: midnight,
    thickness: 4.5,
    hold: { kind: "bond", adhesive: epoxy },
  });
const holdOf = (document: MockupDocument) => document.layers[0]?.hold;
const valid = (document: MockupDocument) => documentSchema.safeParse(document).success;

describe("letting a layer in", () => {
  const letIn = letInLayer(disc(), { key: "B", adhesive: epoxy });

  it("begins with half its thickness and a tenth of clearance, and is found by its pocket", () => {
    expect(letIn.layers[0]).toMatchObject({
      locate: "pocket",
      hold: { kind: "pocket", depth: 2.5, clearance: 0.1, cut: "engraved", bitRadius: 0 },
    });
    expect(valid(letIn)).toBe(true);
  });

  it("keeps the pocket when only the adhesive changes, and the very document when nothing does", () => {
    const deeper = setPocket(letIn, { key: "B", depth: 3 });
    const other = letInLayer(deeper, { key: "B", adhesive: cement });
    expect(holdOf(other)).toMatchObject({ depth: 3, adhesive: cement });
    expect(letInLayer(other, { key: "B", adhesive: cement })).toBe(other);
  });

  it.each([
    { fields: { depth: 3.2 }, shows: { depth: 3.2 } },
    { fields: { depth: 0 }, shows: { depth: 2.5 } },
    { fields: { depth: Number.NaN }, shows: { depth: 2.5 } },
    { fields: { clearance: 0 }, shows: { clearance: 0 } },
    { fields: { clearance: -1 }, shows: { clearance: 0.1 } },
    { fields: { clearance: Number.NaN }, shows: { clearance: 0.1 } },
    { fields: { cut: "routed" as const, bitRadius: 1.5 }, shows: { cut: "routed", bitRadius: 1.5 } },
    { fields: { bitRadius: 26 }, shows: { bitRadius: 0 } },
  ])("takes what a document can hold: $fields", ({ fields, shows }) => {
    const after = setPocket(letIn, { key: "B", ...fields });
    expect(holdOf(after)).toMatchObject(shows);
    expect(valid(after)).toBe(true);
  });

  it("goes back to a bond that no longer finds its place by a pocket", () => {
    expect(bondLayer(letIn, { key: "B", adhesive: epoxy }).layers[0]).toMatchObject({
      locate: "none",
      hold: { kind: "bond" },
    });
  });

  it("is nothing to a layer that is held otherwise", () => {
    const stood = standLayer(disc(), { key: "B", hardware: barrel(19), id: "h", site: inside });
    expect(setPocket(stood, { key: "B", depth: 1 })).toBe(stood);
    expect(setTack(stood, { key: "B", tack: cement })).toBe(stood);
  });
});

it("a joint in two steps is one until its first step is taken out", () => {
  const tacked = setTack(disc(), { key: "B", tack: cement });
  expect(holdOf(tacked)).toMatchObject({ tack: cement, adhesive: epoxy });
  expect(holdOf(setTack(tacked, { key: "B", tack: null }))).toMatchObject({ tack: null });
});

it("the film is marked", () => {
  expect(setLayer(disc(), { key: "B", marked: "back" }).layers[0]?.marked).toBe("back");
});

describe("what pieces read", () => {
  it("is set by their ids, and cut to what a document takes", () => {
    const document = disc();
    const after = setReads(document, new Map([["disc", `  ${"O".repeat(200)}`]]));
    expect(after.layers[0]?.pieces[0]?.reads).toBe("O".repeat(120));
    expect(valid(after)).toBe(true);
    expect(setReads(document, new Map([["gone", "O"]]))).toBe(document);
  });

  it("is spread letter by letter where there are as many", () => {
    expect(spreadWords(["a", "b", "c"], " O K! ")).toEqual(
      new Map([
        ["a", "O"],
        ["b", "K"],
        ["c", "!"],
      ]),
    );
    expect(spreadWords(["a"], "Cafe\u0301"[0] ?? "")).toEqual(new Map([["a", "C"]]));
    expect(spreadWords(["a", "b"], "O")).toBeNull();
  });
});
