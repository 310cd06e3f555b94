import { describe, expect, it } from "vitest";
import { importBytes } from "#server/artwork/import-bytes.ts";
import { oarsSvg, orrerySvg, rackSvg } from "#server/db/demo/demo-artwork.ts";
import { type DemoArtwork, oarsSign, orrerySign, rackSign } from "#server/db/demo/demo-signs.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { dryFitOf } from "../../../support/dry-fit.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

async function artworkOf(svg: string): Promise<DemoArtwork> {
  const outcome = await importBytes(Buffer.from(svg));
  if (!outcome.ok) throw new Error(outcome.refusal.text);
  return { artworkId: "0190a3c4-0000-7000-8000-000000000001", pieces: outcome.artwork.pieces };
}

const signs: { name: string; build: () => Promise<MockupDocument> }[] = [
  { name: "orrery", build: async () => orrerySign(await artworkOf(orrerySvg), { ringThickness: 4.5 }) },
  { name: "oars", build: async () => oarsSign(await artworkOf(oarsSvg), { width: 560 }) },
  { name: "rack", build: async () => rackSign(await artworkOf(rackSvg)) },
  { name: "orrery of the drawing tests", build: async () => orreryBooks() },
];

/** Rules of bonds, pockets, gaps and pieces; what else they ask for is care. */
const ofPieces = [2, 3, 4, 17, 18, 19, 20, 28, 29, 30];

/** Rules of standoffs and of what they stand on. */
const ofHardware = [6, 7, 8, 9, 10, 12, 13, 14, 16];

describe("the signs that people see first", () => {
  it.each(signs)("$name: nothing stops it, and nothing is wrong with its standoffs", async ({ build }) => {
    const document = documentSchema.parse(await build());
    const findings = await dryFitOf(document);
    expect(findings.filter(({ severity }) => severity === "stop")).toEqual([]);
    expect(findings.filter(({ rule }) => ofHardware.includes(rule))).toEqual([]);
  });

  it.each([
    { words: "ORRERY BOOKS", build: signs[0]?.build },
    { words: "RACK 4", build: signs[2]?.build },
  ])("reads $words, letter by letter", async ({ words, build }) => {
    const document = documentSchema.parse(await build?.());
    const findings = await dryFitOf(document, { context: { words } });
    expect(findings.filter(({ rule }) => rule === 26)).toEqual([]);
  });

  it.each(signs)(
    "$name: its bonds and pieces stop nothing, and nothing parts, lacks its place or is slit",
    async ({ build }) => {
      const findings = await dryFitOf(documentSchema.parse(await build()));
      expect(findings.filter(({ rule, severity }) => ofPieces.includes(rule) && severity === "stop")).toEqual([]);
      expect(findings.filter(({ rule }) => [4, 17, 20].includes(rule))).toEqual([]);
    },
  );
});
