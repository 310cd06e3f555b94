import { SaxesParser, type SaxesTagPlain } from "saxes";
import { identityMatrix, type Matrix } from "../geometry/transform.ts";
import type { XmlElement } from "./xml-text.ts";

/** The reader's simplified SVG as elements, with those that carry an id. Throws an Error when it is not well-formed. */
export function readSvgElements(text: string): {
  readonly root: XmlElement;
  readonly byId: ReadonlyMap<string, XmlElement>;
} {
  type Open = { name: string; attributes: Record<string, string>; children: XmlElement[] };
  const byId = new Map<string, XmlElement>();
  const stack: Open[] = [];
  let root: XmlElement | undefined;
  const parser = new SaxesParser<{ xmlns: false; position: false }>({ xmlns: false, position: false });
  parser.on("error", (error) => {
    throw error;
  });
  parser.on("opentag", (tag: SaxesTagPlain) => {
    const element: Open = { name: tag.name, attributes: { ...tag.attributes }, children: [] };
    stack.at(-1)?.children.push(element);
    root ??= element;
    const id = element.attributes.id;
    if (id !== undefined && !byId.has(id)) byId.set(id, element);
    stack.push(element);
  });
  parser.on("closetag", () => {
    stack.pop();
  });
  parser.write(text).close();
  if (!root) throw new Error("The simplified drawing holds no element.");
  return { root, byId };
}

/** A number of an attribute, or the fallback where it is missing or not finite. */
export function numberOf(element: XmlElement, name: string, fallback: number): number {
  const text = element.attributes[name];
  if (text === undefined) return fallback;
  const number = Number.parseFloat(text);
  return Number.isFinite(number) ? number : fallback;
}

/** The id an attribute or a style's property refers to as `url(#id)`, or null. */
export function referenceOf(element: XmlElement, name: string): string | null {
  return /^\s*url\(\s*["']?#([^"')]+)["']?\s*\)/.exec(element.attributes[name] ?? "")?.[1] ?? null;
}

/** The element's `transform`, which the reader writes as one `matrix(…)`. */
export function transformOf(element: XmlElement, name = "transform"): Matrix {
  const inside = /^\s*matrix\(([^)]*)\)\s*$/.exec(element.attributes[name] ?? "")?.[1];
  const [a, b, c, d, e, f] = (inside ?? "")
    .trim()
    .split(/[\s,]+/)
    .map(Number);
  if (a === undefined || b === undefined || c === undefined || d === undefined || e === undefined || f === undefined)
    return identityMatrix;
  return { a, b, c, d, e, f };
}
