import { describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Picture } from "#shared/tracing/picture.ts";
import { firstChoices, type TraceChoices } from "#shared/tracing/trace-choices.ts";
import { tracePicture } from "#shared/tracing/trace-picture.ts";
import type { TracedPicture } from "#shared/tracing/traced-picture.ts";
import { paintedPicture } from "../../../support/pictures.ts";

const clear = "#00000000";
const trace = (picture: Picture, choices: Partial<TraceChoices> = {}, lossy = false): TracedPicture =>
  tracePicture({ picture, lossy, density: { x: 10, y: 10 }, warnings: new Set() }, { ...firstChoices, ...choices });
const summary = ({ artwork }: TracedPicture) => artwork.colours.map(({ colour, pieces }) => [colour, pieces]);
const codes = ({ artwork }: TracedPicture) => artwork.warnings.map(({ code }) => code);
const within = (x: number, y: number, cx: number, cy: number, r: number) => Math.hypot(x - cx, y - cy) < r;

/** 400 × 300 px at 10 px/mm: a disc of 8 mm radius in gold on an ink square of 24 mm, on nothing. */
const discOnSquare = paintedPicture(400, 300, (x, y) => {
  if (within(x, y, 200, 150, 80)) return "#C8992F";
  return Math.abs(x - 200) < 120 && Math.abs(y - 150) < 120 ? "#27314F" : clear;
});

describe("a disc on a square", () => {
  const traced = trace(discOnSquare);

  it("becomes two pieces of the colours it was drawn in, with no third one at the seam", () => {
    expect(summary(traced)).toEqual([
      ["#27314F", 1],
      ["#C8992F", 1],
    ]);
    expect(traced.artwork).toMatchObject({ widthMm: 40, heightMm: 30 });
  });

  it("keeps the disc's area within 0.5 % of πr², the square's around it, and few nodes", () => {
    const [square, disc] = traced.artwork.pieces;
    expect(Math.abs((disc?.areaMm2 ?? 0) / (Math.PI * 64) - 1)).toBeLessThan(0.005);
    expect(Math.abs((square?.areaMm2 ?? 0) / (576 - Math.PI * 64) - 1)).toBeLessThan(0.005);
    expect(traced.record.nodes).toBeLessThan(40);
    expect(traced.record.smallestMm2).toBe(disc?.areaMm2);
  });

  it("keeps the square's corners: 90° where they were drawn, within a twentieth of a pixel", () => {
    const outer = traced.artwork.pieces[0]?.path[0];
    const corners = [outer?.start, ...(outer?.segments.map(({ to }) => to) ?? [])];
    for (const corner of [
      { x: 8, y: 3 },
      { x: 32, y: 3 },
      { x: 32, y: 27 },
      { x: 8, y: 27 },
    ]) {
      const off = Math.min(...corners.map((at) => Math.hypot((at?.x ?? 0) - corner.x, (at?.y ?? 0) - corner.y)));
      expect(off).toBeLessThan(0.005);
    }
    expect(outer?.segments.every(({ kind }) => kind === "line")).toBe(true);
  });

  it("lets neighbours share their border: what lies in both, and between them, has no area", async () => {
    const kernel = await loadKernel();
    const [square, disc] = traced.artwork.pieces.map(({ path }) => kernel.union(flattenPath(path, 0.002), "evenodd"));
    expect(regionAreaMm2(kernel.intersect(square ?? [], disc ?? []))).toBeLessThan(0.001);
    const both = kernel.union([...(square ?? []), ...(disc ?? [])], "evenodd");
    expect(regionAreaMm2(both)).toBeCloseTo(576, 1);
  });

  it("gives the same pieces every time", () => {
    expect(trace(discOnSquare)).toEqual(traced);
  });
});

