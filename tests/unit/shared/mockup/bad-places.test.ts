import { describe, expect, it } from "vitest";
import { badPlaces } from "#shared/mockup/bad-places.ts";
import { documentSchema } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, disc, hole, plate } from "../../../support/build-sign.ts";

const start = { x: 0, y: 0 };
const line = { kind: "line", to: { x: 1, y: 2 } };
const cubic = { kind: "cubic", c1: start, c2: start, to: start };
const plain = plate("p", 60, 40, [200, 200]);
const signWith = (path: unknown) => ({ layers: [{ pieces: [{ ...plain, path }] }] });

describe("bad places of a document", () => {
  it("are none in a sign, with lines and with curves", () => {
    const sign = buildSign([buildLayer("B", [plate("p", 60, 40, [200, 200]), disc("d", 20, [300, 200])])]);
    expect(badPlaces(sign, 10)).toBe(0);
  });

  it.each([
    { what: "a number", segment: 0 },
    { what: "a line with a handle", segment: { ...line, c1: start } },
    { what: "a curve without one", segment: { kind: "cubic", to: start, c1: start } },
    { what: "another kind", segment: { ...line, kind: "arc" } },
    { what: "a field too many", segment: { ...line, z: 1 } },
    { what: "a point with a field too many", segment: { ...line, to: { ...start, z: 1 } } },
    { what: "a number as text", segment: { ...line, to: { x: "1", y: 1 } } },
    { what: "what lies too far", segment: { ...line, to: { x: 10_001, y: 1 } } },
  ])("are whatever the schema refuses as a segment: $what", ({ segment }) => {
    const sign = buildSign([buildLayer("B", [plate("p", 60, 40, [200, 200])])]);
    const path = [{ start, segments: [line, segment, cubic] }];
    const layers = sign.layers.map((layer) => ({ ...layer, pieces: layer.pieces.map((one) => ({ ...one, path })) }));
    expect(badPlaces({ ...sign, layers }, 10)).toBe(1);
    expect(documentSchema.safeParse({ ...sign, layers }).success).toBe(false);
  });

  it("are counted in rings and in the board's outline too, up to the most that is asked for", () => {
    expect(badPlaces(signWith([0, { start, segments: [line] }, { start: 1, segments: [] }, {}]), 10)).toBe(3);
    expect(badPlaces({ board: { outline: { kind: "path", path: [{ start, segments: [1, 2] }] } } }, 10)).toBe(2);
    expect(badPlaces(signWith([{ start, segments: [1, 2, 3, 4, 5] }]), 3)).toBe(3);
  });

  it("are pieces that lack what every piece has", () => {
    const { reads, ...silent } = plain;
    const pieces = [0, {}, silent, { ...plain, id: 1 }, { ...plain, placement: { x: 1, y: 1 } }, { ...plain, reads }];
    expect(badPlaces({ layers: [{ pieces }] }, 10)).toBe(5);
    expect(
      badPlaces(
        {
          layers: [
            {
              pieces: [
                { ...plain, extra: 1 },
                { ...plain, source: { kind: "x" } },
              ],
            },
          ],
        },
        10,
      ),
    ).toBe(2);
    expect(badPlaces({ layers: [{ pieces }] }, 4)).toBe(4);
  });

  it("are holes that lack what every hole has", () => {
    const good = hole("h", 10, 10);
    const holes = [{}, good, { ...good, id: "" }, { ...good, x: "1" }, { ...good, extra: 1 }];
    expect(badPlaces({ layers: [{ hold: { kind: "standoff", holes } }] }, 10)).toBe(4);
  });

  it.each([null, 1, "x", [], { layers: 1 }, { layers: [null, { pieces: {} }, {}] }, { board: null }])(
    "are none in what has no pieces at all: %j",
    (document) => expect(badPlaces(document, 10)).toBe(0),
  );
});
