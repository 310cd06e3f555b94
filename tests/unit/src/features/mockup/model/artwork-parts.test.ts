import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  type ArtworkPart,
  type Destination,
  destinationsOf,
  joinAlike,
  sendPart,
  splitPart,
  startParts,
} from "@/features/mockup/model/artwork-parts.ts";

const suggested = (colour: string) => ({
  colour,
  pieces: 2,
  areaMm2: 100,
  sheet: 0,
  thickness: 3,
  deltaE: 0.4,
  match: "same" as const,
});
const colours = ["#27314F", "#C8992F", "#28324F", "#EEEEEE"];
const pieces = colours.flatMap((colour, at) => [0, 1, 2].map((step) => ({ index: at * 3 + step, colour })));
const parts = startParts(colours.map(suggested), pieces);
const send = (from: readonly ArtworkPart[], id: string, to: Destination) => sendPart(from, id, to);

describe("the parts of an artwork", () => {
  it("begin as a layer of each colour with all of its pieces", () => {
    const { made, added, out } = destinationsOf(parts);
    expect(made.map(({ part, indices }) => [part.id, indices])).toEqual([
      ["#27314F", [0, 1, 2]],
      ["#C8992F", [3, 4, 5]],
      ["#28324F", [6, 7, 8]],
      ["#EEEEEE", [9, 10, 11]],
    ]);
    expect({ added, out }).toEqual({ added: [], out: 0 });
  });

  it("are dropped, joined to one another and sent to a layer that is there", () => {
    let next = send(parts, "#EEEEEE", { kind: "out" });
    next = send(next, "#28324F", { kind: "with", part: "#27314F" });
    next = send(next, "#C8992F", { kind: "layer", key: "D" });
    const { made, added, out } = destinationsOf(next);
    expect(made.map(({ part, indices }) => [part.id, indices])).toEqual([["#27314F", [0, 1, 2, 6, 7, 8]]]);
    expect(added).toEqual([{ key: "D", indices: [3, 4, 5] }]);
    expect(out).toBe(3);
  });

  it("go with none that makes no layer, and stand alone again when theirs is dropped", () => {
    const joined = send(parts, "#28324F", { kind: "with", part: "#27314F" });
    expect(send(joined, "#EEEEEE", { kind: "with", part: "#28324F" })).toBe(joined);
    expect(send(joined, "#EEEEEE", { kind: "with", part: "#EEEEEE" })).toBe(joined);
    expect(send(joined, "#123456", { kind: "out" })).toBe(joined);
    const dropped = send(joined, "#27314F", { kind: "out" });
    expect(dropped.map(({ to }) => to.kind)).toEqual(["out", "new", "new", "new"]);
  });

  it("are split by pieces; the new part keeps what was chosen and goes its own way", () => {
    const split = splitPart(parts, "#C8992F", [4, 99]);
    expect(split.map(({ id, indices }) => [id, indices])).toEqual([
      ["#27314F", [0, 1, 2]],
      ["#C8992F", [3, 5]],
      ["#C8992F (2)", [4]],
      ["#28324F", [6, 7, 8]],
      ["#EEEEEE", [9, 10, 11]],
    ]);
    expect(splitPart(split, "#C8992F", [3]).map(({ id }) => id)).toContain("#C8992F (3)");
    expect(splitPart(parts, "#C8992F", [])).toBe(parts);
    expect(splitPart(parts, "#C8992F", [3, 4, 5])).toBe(parts);
  });

  // #27314F and #28324F are 0.4 apart by CIEDE2000; the other pairs of the four are over 40.
  it("that look the same are joined, and others are not", () => {
    expect(joinAlike(parts).map(({ to }) => to)).toEqual([
      { kind: "new" },
      { kind: "new" },
      { kind: "with", part: "#27314F" },
      { kind: "new" },
    ]);
    const dropped = send(parts, "#27314F", { kind: "out" });
    expect(joinAlike(dropped)).toBe(dropped);
    const split = splitPart(parts.slice(0, 2), "#27314F", [1]);
    expect(joinAlike(split)).toBe(split);
  });

  it("hold every piece exactly once, whatever is done to them", () => {
    const id = fc.constantFrom(...colours, "#C8992F (2)", "#27314F (2)");
    const step = fc.oneof(
      fc.record({
        id,
        to: fc.constantFrom<Destination>({ kind: "new" }, { kind: "out" }, { kind: "layer", key: "B" }),
      }),
      fc.record({ id, to: id.map((part): Destination => ({ kind: "with", part })) }),
      fc.record({ id, split: fc.subarray(pieces.map(({ index }) => index)) }),
    );
    fc.assert(
      fc.property(fc.array(step, { maxLength: 20 }), (steps) => {
        let next: readonly ArtworkPart[] = parts;
        for (const one of steps)
          next = "to" in one ? sendPart(next, one.id, one.to) : splitPart(next, one.id, one.split);
        const { made, added, out } = destinationsOf(next);
        const placed = [...made, ...added].flatMap(({ indices }) => indices);
        expect(new Set(placed).size).toBe(placed.length);
        expect(placed.length + out).toBe(pieces.length);
        expect(new Set(next.map((part) => part.id)).size).toBe(next.length);
      }),
      { seed: 41 },
    );
  });
});
