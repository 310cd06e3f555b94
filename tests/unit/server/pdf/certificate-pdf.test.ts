import { describe, expect, it } from "vitest";
import { renderCertificate } from "#server/pdf/certificate-pdf.ts";
import { drawCertificate } from "#shared/drawing/certificate.ts";
import { boxIntersection } from "#shared/geometry/box.ts";
import { popplerText } from "../../../support/poppler.ts";
import { textBoxesOf } from "../../../support/text-boxes.ts";

const input = {
  shop: "Copperlark Signs",
  client: "Orrery Books",
  title: "Lobby sign, rings and planets",
  number: "CL-0142",
  revision: "B",
  typedName: "Tilda Marsh",
  signedInAs: "Ines Calloway, client@orrery.example",
  acknowledgements: ["I have checked the spelling of every word.", "I have checked sizes, colours and heights."],
  decidedAt: "2026-12-01 10:12:45 +01:00 (Europe/Berlin)",
  pdfSha256: "9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08",
  snapshotSha256: "60303ae22b998861bce3b28f33eec1be758a213c86c93c076dbe9f558c11c752",
  paper: "A4" as const,
  date: new Date("2026-12-01T09:12:45Z"),
};

describe("the certificate", () => {
  it("says who approved what, when, with what acknowledged, and names both files by their hashes", async () => {
    const text = (await popplerText(await renderCertificate(input), "pdftotext")).replace(/\s+/g, " ");
    for (const words of [
      "Certificate of approval",
      "Approval of CL-0142, revision B",
      "Approved by Tilda Marsh",
      "2026-12-01 10:12:45 +01:00 (Europe/Berlin)",
      "I have checked the spelling of every word.",
      "I have checked sizes, colours and heights.",
    ]) {
      expect(text).toContain(words);
    }
    const run = text.replaceAll(" ", "");
    expect(run).toContain(input.pdfSha256);
    expect(run).toContain(input.snapshotSha256);
  });

  it("stands on A4 and on Letter", async () => {
    expect(await popplerText(await renderCertificate(input), "pdfinfo")).toMatch(
      /Page size:\s+595\.276 x 841\.89 pts \(A4\)/,
    );
    const letter = await renderCertificate({ ...input, paper: "Letter" });
    expect(await popplerText(letter, "pdfinfo")).toMatch(/Page size:\s+612 x 792 pts \(letter\)/);
  });

  it("has the same bytes for the same decision", async () => {
    expect(await renderCertificate(input)).toEqual(await renderCertificate(input));
  });

  it("goes on over further sheets when much was acknowledged, with no line over another", () => {
    const acknowledgements = Array.from(
      { length: 60 },
      (_, index) => `Point ${index + 1}: ${"all words were read and ".repeat(5)}`,
    );
    const sheets = drawCertificate({ ...input, acknowledgements });
    expect(sheets.length).toBeGreaterThan(1);
    const texts = sheets.flatMap((sheet) => textBoxesOf(sheet).map(({ text }) => text));
    expect(texts.filter((text) => /^Point \d+:/.test(text))).toHaveLength(60);
    for (const sheet of sheets) {
      const boxes = textBoxesOf(sheet);
      for (const [index, { box, text }] of boxes.entries()) {
        for (const other of boxes.slice(index + 1)) {
          const shared = boxIntersection(box, other.box);
          expect(shared !== null && shared.width > 0.15 && shared.height > 0.15, `${text} | ${other.text}`).toBe(false);
        }
      }
    }
  });
});