describe("what a maker chooses", () => {
  const three = paintedPicture(300, 200, (x, y) => {
    if (within(x, y, 90, 100, 50)) return "#B3261E";
    if (within(x, y, 210, 100, 50)) return within(x, y, 210, 100, 20) ? "#FFFFFF" : "#8E1B15";
    return "#FFFFFF";
  });

  it("takes the white that fills the rim for paper, and says so", () => {
    const traced = trace(three);
    expect(summary(traced)).toEqual([
      ["#B3261E", 1],
      ["#8E1B15", 1],
    ]);
    expect(codes(traced)).toContain("picture.paper-dropped");
    expect(traced.record.found.map(({ colour, fillsRim, became }) => [colour, fillsRim, became])).toEqual([
      ["#FFFFFF", true, "dropped"],
      ["#B3261E", false, "pieces"],
      ["#8E1B15", false, "pieces"],
    ]);
  });

  it("keeps the paper, or only what of it is enclosed, when asked", () => {
    expect(summary(trace(three, { background: "kept" }))).toEqual([
      ["#FFFFFF", 2],
      ["#B3261E", 1],
      ["#8E1B15", 1],
    ]);
    const around = trace(three, { background: "around" });
    expect(summary(around)).toContainEqual(["#FFFFFF", 1]);
    const inner = around.artwork.pieces.find(({ colour }) => colour === "#FFFFFF");
    expect(Math.abs((inner?.areaMm2 ?? 0) / (Math.PI * 4) - 1)).toBeLessThan(0.02);
    const ring = around.artwork.pieces.find(({ colour }) => colour === "#8E1B15");
    expect(Math.abs((ring?.areaMm2 ?? 0) / (Math.PI * 21) - 1)).toBeLessThan(0.005);
  });

  it("joins and drops colours by their names", () => {
    const joined = trace(three, { joined: [{ from: "#8E1B15", into: "#B3261E" }] });
    expect(summary(joined)).toEqual([["#B3261E", 2]]);
    expect(joined.record.found.map(({ became }) => became)).toEqual(["dropped", "pieces", "joined"]);
    expect(summary(trace(three, { dropped: ["#B3261E"] }))).toEqual([["#8E1B15", 1]]);
  });

  it("takes as few colours as asked, the smallest differences first", () => {
    expect(summary(trace(three, { colours: 2 }))).toEqual([["#B3261E", 2]]);
  });

  it.each([
    { speckle: 12, pieces: 1 },
    { speckle: 0, pieces: 2 },
  ])(
    "gives a speck of one pixel to what lies around it: smallest area $speckle px, $pieces pieces",
    ({ speckle, pieces }) => {
      const speck = paintedPicture(120, 120, (x, y) => {
        if (Math.floor(x) === 100 && Math.floor(y) === 20) return "#27314F";
        return within(x, y, 50, 60, 30) ? "#27314F" : clear;
      });
      expect(trace(speck, { speckle }).artwork.pieces).toHaveLength(pieces);
    },
  );

  it("smooths more with fewer nodes", () => {
    const waves = paintedPicture(400, 200, (x, y) =>
      y > 100 + Math.sin(x / 3) && y < 180 && x > 20 && x < 380 ? "#27314F" : clear,
    );
    const nodes = (["close", "usual", "smooth", "smoothest"] as const).map(
      (smoothing) => trace(waves, { smoothing }).record.nodes,
    );
    expect(nodes.at(-1)).toBeLessThan((nodes[0] ?? 0) / 2);
  });

  it("refuses in words what leaves nothing", () => {
    expect(() => trace(three, { dropped: ["#B3261E", "#8E1B15"] })).toThrow(/Nothing of the picture is left to cut/);
    expect(() => trace(paintedPicture(40, 40, () => clear))).toThrow(/Nothing of the picture is left to cut/);
  });
});

describe("odd pictures", () => {
  it("warns of a gradient", () => {
    const gradient = paintedPicture(300, 60, (x) => {
      const shade = Math.round((x / 300) * 200)
        .toString(16)
        .padStart(2, "0");
      return `#${shade}${shade}ff`;
    });
    expect(codes(trace(gradient))).toContain("picture.shades");
    expect(codes(trace(discOnSquare))).not.toContain("picture.shades");
  });

  it("keeps a stroke that has no flat pixel", () => {
    const stroke = paintedPicture(200, 200, (x, y) =>
      Math.abs(x - y) < 1.3 && x > 20 && x < 180 ? "#0A6E4A" : "#F1EDE2",
    );
    const traced = trace(stroke, { background: "everywhere" });
    expect(summary(traced)).toHaveLength(1);
    // 2.6 px across both axes along 160 px of x.
    expect(Math.abs((traced.artwork.pieces[0]?.areaMm2 ?? 0) / 4.16 - 1)).toBeLessThan(0.1);
  });

  it("keeps a hole in a piece, and a piece in the hole", () => {
    const target = paintedPicture(200, 200, (x, y) => {
      const r = Math.hypot(x - 100, y - 100);
      return r < 30 || (r > 50 && r < 80) ? "#27314F" : clear;
    });
    const { pieces } = trace(target).artwork;
    expect(pieces.map(({ path }) => path.length)).toEqual([2, 1]);
    expect(pieces[0]?.areaMm2).toBeCloseTo(Math.PI * 39, 0);
  });

  it("covers the whole picture when all of it is colour, rim and meeting points included", () => {
    const quarters = paintedPicture(400, 320, (x, y) =>
      x < 189.3 ? (y < 126.6 ? "#27314F" : "#B3261E") : y < 126.6 ? "#C8992F" : "#3F7D5C",
    );
    const { pieces } = trace(quarters).artwork;
    expect(pieces).toHaveLength(4);
    expect(pieces.reduce((sum, { areaMm2 }) => sum + areaMm2, 0)).toBeCloseTo(1280, 2);
    expect(pieces.find(({ colour }) => colour === "#27314F")?.box).toMatchObject({ x: 0, y: 0 });
    expect(pieces.find(({ colour }) => colour === "#27314F")?.areaMm2).toBeCloseTo(18.93 * 12.66, 0);
  });

  it("scales a large one down first, and says so", () => {
    const data = new Uint8Array(2400 * 40 * 4).fill(0);
    for (let pixel = 0; pixel < 2400 * 40; pixel++) {
      const x = pixel % 2400;
      const y = Math.floor(pixel / 2400);
      if (x > 600 && x <= 1800 && y >= 12 && y < 28) data.set([39, 49, 79, 255], pixel * 4);
    }
    const traced = trace({ width: 2400, height: 40, data });
    expect(traced.record).toMatchObject({ widthPx: 2400, tracedWidthPx: 2000, tracedHeightPx: 33 });
    expect(codes(traced)).toContain("picture.scaled-down");
    expect(traced.artwork.pieces[0]?.box.width).toBeCloseTo(120, 1);
  });
});
