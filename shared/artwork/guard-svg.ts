import { SaxesParser, type SaxesTagPlain } from "saxes";
import { readEntities } from "./entities.ts";
import { artworkLimits } from "./limits.ts";
import { staysInside, withoutOutsideUrls } from "./outside-references.ts";
import { ArtworkRefused } from "./refusals.ts";
import { readViewBox } from "./viewport.ts";
import type { WarningCode } from "./warnings.ts";
import { escapeXml } from "./xml-text.ts";

export type GuardedSvg = {
  /** The drawing rewritten: SVG elements only, nothing that runs, nothing that leaves the file, no DOCTYPE. */
  readonly svg: string;
  /** The root's size attributes as written. */
  readonly root: {
    readonly width?: string;
    readonly height?: string;
    readonly viewBox?: string;
    readonly aspect?: string;
  };
  /** Each text element with letters, by the id it has in `svg`. */
  readonly texts: readonly { readonly id: string; readonly letters: string }[];
  readonly warnings: ReadonlySet<WarningCode>;
};

const svgNamespace = "http://www.w3.org/2000/svg";
const linkNamespace = "http://www.w3.org/1999/xlink";
const dropped: Readonly<Record<string, WarningCode | null>> = {
  script: "script.removed",
  handler: "script.removed",
  foreignObject: "foreign.left-out",
  iframe: "foreign.left-out",
  video: "foreign.left-out",
  audio: "foreign.left-out",
  canvas: "foreign.left-out",
  animate: "animation.ignored",
  animateColor: "animation.ignored",
  animateMotion: "animation.ignored",
  animateTransform: "animation.ignored",
  set: "animation.ignored",
  discard: "animation.ignored",
  metadata: null,
  title: null,
  desc: null,
};

/** Attributes that hold numbers: a program that failed to work one out writes it as a word. */
const measures = new Set("d points x y x1 y1 x2 y2 cx cy r rx ry width height transform".split(" "));

/**
 * Reads an untrusted SVG text and writes it anew with what is safe to pass on.
 * Throws ArtworkRefused with svg.broken, svg.not-svg, svg.entities, svg.too-many-elements or svg.too-deep.
 */
export function guardSvg(text: string): GuardedSvg {
  const warnings = new Set<WarningCode>();
  const texts: { id: string; letters: string }[] = [];
  const out: string[] = [];
  const svgPrefixes = new Set<string>([""]);
  const linkPrefixes = new Set<string>(["xlink"]);
  const state = { depth: 0, elements: 0, skipping: 0, styleDepth: 0, textDepth: 0, root: {} as GuardedSvg["root"] };

  const parser = new SaxesParser<{ xmlns: false; position: false }>({ xmlns: false, position: false });
  parser.on("error", () => {
    throw new ArtworkRefused("svg.broken");
  });
  parser.on("doctype", (doctype) => {
    const entities = readEntities(doctype);
    if (!entities) throw new ArtworkRefused("svg.entities");
    let uses = 0;
    for (const name of Object.keys(entities)) uses += text.split(`&${name};`).length - 1;
    if (uses > artworkLimits.entityUses) throw new ArtworkRefused("svg.entities");
    Object.assign(parser.ENTITIES, entities);
  });

  parser.on("opentag", (tag: SaxesTagPlain) => {
    state.depth++;
    state.elements++;
    if (state.elements > artworkLimits.elements) throw new ArtworkRefused("svg.too-many-elements");
    if (state.depth > artworkLimits.depth) throw new ArtworkRefused("svg.too-deep");
    if (state.skipping > 0) {
      state.skipping++;
      return;
    }
    for (const [name, value] of Object.entries(tag.attributes)) {
      if (!name.startsWith("xmlns:")) continue;
      const prefix = name.slice("xmlns:".length);
      if (value === svgNamespace) svgPrefixes.add(prefix);
      if (value === linkNamespace) linkPrefixes.add(prefix);
    }
    const [prefix, local] = splitName(tag.name);
    const namespace = tag.attributes.xmlns;
    const isSvg = svgPrefixes.has(prefix) && (prefix !== "" || namespace === undefined || namespace === svgNamespace);
    if (state.depth === 1 && !(isSvg && local === "svg")) throw new ArtworkRefused("svg.not-svg");
    if (!isSvg || local in dropped) {
      const warning = isSvg ? dropped[local] : null;
      if (warning) warnings.add(warning);
      state.skipping = 1;
      return;
    }
    if (state.depth === 1) state.root = rootSize(tag.attributes);
    if (local === "style") state.styleDepth = state.depth;

    const attributes = keptAttributes(tag.attributes, local, linkPrefixes, warnings);
    if (state.depth === 1) {
      attributes.set("xmlns", svgNamespace);
      attributes.set("xmlns:xlink", linkNamespace);
      // With a view box the size is ours to work out; without one the reader needs what there is.
      if (readViewBox(state.root.viewBox)) {
        attributes.delete("width");
        attributes.delete("height");
      } else attributes.delete("viewBox");
    }
    if (local === "text" && state.textDepth === 0) {
      const id = attributes.get("id") ?? `text-${texts.length + 1}`;
      attributes.set("id", id);
      texts.push({ id, letters: "" });
      state.textDepth = state.depth;
    }
    const written = [...attributes].map(([name, value]) => ` ${name}="${escapeXml(value)}"`).join("");
    out.push(`<${local}${written}>`);
  });

  parser.on("closetag", (tag: SaxesTagPlain) => {
    if (state.depth === state.styleDepth) state.styleDepth = 0;
    if (state.depth === state.textDepth) state.textDepth = 0;
    state.depth--;
    if (state.skipping > 0) {
      state.skipping--;
      return;
    }
    out.push(`</${splitName(tag.name)[1]}>`);
  });

  const take = (letters: string) => {
    if (state.skipping > 0 || state.depth === 0) return;
    if (state.styleDepth > 0) {
      noteCss(letters, warnings);
      const css = withoutOutsideUrls(letters);
      if (css.found) warnings.add("reference.outside");
      out.push(escapeXml(css.text));
      return;
    }
    const current = texts.at(-1);
    if (state.textDepth > 0 && current) current.letters += letters;
    out.push(escapeXml(letters));
  };
  parser.on("text", take);
  parser.on("cdata", take);

  parser.write(text).close();
  if (state.elements === 0) throw new ArtworkRefused("svg.broken");
  return { svg: out.join(""), root: state.root, texts: texts.filter(({ letters }) => letters.trim() !== ""), warnings };
}

