import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { initWasm, Resvg } from "@resvg/resvg-wasm";
import type { GuardedSvg } from "#shared/artwork/guard-svg.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";
import type { WarningCode } from "#shared/artwork/warnings.ts";
import { artworkFontFamily, loadArtworkFonts } from "./artwork-fonts.ts";

let ready: Promise<void> | undefined;

/**
 * A guarded drawing as resvg's simplified SVG: groups, paths and their clips, masks and gradients, with text as outlines in
 * the shipped font. The WebAssembly build sees no files. Throws ArtworkRefused when the reader refuses the drawing; after a
 * WebAssembly.RuntimeError the reader is broken and the worker that holds it must go.
 */
export async function simplifySvg(
  guarded: GuardedSvg,
): Promise<{ readonly simplified: string; readonly warnings: ReadonlySet<WarningCode> }> {
  ready ??= readFile(createRequire(import.meta.url).resolve("@resvg/resvg-wasm/index_bg.wasm")).then((wasm) =>
    initWasm(wasm),
  );
  await ready;
  const warnings = new Set<WarningCode>(guarded.warnings);
  const fonts = guarded.texts.length > 0 ? await loadArtworkFonts() : null;
  const simplified = runReader(guarded.svg, fonts?.buffers ?? []);
  if (fonts) {
    warnings.add("text.font-replaced");
    for (const { id, letters } of guarded.texts) {
      if (!simplified.includes(`id="${id}"`)) warnings.add("text.lost");
      const missing = [...letters].some((letter) => /\S/u.test(letter) && !fonts.hasLetter(letter.codePointAt(0) ?? 0));
      if (missing) warnings.add("text.missing-letters");
    }
  }
  return { simplified, warnings };
}

function runReader(svg: string, fontBuffers: Uint8Array[]): string {
  const family = artworkFontFamily;
  let reader: InstanceType<typeof Resvg> | undefined;
  try {
    reader = new Resvg(svg, {
      font: {
        fontBuffers,
        defaultFontFamily: family,
        serifFamily: family,
        sansSerifFamily: family,
        cursiveFamily: family,
        fantasyFamily: family,
        monospaceFamily: family,
      },
    });
    return reader.toString();
  } catch (error) {
    if (error instanceof WebAssembly.RuntimeError) throw error;
    throw new ArtworkRefused(refusalFor(error));
  } finally {
    reader?.free();
  }
}

function refusalFor(error: unknown): "svg.no-size" | "svg.too-many-elements" | "svg.unreadable" {
  const message = error instanceof Error ? error.message : String(error);
  if (message.includes("invalid size")) return "svg.no-size";
  return message.includes("nodes limit") ? "svg.too-many-elements" : "svg.unreadable";
}
