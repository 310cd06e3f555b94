import { describe, expect, it } from "vitest";
import { importBytes } from "#server/artwork/import-bytes.ts";
import { orrerySvg } from "#server/db/demo/demo-artwork.ts";
import { orrerySign } from "#server/db/demo/demo-signs.ts";
import { renderProof } from "#server/pdf/proof.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { orrerySnapshot } from "../../../support/orrery-snapshot.ts";
import { everyLook } from "../../../support/slat-signs.ts";

/** What goes through any mailbox. Our choice. */
const mostBytes = 2_000_000;

async function demoSign(): Promise<MockupDocument> {
  const outcome = await importBytes(Buffer.from(orrerySvg));
  if (!outcome.ok) throw new Error(outcome.refusal.text);
  const artworkId = "0190a3c4-0000-7000-8000-000000000001";
  return orrerySign({ artworkId, pieces: outcome.artwork.pieces }, { ringThickness: 4.5 });
}

describe("a proof", () => {
  it.each([
    { name: "the demo's sign on slats", build: demoSign },
    { name: "a framed sign of every look", build: async () => everyLook() },
  ])(
    "of $name is smaller than 2 MB",
    async ({ build }) => {
      const document = await build();
      expect(document.backer.slats).not.toBeNull();
      const pdf = await renderProof(await orrerySnapshot("A3", document), "0".repeat(64));
      expect(pdf.length).toBeLessThan(mostBytes);
      // Grain and shadows are in it.
      expect(pdf.length).toBeGreaterThan(100_000);
    },
    60_000,
  );
});
