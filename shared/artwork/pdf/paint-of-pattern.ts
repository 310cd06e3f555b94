import { averageOfStops } from "../paint.ts";
import { rgbaFromHex, rgbaToHex } from "../rgba.ts";
import type { WarningCode } from "../warnings.ts";
import type { PdfPaint } from "./graphics-state.ts";
import { colourOf, isRecord, numberAt } from "./operands.ts";

/** Stands for a gradient or pattern of which no colour can be told. */
const unknown: PdfPaint = { colour: "#808080", alpha: 1 };

/**
 * One colour for a shading as pdf.js describes it: the average along an axial or radial one, of the corners of a mesh.
 * What was simplified is added to `warnings`.
 */
export function paintOfShading(shading: unknown, warnings: Set<WarningCode>): PdfPaint {
  warnings.add("gradient.flattened");
  if (!Array.isArray(shading)) return unknown;
  if (shading[0] === "RadialAxial") return averageAlong(shading[3]);
  return shading[0] === "Mesh" ? averageOfCorners(shading[3]) : unknown;
}

/** One colour for a tiling pattern: its own when it is a stencil, else the last one that its cell is filled with. */
export function paintOfTiling(args: readonly unknown[], warnings: Set<WarningCode>): PdfPaint {
  warnings.add("pattern.flattened");
  const stencil = colourOf(args[1]);
  if (stencil) return { colour: stencil, alpha: 1 };
  const cell = args[2];
  const colours = isRecord(cell) && Array.isArray(cell.argsArray) ? cell.argsArray : [];
  const last = colours
    .flatMap((operands: unknown) => (Array.isArray(operands) ? [colourOf(operands[0])] : []))
    .findLast((colour) => colour !== null);
  return last ? { colour: last, alpha: 1 } : unknown;
}

function averageAlong(stops: unknown): PdfPaint {
  if (!Array.isArray(stops)) return unknown;
  const average = averageOfStops(
    stops.flatMap((stop: unknown) => {
      const colour = Array.isArray(stop) ? rgbaFromHex(colourOf(stop[1]) ?? "") : null;
      // Beyond its ends a gradient that doesn't go on paints nothing: such stops say nothing of its colour.
      return Array.isArray(stop) && colour ? [{ at: Math.max(0, Math.min(1, numberAt(stop, 0))), colour }] : [];
    }),
  );
  return average ? { colour: rgbaToHex(average), alpha: average.a } : unknown;
}

function averageOfCorners(colours: unknown): PdfPaint {
  if (!(colours instanceof Uint8Array) || colours.length < 3) return unknown;
  const sum = [0, 0, 0];
  const corners = Math.floor(colours.length / 3);
  for (let corner = 0; corner < corners; corner++)
    for (const channel of [0, 1, 2]) sum[channel] = (sum[channel] ?? 0) + (colours[corner * 3 + channel] ?? 0);
  const [r = 0, g = 0, b = 0] = sum.map((value) => value / corners);
  return { colour: rgbaToHex({ r, g, b, a: 1 }), alpha: 1 };
}
