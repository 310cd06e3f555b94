import { describe, expect, it } from "vitest";
import { inOnePlace } from "#shared/dry-fit/rules/in-one-place.ts";
import { buildLayer, buildSign, disc, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const found = (...layers: Parameters<typeof buildSign>[0]) => findingsOf(inOnePlace, buildSign(layers));

describe("two pieces of one layer", () => {
  it.each([
    { what: "apart", x: 160, count: 0 },
    { what: "that touch along an edge", x: 140, count: 0 },
    { what: "that lie over one another by a border's error", x: 139.9, count: 0 },
    { what: "that lie over one another by 0.2 mm", x: 139.8, count: 1 },
    { what: "one on the other", x: 100, count: 1 },
  ])("$what: $count", async ({ x, count }) => {
    const layer = buildLayer("B", [
      plate("a", 40, 40, [100, 100], { name: "Left" }),
      plate("b", 40, 40, [x, 100], { name: "Right" }),
    ]);
    expect(await found(layer)).toHaveLength(count);
  });

  it("are told once for a layer, with their names, the place, and what to do", async () => {
    const layer = buildLayer("B", [
      plate("a", 40, 40, [100, 100], { name: "Left" }),
      plate("b", 40, 40, [130, 100], { name: "Right" }),
      plate("c", 10, 10, [300, 300], { name: "Elsewhere" }),
    ]);
    const [finding, ...more] = await found(layer);
    expect(more).toEqual([]);
    expect(finding).toMatchObject({ rule: 39, severity: "stop", layerKey: "B", pieceIds: ["a", "b"], value: 2 });
    expect(finding?.text).toMatch(/^2 pieces of B.*Left.*Right.* at one height.*Join them/);
    expect(finding?.where?.x).toBeCloseTo(115, 6);
    expect(finding?.where?.y).toBeCloseTo(100, 6);
  });

  it("of two layers are no concern of this rule", async () => {
    const disc20 = (id: string) => disc(id, 20, [100, 100]);
    expect(await found(buildLayer("B", [disc20("a")]), buildLayer("C", [disc20("b")]))).toEqual([]);
  });

  it("may be a ring and what lies in its opening", async () => {
    const [outer, inner] = [disc("ring", 30, [100, 100]), disc("hole", 20, [0, 0])];
    const ring = { ...outer, path: [...outer.path, ...inner.path] };
    expect(await found(buildLayer("B", [ring, disc("sun", 20, [100, 100])]))).toEqual([]);
    expect(await found(buildLayer("B", [ring, disc("sun", 21, [100, 100])]))).toHaveLength(1);
  });
});
