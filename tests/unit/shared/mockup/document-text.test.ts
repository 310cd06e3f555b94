import { describe, expect, it } from "vitest";
import { documentSchema } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import { buildLayer, buildSign, plate } from "../../../support/build-sign.ts";

const signNamed = (name: string) => {
  const layer = buildLayer("B", [plate("p", 60, 40, [200, 200], { name, reads: name })]);
  return { ...buildSign([]), layers: [{ ...layer, name }] };
};

describe("text in a document", () => {
  it.each([
    { what: "a null and a line feed", written: "Outer\u0000\nring", kept: "Outer ring" },
    { what: "half a surrogate pair", written: "Ring \ud800", kept: "Ring" },
    { what: "an escape", written: "\u001b[31mRing\u009b", kept: "[31mRing" },
    { what: "a letter of two units and one of another script", written: " 𝔄 שלט ", kept: "𝔄 שלט" },
  ])("loses what no record and no drawing can hold: $what", ({ written, kept }) => {
    const read = readDocument(JSON.parse(JSON.stringify(signNamed(written))));
    if (!read.ok) throw new Error(read.reason);
    const [layer] = read.document.layers;
    expect([layer?.name, layer?.pieces[0]?.name, layer?.pieces[0]?.reads]).toEqual([kept, kept, kept]);
  });

  it("is still refused when nothing is left of a layer's name, or when it is too long", () => {
    expect(documentSchema.safeParse(signNamed("\u0000\u0000")).success).toBe(false);
    expect(documentSchema.safeParse(signNamed("x".repeat(121))).success).toBe(false);
  });

  it.each(["a\u0000", "\udfff", "a\nb"])("has no ids like %j", (id) => {
    const sign = buildSign([buildLayer("B", [plate("p", 60, 40, [200, 200])])]);
    const layers = sign.layers.map((layer) => ({ ...layer, pieces: layer.pieces.map((piece) => ({ ...piece, id })) }));
    const { error } = documentSchema.safeParse({ ...sign, layers });
    expect(error?.issues.map(({ path, message }) => [path.join("/"), message])).toEqual([
      ["layers/0/pieces/0/id", "An id has no control characters."],
    ]);
  });
});
