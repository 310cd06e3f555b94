import type { Browser } from "playwright-core";
import type { ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import { pathToText } from "#shared/geometry/path-text.ts";

/** Longer side of the pictures compared. */
const sizePx = 800;
/** Channels that differ by less are the same colour: rounding of mixed colours. */
const sameColour = 16;

export type InkPair = { readonly original: string; readonly pieces: string };

/** Our pieces as an SVG picture of their own, for a renderer that knows nothing of us. */
export function piecesAsSvg(artwork: ImportedArtwork): string {
  const paths = artwork.pieces.map(
    ({ colour, path }) => `<path fill="${colour}" fill-rule="evenodd" d="${pathToText(path, 6)}"/>`,
  );
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${artwork.widthMm} ${artwork.heightMm}">${paths.join("")}</svg>`;
}

/**
 * Draws pairs of SVG texts in Chromium with crisp edges and tells for each how well they agree: of the pixels that either
 * paints, the share that both paint in the same colour. −1 when a picture can't be drawn.
 */
export async function inkAgreements(browser: Browser, pairs: readonly InkPair[]): Promise<number[]> {
  const page = await browser.newPage();
  try {
    await page.setContent("<!doctype html><title>ink</title>");
    const scores: number[] = [];
    for (let start = 0; start < pairs.length; start += 25) {
      const batch = pairs.slice(start, start + 25).map(({ original, pieces }) => ({
        original: crisp(original),
        pieces: crisp(pieces),
      }));
      scores.push(...(await page.evaluate(compareInPage, { batch, sizePx, sameColour })));
    }
    return scores;
  } finally {
    await page.close();
  }
}

function crisp(svg: string): string {
  const root = /<svg\b[^>]*>/.exec(svg)?.[0] ?? "";
  const box = /\bviewBox\s*=\s*["']([^"']*)["']/
    .exec(root)?.[1]
    ?.trim()
    .split(/[\s,]+/)
    .map(Number);
  const width = box?.[2] ?? Number(/\bwidth="([\d.]+)"/.exec(root)?.[1] ?? 100);
  const height = box?.[3] ?? Number(/\bheight="([\d.]+)"/.exec(root)?.[1] ?? 100);
  const scale = sizePx / Math.max(width, height);
  const bare = root
    .replace(/\s(width|height|shape-rendering)\s*=\s*("[^"]*"|'[^']*')/g, "")
    .replace(/^<svg/, `<svg width="${width * scale}" height="${height * scale}" shape-rendering="crispEdges"`);
  const framed = box ? bare : bare.replace(/^<svg/, `<svg viewBox="0 0 ${width} ${height}"`);
  return svg.replace(root, framed);
}

async function compareInPage(task: { batch: InkPair[]; sizePx: number; sameColour: number }): Promise<number[]> {
  const canvas = document.createElement("canvas");
  const context = canvas.getContext("2d", { willReadFrequently: true });
  if (!context) throw new Error("No canvas.");
  const draw = async (svg: string) => {
    const image = new Image();
    image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(svg)}`;
    await image.decode();
    canvas.width = image.naturalWidth;
    canvas.height = image.naturalHeight;
    context.drawImage(image, 0, 0);
    return context.getImageData(0, 0, canvas.width, canvas.height);
  };
  const scores: number[] = [];
  for (const { original, pieces } of task.batch) {
    try {
      const a = await draw(original);
      const b = await draw(pieces);
      if (a.width !== b.width || a.height !== b.height) {
        scores.push(-1);
        continue;
      }
      let ink = 0;
      let agreed = 0;
      for (let i = 0; i < a.data.length; i += 4) {
        const alphaA = a.data[i + 3] ?? 0;
        const alphaB = b.data[i + 3] ?? 0;
        if (alphaA < 8 && alphaB < 8) continue;
        ink++;
        // Both over white paper, as translucent colours are mixed.
        let same = alphaA >= 8 && alphaB >= 8;
        for (let channel = 0; channel < 3; channel++) {
          const onA = ((a.data[i + channel] ?? 0) * alphaA) / 255 + 255 - alphaA;
          const onB = ((b.data[i + channel] ?? 0) * alphaB) / 255 + 255 - alphaB;
          if (Math.abs(onA - onB) > task.sameColour) same = false;
        }
        if (same) agreed++;
      }
      scores.push(ink === 0 ? 1 : agreed / ink);
    } catch {
      scores.push(-1);
    }
  }
  return scores;
}
