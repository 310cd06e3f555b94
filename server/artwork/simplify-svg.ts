import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { initWasm, Resvg } from "@resvg/resvg-wasm";
import type { GuardedSvg } from "#shared/artwork/guard-svg.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";
import type { WarningCode } from "#shared/artwork/warnings.ts";
import { artworkFontFamily, loadArtworkFonts } from "./artwork-fonts.ts";

let ready: Promise<void> | undefined;
let broken = false;

/** Whether the reader met a file that broke it: its memory can't be trusted any more, so its worker must end. */
export const isReaderBroken = (): boolean => broken;

/**
 * A guarded drawing as resvg's simplified SVG: groups, paths and their clips, masks and gradients, with text as outlines in
 * the shipped font. The WebAssembly build sees no files. Throws ArtworkRefused when the reader refuses the drawing or
 * breaks on it.
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
  try {
    const reader = new Resvg(svg, {
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
    const simplified = reader.toString();
    reader.free();
    return simplified;
  } catch (error) {
    // A panic: what the reader holds can't even be freed.
    if (error instanceof WebAssembly.RuntimeError) broken = true;
    throw new ArtworkRefused(refusalFor(error));
  }
}

function refusalFor(error: unknown): "svg.no-size" | "svg.too-many-elements" | "svg.unreadable" {
  const message = error instanceof Error ? error.message : String(error);
  if (message.includes("invalid size")) return "svg.no-size";
  return message.includes("nodes limit") ? "svg.too-many-elements" : "svg.unreadable";
}
