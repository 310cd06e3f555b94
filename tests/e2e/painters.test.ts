import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { build } from "esbuild";
import type { Browser, Page } from "playwright-core";
import { PNG } from "pngjs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { renderProof } from "#server/pdf/proof.ts";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { paintSvg } from "#shared/drawing/svg.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { launchBrowser } from "../support/browser.ts";
import { orreryBooks } from "../support/orrery-books.ts";
import { orrerySnapshot } from "../support/orrery-snapshot.ts";
import { pictureDifference } from "../support/picture-difference.ts";
import { pageAsPng } from "../support/poppler.ts";
import { everyLook } from "../support/slat-signs.ts";
import { textBoxesOf } from "../support/text-boxes.ts";

/** One sheet, painted on a canvas by fabric, as SVG by Chromium and as PDF by poppler, has to be one picture. */
const dpi = 150;
const pixelsPerMm = dpi / 25.4;
const require = createRequire(import.meta.url);
const root = new URL("../..", import.meta.url).pathname;

const faces = [
  { family: "Merriweather", file: "@fontsource/merriweather/files/merriweather-latin", weights: [400, 700, 900] },
  {
    family: "Merriweather Sans",
    file: "@fontsource/merriweather-sans/files/merriweather-sans-latin",
    weights: [400, 600],
  },
];

async function fontStyles(): Promise<string> {
  const rules = faces.flatMap(({ family, file, weights }) =>
    weights.map(async (weight) => {
      const bytes = await readFile(require.resolve(`${file}-${weight}-normal.woff2`));
      return `@font-face { font-family: "${family}"; font-weight: ${weight}; src: url(data:font/woff2;base64,${bytes.toString("base64")}); }`;
    }),
  );
  return (await Promise.all(rules)).join("\n");
}

/** The mockup's own canvas painter, bundled as the browser gets it. */
async function canvasPainter(): Promise<string> {
  const { outputFiles } = await build({
    stdin: {
      contents: `
        import { StaticCanvas } from "fabric/es";
        import { loadImages } from "@/features/mockup/canvas/load-images.ts";
        import { drawingFaces, paintItems } from "@/features/mockup/canvas/paint-items.ts";
        globalThis.paintOnCanvas = async (list, scale) => {
          await Promise.all(drawingFaces.map((face) => document.fonts.load(face)));
          const canvas = new StaticCanvas(document.createElement("canvas"), {
            width: Math.round(list.widthMm * scale),
            height: Math.round(list.heightMm * scale),
            enableRetinaScaling: false,
            renderOnAddRemove: false,
          });
          canvas.setViewportTransform([scale, 0, 0, scale, 0, 0]);
          canvas.add(...paintItems(list, await loadImages(list, new Map())).map(({ object }) => object));
          canvas.renderAll();
          return canvas.toDataURL({ format: "png", multiplier: 1 });
        };`,
      resolveDir: root,
      loader: "ts",
    },
    bundle: true,
    write: false,
    format: "iife",
    target: "es2022",
    tsconfig: `${root}tsconfig.json`,
    logLevel: "silent",
  });
  const [bundle] = outputFiles;
  if (!bundle) throw new Error("esbuild made no bundle.");
  return bundle.text;
}

let browser: Browser;
let page: Page;
type Painter = "canvas" | "svg" | "pdf" | "unlit";
type Painted = { readonly sheet: DisplayList; readonly pictures: Map<Painter, PNG> };

/** A plain board, and all that wood and acrylic can look like: slats with gaps, a frame, mirrored, frosted and clear pieces. */
const signs = [
  { name: "a plain sign", document: orreryBooks },
  { name: "a framed sign on slats, of every look", document: everyLook },
] as const;
const painted = new Map<string, Painted>();

const sizeOf = ({ widthMm, heightMm }: DisplayList) => ({
  width: Math.round(widthMm * pixelsPerMm),
  height: Math.round(heightMm * pixelsPerMm),
});

async function svgPicture(list: DisplayList): Promise<PNG> {
  const svg = paintSvg(list, { idPrefix: "sheet-" }).replace(/ width="[^"]*mm" height="[^"]*mm"/, "");
  const { widthMm, heightMm } = list;
  const measure = `width: ${widthMm * pixelsPerMm}px; height: ${heightMm * pixelsPerMm}px`;
  const styles = `${await fontStyles()} body { margin: 0 } svg { display: block; ${measure} }`;
  await page.setContent(`<!doctype html><style>${styles}</style>${svg}`);
  await page.evaluate(() => document.fonts.ready);
  return PNG.sync.read(await page.screenshot({ clip: { x: 0, y: 0, ...sizeOf(list) } }));
}