function keptAttributes(
  attributes: Readonly<Record<string, string>>,
  element: string,
  linkPrefixes: ReadonlySet<string>,
  warnings: Set<WarningCode>,
): Map<string, string> {
  const kept = new Map<string, string>();
  for (const [name, value] of Object.entries(attributes)) {
    const [prefix, local] = splitName(name);
    if (local === "href" && (prefix === "" || linkPrefixes.has(prefix))) {
      // A link of an `a` leads somewhere but draws nothing.
      if (element === "a") continue;
      if (staysInside(value)) kept.set("xlink:href", value);
      else warnings.add(element === "image" && /^\s*data:/i.test(value) ? "image.left-out" : "reference.outside");
      continue;
    }
    if (name === "xml:space") kept.set(name, value);
    if (prefix !== "" || name === "xmlns") continue;
    if (/^on/i.test(name)) {
      warnings.add("script.removed");
      continue;
    }
    if (name === "style" || name === "fill" || name === "stroke" || name === "color") noteCss(value, warnings);
    if (name === "vector-effect" && value.trim() === "non-scaling-stroke") warnings.add("css.vector-effect");
    if (name === "transform-origin" && element !== "svg") warnings.add("css.transform-origin");
    if (measures.has(name) && /NaN|Infinity|undefined|null/.test(value)) warnings.add("number.unreadable");
    const safe = withoutOutsideUrls(value);
    if (safe.found) warnings.add("reference.outside");
    kept.set(name, safe.text);
  }
  return kept;
}

function noteCss(css: string, warnings: Set<WarningCode>): void {
  if (/var\s*\(/i.test(css)) warnings.add("css.var");
  if (/@media/i.test(css)) warnings.add("css.media");
  if (/!\s*important/i.test(css)) warnings.add("css.important");
  if (/currentcolor/i.test(css)) warnings.add("css.current-color");
  if (/vector-effect\s*:\s*non-scaling-stroke/i.test(css)) warnings.add("css.vector-effect");
  if (/transform-origin\s*:/i.test(css)) warnings.add("css.transform-origin");
  if (/@keyframes|animation(-name)?\s*:/i.test(css)) warnings.add("animation.ignored");
}

function rootSize(attributes: Readonly<Record<string, string>>): GuardedSvg["root"] {
  const { width, height, viewBox, preserveAspectRatio } = attributes;
  return {
    ...(width !== undefined && { width }),
    ...(height !== undefined && { height }),
    ...(viewBox !== undefined && { viewBox }),
    ...(preserveAspectRatio !== undefined && { aspect: preserveAspectRatio }),
  };
}

function splitName(name: string): readonly [string, string] {
  const colon = name.indexOf(":");
  return colon < 0 ? ["", name] : [name.slice(0, colon), name.slice(colon + 1)];
}
