import { expect, it } from "vitest";
import { dropOuts } from "#shared/dry-fit/rules/drop-outs.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import { buildLayer, buildPiece, buildSign, disc, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const ring = (id: string, outer: number, inner: number, at: [number, number]) =>
  buildPiece(id, [...circlePath({ x: 0, y: 0 }, outer), ...circlePath({ x: 0, y: 0 }, inner)], { at, name: id });

it("an opening leaves an island in the template", async () => {
  const sign = buildSign([buildLayer("B", [ring("O", 20, 12, [100, 200]), disc("dot", 5, [200, 200])])]);
  expect(await findingsOf(dropOuts, sign)).toMatchObject([
    {
      rule: 5,
      severity: "caution",
      layerKey: "B",
      pieceIds: ["O"],
      value: 1,
      text: "B, Layer B has 1 island in its template: at 100 | 200 mm. It falls out of the cut-out sheet: bridge it, or lay that place by hand.",
    },
  ]);
});

it("nothing falls out where no template is cut, or where nothing has an opening", async () => {
  const scored = buildLayer("B", [ring("O", 20, 12, [100, 200])], { locate: "scored line" });
  expect(await findingsOf(dropOuts, buildSign([scored]))).toEqual([]);
  expect(await findingsOf(dropOuts, buildSign([buildLayer("B", [plate("p", 20, 20, [100, 200])])]))).toEqual([]);
});

it("many islands are counted, the first places listed, each once", async () => {
  const at = [50, 100, 150, 200, 250, 300];
  const pieces = [...at.map((x) => ring(`O${x}`, 20, 12, [x, 200])), ring("around", 30, 25, [50, 200])];
  const [finding, ...others] = await findingsOf(dropOuts, buildSign([buildLayer("B", pieces)]));
  expect(others).toEqual([]);
  expect(finding).toMatchObject({ value: 7, pieceIds: pieces.map(({ id }) => id) });
  expect(finding?.text).toContain(
    "7 islands in its template: at 50 | 200 mm, 100 | 200 mm, 150 | 200 mm, 200 | 200 mm and 2 more places. They fall",
  );
});

it("an island of the piece itself falls out however its place is found; only the maker can mend that", async () => {
  const target = buildPiece(
    "target",
    [30, 20, 10].flatMap((radius) => [...circlePath({ x: 0, y: 0 }, radius)]),
    { at: [100, 200] },
  );
  const sign = buildSign([buildLayer("B", [target], { locate: "scored line" })]);
  const findings = await findingsOf(dropOuts, sign);
  expect(findings).toMatchObject([{ severity: "caution", value: 1, pieceIds: ["target"] }]);
  expect(findings[0]?.where?.x).toBeCloseTo(100, 3);
  expect((await triedMends(dropOuts, sign)).labels).toEqual([[]]);
});

const panel = (holes: Parameters<typeof standoffHold>[0]) =>
  buildSign([
    buildLayer("B", [ring("panel", 90, 50, [200, 200]), disc("middle", 40, [200, 200]), disc("free", 9, [350, 90])], {
      hold: standoffHold(holes),
      locate: "hole pattern",
    }),
  ]);

it("a piece in an opening of a panel hangs in the air, and can be left out", async () => {
  const sign = panel([hole("h1", 130, 200), hole("h2", 270, 200)]);
  expect(await findingsOf(dropOuts, sign)).toMatchObject([{ pieceIds: ["middle"], value: 1 }]);
  const { labels, mended } = await triedMends(dropOuts, sign);
  expect(labels).toEqual([["Leave out the 1 island"]]);
  expect(mended[0]?.layers[0]?.pieces.map(({ id }) => id)).toEqual(["panel", "free"]);
});

it("with a standoff of its own it is held", async () => {
  expect(await findingsOf(dropOuts, panel([hole("h1", 130, 200), hole("h2", 200, 200)]))).toEqual([]);
});
