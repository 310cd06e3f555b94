import { isInvisible, type Rgba, rgbaFromHex } from "./rgba.ts";
import { numberOf, referenceOf } from "./svg-element.ts";
import type { WarningCode } from "./warnings.ts";
import type { XmlElement } from "./xml-text.ts";

/**
 * The one colour an element's fill or stroke becomes, or null when nothing is painted: a plain colour, a gradient's
 * average, or the first colour of a pattern. What was simplified is added to `warnings`.
 */
export function paintOf(
  element: XmlElement,
  kind: "fill" | "stroke",
  context: { byId: ReadonlyMap<string, XmlElement>; warnings: Set<WarningCode> },
): Rgba | null {
  const text = element.attributes[kind] ?? (kind === "fill" ? "#000000" : "none");
  if (text === "none") return null;
  const opacity = Math.max(0, Math.min(1, numberOf(element, `${kind}-opacity`, 1)));
  const reference = referenceOf(element, kind);
  const server = reference === null ? undefined : context.byId.get(reference);
  const base = server ? serverColour(server, context) : rgbaFromHex(text);
  if (!base) return null;
  const colour = { ...base, a: base.a * opacity };
  return isInvisible(colour) ? null : colour;
}

function serverColour(
  server: XmlElement,
  context: { byId: ReadonlyMap<string, XmlElement>; warnings: Set<WarningCode> },
): Rgba | null {
  if (server.name === "pattern") {
    context.warnings.add("pattern.flattened");
    return firstColour(server);
  }
  const stops = server.children.filter(({ name }) => name === "stop");
  const colours = new Set(stops.map(({ attributes }) => `${attributes["stop-color"]} ${attributes["stop-opacity"]}`));
  if (colours.size > 1) context.warnings.add("gradient.flattened");
  return averageOfStops(
    stops.map((stop) => ({
      at: Math.max(0, Math.min(1, numberOf(stop, "offset", 0))),
      colour: rgbaFromHex(stop.attributes["stop-color"] ?? "#000000", numberOf(stop, "stop-opacity", 1)) ?? {
        r: 0,
        g: 0,
        b: 0,
        a: 1,
      },
    })),
  );
}

/** The mean colour along a gradient from 0 to 1: linear between its stops, constant before the first and after the last. */
export function averageOfStops(stops: readonly { readonly at: number; readonly colour: Rgba }[]): Rgba | null {
  const first = stops[0];
  const last = stops.at(-1);
  if (!first || !last) return null;
  const sum = { r: 0, g: 0, b: 0, a: 0 };
  const add = ({ r, g, b, a }: Rgba, share: number) => {
    sum.r += r * a * share;
    sum.g += g * a * share;
    sum.b += b * a * share;
    sum.a += a * share;
  };
  add(first.colour, first.at);
  let before = first;
  for (const stop of stops.slice(1)) {
    // Offsets that run backwards count as equal to the one before, as SVG has it.
    const share = Math.max(0, stop.at - before.at);
    add(before.colour, share / 2);
    add(stop.colour, share / 2);
    before = { at: Math.max(before.at, stop.at), colour: stop.colour };
  }
  add(last.colour, 1 - before.at);
  if (sum.a <= 0) return null;
  return { r: sum.r / sum.a, g: sum.g / sum.a, b: sum.b / sum.a, a: Math.min(1, sum.a) };
}

function firstColour(element: XmlElement): Rgba | null {
  for (const kind of ["fill", "stroke"] as const) {
    const colour = rgbaFromHex(element.attributes[kind] ?? "", numberOf(element, `${kind}-opacity`, 1));
    if (colour) return colour;
  }
  for (const child of element.children) {
    const colour = firstColour(child);
    if (colour) return colour;
  }
  return null;
}