async function paintAll(document: MockupDocument): Promise<Painted> {
  const snapshot = await orrerySnapshot("A3", document);
  const [sheet] = snapshot.drawing.sheets;
  if (!sheet) throw new Error("The set has no sheet.");
  const pictures = new Map<Painter, PNG>();
  page = await browser.newPage({ viewport: sizeOf(sheet), deviceScaleFactor: 1 });
  pictures.set("svg", await svgPicture(sheet));
  await page.addScriptTag({ content: await canvasPainter() });
  const url = await page.evaluate(
    ([list, scale]) =>
      (globalThis as unknown as { paintOnCanvas: (list: unknown, scale: number) => Promise<string> }).paintOnCanvas(
        list,
        scale,
      ),
    [sheet, pixelsPerMm] as const,
  );
  pictures.set("canvas", PNG.sync.read(Buffer.from(url.split(",")[1] ?? "", "base64")));
  const pdf = await renderProof(snapshot, "0".repeat(64));
  pictures.set("pdf", PNG.sync.read(await pageAsPng(pdf, { page: 1, dpi })));
  return { sheet, pictures };
}

beforeAll(async () => {
  browser = await launchBrowser();
  for (const { name, document } of signs) painted.set(name, await paintAll(document()));
}, 240_000);
afterAll(() => browser?.close());

/** Pictures of a page come out a pixel larger or smaller: what all have in common is compared. */
function cropped(png: PNG, width: number, height: number): PNG {
  const cut = new PNG({ width, height });
  PNG.bitblt(png, cut, 0, 0, width, height, 0, 0);
  return cut;
}

function paintedSign(name: string): Painted {
  const found = painted.get(name);
  if (!found) throw new Error(`${name} was not painted.`);
  return found;
}

function compare(name: string, one: Painter, other: Painter, masked: boolean) {
  const { sheet, pictures } = paintedSign(name);
  const [a, b] = [pictures.get(one), pictures.get(other)];
  if (!a || !b) throw new Error("A picture is missing.");
  const [width, height] = [Math.min(a.width, b.width), Math.min(a.height, b.height)];
  expect(Math.abs(a.width - b.width) + Math.abs(a.height - b.height)).toBeLessThanOrEqual(2);
  const boxes = textBoxesOf(sheet).map(({ box }) => ({
    x: (box.x - 0.5) * pixelsPerMm,
    y: (box.y - 0.5) * pixelsPerMm,
    width: (box.width + 1) * pixelsPerMm,
    height: (box.height + 1) * pixelsPerMm,
  }));
  return pictureDifference(cropped(a, width, height), cropped(b, width, height), masked ? boxes : []);
}

/**
 * The product's own limit is 1 %. On a sheet that is mostly white paper a lost shadow would pass it, so the limit here is what loses none: measured were
 * 0.004 % at most without text.
 */
const mostWithoutText = 0.0005;

describe.each(signs)("the sheet of $name by three painters at 150 dpi", ({ name }) => {
  it.each([
    ["canvas", "svg"],
    ["svg", "pdf"],
    ["canvas", "pdf"],
  ] as const)("is the same picture by %s and %s, text left out", (one, other) => {
    expect(compare(name, one, other, true).share).toBeLessThanOrEqual(mostWithoutText);
  });

  it.each([
    ["canvas", "svg"],
    ["svg", "pdf"],
    ["canvas", "pdf"],
  ] as const)(
    "has its text in the same places by %s and %s: at most one pixel in a hundred differs with it",
    (one, other) => {
      expect(compare(name, one, other, false).share).toBeLessThanOrEqual(0.01);
    },
  );

  it("is told apart from one without shadows", async () => {
    const { sheet, pictures } = paintedSign(name);
    pictures.set("unlit", await svgPicture({ ...sheet, items: withoutShadows(sheet.items) }));
    expect(compare(name, "unlit", "svg", true).share).toBeGreaterThan(mostWithoutText);
  });
});

const isShadow = (item: Item) => item.kind === "image" && item.opacity !== undefined;

function withoutShadows(items: readonly Item[]): Item[] {
  return items
    .filter((item) => !isShadow(item))
    .map((item) => ("items" in item ? { ...item, items: withoutShadows(item.items) } : item));
}
