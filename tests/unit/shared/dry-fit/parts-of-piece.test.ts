import { expect, it } from "vitest";
import { grip } from "#shared/dry-fit/rules/grip.ts";
import { smallPieces } from "#shared/dry-fit/rules/small-pieces.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { bondHold, buildLayer, buildPiece, buildSign, hole, standoffHold } from "../../../support/build-sign.ts";
import { findingsOf } from "../../../support/dry-fit.ts";

/** A letter as i: a stem of 20 by 60 mm with its middle at 200, 220, and over it a square dot of so many mm at 200, 170. */
const letter = (dot: number) =>
  buildPiece(
    "i",
    [
      ...rectanglePath({ x: -10, y: -30, width: 20, height: 60 }),
      ...rectanglePath({ x: -dot / 2, y: -50 - dot / 2, width: dot, height: dot }),
    ],
    { at: [200, 220], name: "Letter 1: i", reads: "i" },
  );

it.each([
  { dot: 5, count: 1 },
  { dot: 7.9, count: 1 },
  { dot: 8, count: 0 },
])("a letter whose dot is a square of $dot mm has $count small part", async ({ dot, count }) => {
  const sign = buildSign([buildLayer("B", [letter(dot)], { hold: bondHold })], { quantity: 3 });
  const findings = await findingsOf(smallPieces, sign);
  expect(findings).toHaveLength(count);
  if (count === 0) return;
  expect(findings).toMatchObject([{ severity: "remark", pieceIds: ["i"], value: 1 }]);
  expect(findings[0]?.where?.x).toBeCloseTo(200, 1);
  expect(findings[0]?.where?.y).toBeCloseTo(170, 1);
  expect(findings[0]?.text).toMatch(
    /^Letter 1: i \(B\) has a loose part [\d.]+ mm long, under 8 mm, .*3 in all for 3 signs\.$/,
  );
});

it.each([
  { holes: [hole("h1", 200, 220)], loose: 1 },
  { holes: [hole("h1", 200, 170)], loose: 1 },
  { holes: [hole("h1", 200, 220), hole("h2", 200, 170)], loose: 0 },
])("on standoffs at $holes.length places $loose of its parts hang on nothing", async ({ holes, loose }) => {
  const sign = buildSign([buildLayer("B", [letter(20)], { hold: standoffHold(holes) })]);
  const findings = (await findingsOf(grip, sign)).filter(({ text }) => text.includes("parts"));
  expect(findings).toHaveLength(loose);
  for (const finding of findings) {
    expect(finding).toMatchObject({ rule: 8, severity: "stop", pieceIds: ["i"], value: 1 });
    expect(finding.text).toBe(
      "Letter 1: i (B) is 2 parts, and one of them has no standoff: nothing holds it. Set a hole in each part, or bond the layer.",
    );
    expect(finding.where?.y).toBeCloseTo(holes[0]?.y === 220 ? 170 : 220, 0);
  }
});
