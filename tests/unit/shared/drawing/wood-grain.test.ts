import { PNG } from "pngjs";
import { describe, expect, it } from "vitest";
import { woodGrain } from "#shared/drawing/wood-grain.ts";

const board = { x: 0, y: 0, width: 600, height: 400 };
const pine = "#E6D3AC";

const read = (image: ReturnType<typeof woodGrain>) => PNG.sync.read(Buffer.from(image.pngBase64, "base64"));
const mean = (png: PNG, channel: number) => {
  let sum = 0;
  for (let index = channel; index < png.data.length; index += 4) sum += png.data[index] ?? 0;
  return sum / (png.data.length / 4);
};

/** How much neighbours differ along x and along y, in grey levels a millimetre. */
function roughness(png: PNG, box: { width: number; height: number }) {
  const red = (x: number, y: number) => png.data[(y * png.width + x) * 4] ?? 0;
  let [across, down] = [0, 0];
  for (let y = 1; y < png.height; y += 1) {
    for (let x = 1; x < png.width; x += 1) {
      across += Math.abs(red(x, y) - red(x - 1, y));
      down += Math.abs(red(x, y) - red(x, y - 1));
    }
  }
  return { x: across / (box.width / png.width), y: down / (box.height / png.height) };
}

describe("wood grain", () => {
  it("has the same bytes for the same board, also after another one was drawn", () => {
    const first = woodGrain(board, pine, 7, 0);
    const other = woodGrain({ ...board, width: 500 }, pine, 7, 0);
    expect(other.pngBase64).not.toBe(first.pngBase64);
    expect(woodGrain({ ...board }, pine, 7, 0)).toEqual(first);
    expect(woodGrain(board, pine, 8, 0).pngBase64).not.toBe(first.pngBase64);
  });

  it.each([
    { colour: pine, red: 230, name: "pine" },
    { colour: "#6B4A32", red: 107, name: "walnut" },
  ])("keeps $name's own colour on the whole", ({ colour, red }) => {
    expect(Math.abs(mean(read(woodGrain(board, colour, 7, 0)), 0) - red)).toBeLessThan(14);
  });

  it.each([
    { turn: 0, along: "x", across: "y" },
    { turn: 90, along: "y", across: "x" },
    { turn: 180, along: "x", across: "y" },
  ] as const)("turned $turn° runs along $along", ({ turn, along, across }) => {
    const rough = roughness(read(woodGrain(board, pine, 7, turn)), board);
    expect(rough[across]).toBeGreaterThan(4 * rough[along]);
  });

  it("stays small on the largest board", () => {
    const png = read(woodGrain({ ...board, width: 10_000, height: 10_000 }, pine, 7, 0));
    expect(png.width * png.height).toBeLessThan(170_000);
  });
});
