import { readdirSync, readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { join } from "node:path";
import { initWasm, Resvg } from "@resvg/resvg-wasm";
import { Jimp } from "jimp";
import type { Picture } from "#shared/tracing/picture.ts";
import { firstChoices } from "#shared/tracing/trace-choices.ts";
import { tracePicture } from "#shared/tracing/trace-picture.ts";
import { piecesAsSvg } from "./ink-agreement.ts";
import { jpegOf } from "./pictures.ts";
import { seededRandom } from "./seeded-random.ts";

export type Drawing = { readonly name: string; readonly svg: string };
/** Intersection over union of a drawing's colours with those of its trace, and how many colours either has. */
export type Agreement = {
  readonly name: string;
  readonly mean: number;
  readonly worst: number;
  readonly drawn: number;
  readonly found: number;
  readonly nodes: number;
};

const sizePx = 1000;
/** Colours nearer than this in RGB count as one. */
const sameColour = 30;
/** A smaller share of the picture is no colour to be judged. */
const leastShare = 0.0005;
const modules = join(import.meta.dirname, "../../node_modules");

/** `each` drawings in flat colours, three or more, from each of three open sets, the same for the same seed. */
export function flatDrawings(each: number, seed: number): Drawing[] {
  const random = seededRandom(seed);
  const folder = (path: string) => (name: string) => readFileSync(join(modules, path, name), "utf8");
  const icons = JSON.parse(readFileSync(join(modules, "@iconify-json/skill-icons/icons.json"), "utf8")) as {
    icons: Record<string, { body: string; width?: number; height?: number }>;
  };
  const iconOf = (name: string): string => {
    const { body = "", width = 256, height = 256 } = icons.icons[name] ?? {};
    return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}">${body}</svg>`;
  };
  const svgFiles = (path: string) => readdirSync(join(modules, path)).filter((file) => file.endsWith(".svg"));
  const sets = [
    { names: svgFiles("@twemoji/svg"), read: folder("@twemoji/svg") },
    { names: Object.keys(icons.icons), read: iconOf },
    { names: svgFiles("circle-flags/flags"), read: folder("circle-flags/flags") },
  ];
  return sets.flatMap(({ names, read }) => {
    const pool = names.sort();
    const drawn: Drawing[] = [];
    while (drawn.length < each && pool.length > 0) {
      const name = pool.splice(Math.floor(random() * pool.length), 1)[0] ?? "";
      const svg = read(name);
      const colours = new Set([...svg.matchAll(/#[0-9a-f]{3,6}\b/gi)].map(([colour]) => colour.toLowerCase()));
      if (colours.size > 2 && !/gradient|opacity|filter|<image|pattern|<text|style=/i.test(svg))
        drawn.push({ name, svg });
    }
    return drawn;
  });
}

/** Draws each with smooth edges at 1000 px, traces that as PNG or as JPEG of quality 80 on white, and compares with crisp edges. */
export async function traceAgreements(drawings: readonly Drawing[], format: "png" | "jpeg"): Promise<Agreement[]> {
  await startReader();
  const rows: Agreement[] = [];
  for (const { name, svg } of drawings) {
    const ground = format === "jpeg" ? "white" : undefined;
    const smooth = render(svg, ground);
    const picture = format === "jpeg" ? await throughJpeg(smooth) : smooth;
    const file = { picture, lossy: format === "jpeg", density: null, warnings: new Set<never>() };
    const { artwork, record } = tracePicture(file, { ...firstChoices, background: "kept" });
    const score = compare(render(crisp(svg), ground), render(crisp(piecesAsSvg(artwork)), undefined));
    rows.push({ name, ...score, nodes: record.nodes });
  }
  return rows;
}

let reader: Promise<void> | undefined;
function startReader(): Promise<void> {
  reader ??= initWasm(readFileSync(createRequire(import.meta.url).resolve("@resvg/resvg-wasm/index_bg.wasm")));
  return reader;
}

const crisp = (svg: string): string => svg.replace("<svg", '<svg shape-rendering="crispEdges"');

function render(svg: string, background: string | undefined): Picture {
  const drawing = new Resvg(svg, { fitTo: { mode: "width", value: sizePx }, ...(background ? { background } : {}) });
  const image = drawing.render();
  const picture = { width: image.width, height: image.height, data: Uint8Array.from(image.pixels) };
  image.free();
  drawing.free();
  // The renderer's pixels are multiplied by their opacity, a file's are not.
  for (let at = 0; at < picture.data.length; at += 4) {
    const alpha = picture.data[at + 3] ?? 0;
    if (alpha === 0 || alpha === 255) continue;
    for (let channel = 0; channel < 3; channel++)
      picture.data[at + channel] = Math.min(255, Math.round(((picture.data[at + channel] ?? 0) * 255) / alpha));
  }
  return picture;
}

async function throughJpeg(picture: Picture): Promise<Picture> {
  const { bitmap } = await Jimp.fromBuffer(Buffer.from(await jpegOf(picture)));
  return { width: bitmap.width, height: bitmap.height, data: bitmap.data };
}

function compare(drawn: Picture, traced: Picture): Omit<Agreement, "name" | "nodes"> {
  const truth = joinedColours(drawn);
  const got = joinedColours(traced);
  const least = leastShare * truth.of.length;
  const judged = [...truth.counts].filter(([colour, count]) => colour >= 0 && count >= least).map(([colour]) => colour);
  const meant = new Map([...got.counts.keys()].map((colour) => [colour, nearest(colour, [...truth.counts.keys()])]));
  const shares = judged.map((colour) => {
    let both = 0;
    let either = 0;
    for (let pixel = 0; pixel < truth.of.length; pixel++) {
      const inDrawn = truth.of[pixel] === colour;
      const inTraced = meant.get(got.of[pixel] ?? -1) === colour;
      if (inDrawn && inTraced) both++;
      if (inDrawn || inTraced) either++;
    }
    return both / either;
  });
  const found = [...got.counts].filter(([colour, count]) => colour >= 0 && count >= least).length;
  const mean = shares.reduce((sum, share) => sum + share, 0) / shares.length;
  return { mean, worst: Math.min(...shares), drawn: judged.length, found };
}

/** Each pixel's colour as a number, −1 for none, near ones joined to the more frequent. */
function joinedColours({ width, height, data }: Picture) {
  const of = new Int32Array(width * height);
  const seen = new Map<number, number>();
  for (let pixel = 0; pixel < of.length; pixel++) {
    const at = pixel * 4;
    const solid = (data[at + 3] ?? 0) >= 128;
    const colour = solid ? ((data[at] ?? 0) << 16) | ((data[at + 1] ?? 0) << 8) | (data[at + 2] ?? 0) : -1;
    of[pixel] = colour;
    seen.set(colour, (seen.get(colour) ?? 0) + 1);
  }
  const kept: number[] = [];
  const joined = new Map<number, number>();
  for (const [colour] of [...seen].sort((a, b) => b[1] - a[1])) {
    const near = kept.find((other) => colour >= 0 && other >= 0 && distance(other, colour) < sameColour);
    if (near === undefined) kept.push(colour);
    joined.set(colour, near ?? colour);
  }
  const counts = new Map<number, number>();
  for (let pixel = 0; pixel < of.length; pixel++) {
    const colour = joined.get(of[pixel] ?? -1) ?? -1;
    of[pixel] = colour;
    counts.set(colour, (counts.get(colour) ?? 0) + 1);
  }
  return { of, counts };
}

function nearest(colour: number, among: readonly number[]): number {
  if (colour < 0) return -1;
  const solid = among.filter((other) => other >= 0);
  return solid.reduce(
    (best, other) => (distance(other, colour) < distance(best, colour) ? other : best),
    solid[0] ?? -1,
  );
}

const distance = (a: number, b: number): number =>
  Math.hypot((a >> 16) - (b >> 16), ((a >> 8) & 255) - ((b >> 8) & 255), (a & 255) - (b & 255));
