import { expect, it } from "vitest";
import { colourAgainstArtwork } from "#shared/dry-fit/rules/colour-against-artwork.ts";
import { standardAcrylics, standardStock } from "#shared/materials/standard-stock.ts";
import { buildLayer, buildSign, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const grey = { ...(standardAcrylics[0]?.acrylic ?? missing()), name: "Grey", colour: "#808080" };
function missing(): never {
  throw new Error("There is no acrylic.");
}
const drawn = (id: string, colour: string) =>
  plate(id, 20, 20, [100, 200], {
    source: { kind: "artwork", artworkId: "6f1d3a52-8f0e-4c0b-9a51-0d3c5c1b7a10", index: 0, colour },
  });
const sign = (...colours: string[]) =>
  buildSign([
    buildLayer(
      "B",
      colours.map((colour, index) => drawn(`p${index}`, colour)),
      { stock: grey },
    ),
  ]);

// Greys differ in lightness only: ΔE00 = ΔL / (1 + 0.015 (L − 50)² / √(20 + (L − 50)²)), L the mean of both (Sharma,
// Wu, Dalal 2005). From #808080:
// #858585 1.862, #868686 2.226, #8D8D8D 4.703, #8E8E8E 5.046.
it.each([
  { colour: "#808080", severity: null, deltaE: 0 },
  { colour: "#858585", severity: null, deltaE: 0 },
  { colour: "#868686", severity: "remark", deltaE: 2.226 },
  { colour: "#8D8D8D", severity: "remark", deltaE: 4.703 },
  { colour: "#8E8E8E", severity: "caution", deltaE: 5.046 },
])("grey stock for artwork of $colour: $severity", async ({ colour, severity, deltaE }) => {
  const findings = await findingsOf(colourAgainstArtwork, sign(colour));
  expect(findings.map((finding) => finding.severity)).toEqual(severity ? [severity] : []);
  for (const { value } of findings) expect(Math.abs((value ?? 0) - deltaE)).toBeLessThanOrEqual(0.006);
});

it("pieces of one colour are one finding, with a nearer stock where there is one", async () => {
  const findings = await findingsOf(colourAgainstArtwork, sign("#B4523B", "#808080", "#B4523B"));
  expect(findings).toMatchObject([{ rule: 23, severity: "caution", pieceIds: ["p0", "p2"], unit: "ΔE00", limit: 5 }]);
  expect(findings[0]?.text).toContain("Rust comes nearer (0.0).");
  // The sheet's lettering has no Greek: a delta would be an empty box on the client's proof.
  expect(findings[0]?.text).not.toMatch(/\p{Script=Greek}/u);
});

it("offers none when nothing on hand comes nearer", async () => {
  const [finding] = await findingsOf(colourAgainstArtwork, sign("#8E8E8E"), {
    context: { stock: { ...standardStock, acrylics: [{ acrylic: grey, thicknessesMm: [3], sheets: [] }] } },
  });
  expect(finding?.text).not.toContain("comes nearer");
});

it("a plate has no artwork to differ from", async () => {
  expect(
    await findingsOf(colourAgainstArtwork, buildSign([buildLayer("B", [plate("p", 20, 20, [100, 200])])])),
  ).toEqual([]);
});

it.each([
  { colour: "#B4523B", labels: [["Take Rust (CIEDE2000 0.0)"]] },
  { colour: "#4C7A3F", labels: [[expect.stringMatching(/^Take Fern/)]] },
  { colour: "#C8992F", labels: [["Take Brass (CIEDE2000 0.0)"]] },
  { colour: "#FF00FF", labels: [[]] },
])(
  "artwork of $colour is mended with the nearest sheet when that is near enough: $labels",
  async ({ colour, labels }) => {
    expect((await triedMends(colourAgainstArtwork, sign(colour))).labels).toEqual(labels);
  },
);

it("a sheet that looks otherwise is no mend, and one of another thickness brings it along", async () => {
  const thick = { ...sign("#D58C8C") };
  const layers = thick.layers.map((layer) => ({ ...layer, thickness: 6 }));
  const rose = standardStock.acrylics.filter(({ acrylic }) => acrylic.name === "Rose" || acrylic.look === "mirror");
  const options = { context: { stock: { ...standardStock, acrylics: rose } } };
  const { labels, mended } = await triedMends(colourAgainstArtwork, { ...thick, layers }, options);
  expect(labels).toEqual([["Take Rose (CIEDE2000 0.0)"]]);
  expect(mended[0]?.layers[0]).toMatchObject({ thickness: 4.5, stock: { name: "Rose" } });
});
