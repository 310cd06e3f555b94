import type { DisplayList, Font, Item, Stroke } from "./display-list.ts";
import { lineData, mmText, pathData } from "./path-data.ts";

/** An SVG element before it becomes text or a React element. Attribute names are SVG's own. */
export type SvgNode = {
  readonly tag: "svg" | "g" | "path" | "text" | "image" | "clipPath";
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly SvgNode[];
  /** What a text element reads. */
  readonly text?: string;
};

export type SvgOptions = {
  /** Starts every id in the picture, so that two pictures on one page don't share clips. */
  readonly idPrefix: string;
  /** What the picture shows, read aloud in its place. */
  readonly title?: string;
};

const families: Readonly<Record<Font, { readonly family: string; readonly weight: string }>> = {
  serif: { family: "Merriweather, Georgia, serif", weight: "400" },
  "serif-bold": { family: "Merriweather, Georgia, serif", weight: "700" },
  "serif-black": { family: "Merriweather, Georgia, serif", weight: "900" },
  sans: { family: "'Merriweather Sans', Verdana, sans-serif", weight: "400" },
  "sans-semibold": { family: "'Merriweather Sans', Verdana, sans-serif", weight: "600" },
};

const anchors = { left: "start", middle: "middle", right: "end" } as const;

function strokeAttributes(stroke: Stroke): Record<string, string> {
  return {
    stroke: stroke.colour,
    "stroke-width": mmText(stroke.widthMm),
    "stroke-linejoin": "round",
    ...(stroke.cap === "round" ? { "stroke-linecap": "round" } : {}),
    ...(stroke.dashMm === undefined ? {} : { "stroke-dasharray": stroke.dashMm.map(mmText).join(" ") }),
  };
}

/** Fill and line let through one after the other, as the other painters do it, not as one picture. */
function pathOpacity(opacity: number): Record<string, string> {
  return { "fill-opacity": mmText(opacity), "stroke-opacity": mmText(opacity) };
}

/** Turns a display list into SVG elements, 1 user unit a millimetre. Ids of items become `data-id`. */
export function svgTree(list: DisplayList, { idPrefix, title }: SvgOptions): SvgNode {
  let clips = 0;

  function nodeOfItem(item: Item): SvgNode[] {
    // What has no name lets a touch through to what lies under it: a shadow must not hide its piece.
    const unnamed: Record<string, string> =
      item.kind === "clip" || item.kind === "group" ? {} : { "pointer-events": "none" };
    const id: Record<string, string> = "id" in item && item.id !== undefined ? { "data-id": item.id } : unnamed;
    switch (item.kind) {
      case "path":
        return [
          {
            tag: "path",
            attributes: {
              ...id,
              d: pathData(item.path),
              fill: item.fill ?? "none",
              "fill-rule": "evenodd",
              ...(item.stroke === undefined ? {} : strokeAttributes(item.stroke)),
              ...(item.opacity === undefined ? {} : pathOpacity(item.opacity)),
            },
            children: [],
          },
        ];
      case "line":
        return [
          {
            tag: "path",
            attributes: { ...id, d: lineData(item.points), fill: "none", ...strokeAttributes(item.stroke) },
            children: [],
          },
        ];
      case "text": {
        const { family, weight } = families[item.font];
        const turn: Record<string, string> =
          item.turn === undefined || item.turn === 0
            ? {}
            : { transform: `rotate(${mmText(item.turn)} ${mmText(item.at.x)} ${mmText(item.at.y)})` };
        return [
          {
            tag: "text",
            attributes: {
              ...id,
              x: mmText(item.at.x),
              y: mmText(item.at.y),
              "font-family": family,
              "font-weight": weight,
              "font-size": mmText(item.sizeMm),
              "font-variant": "tabular-nums",
              fill: item.colour,
              "text-anchor": anchors[item.align],
              ...turn,
            },
            children: [],
            text: item.text,
          },
        ];
      }
      case "image":
        return [
          {
            tag: "image",
            attributes: {
              ...id,
              x: mmText(item.box.x),
              y: mmText(item.box.y),
              width: mmText(item.box.width),
              height: mmText(item.box.height),
              preserveAspectRatio: "none",
              href: `data:image/png;base64,${item.pngBase64}`,
              ...(item.opacity === undefined ? {} : { opacity: mmText(item.opacity) }),
            },
            children: [],
          },
        ];
      case "clip": {
        clips += 1;
        const clipId = `${idPrefix}clip${clips}`;
        return [
          {
            tag: "clipPath",
            attributes: { id: clipId },
            children: [{ tag: "path", attributes: { d: pathData(item.clip), "clip-rule": "evenodd" }, children: [] }],
          },
          {
            tag: "g",
            attributes: { "clip-path": `url(#${clipId})` },
            children: item.items.flatMap(nodeOfItem),
          },
        ];
      }
      case "group":
        return [
          {
            tag: "g",
            attributes: {
              ...id,
              transform: `translate(${mmText(item.x)} ${mmText(item.y)}) scale(${String(item.scale)})`,
            },
            children: item.items.flatMap(nodeOfItem),
          },
        ];
    }
  }

  return {
    tag: "svg",
    attributes: {
      xmlns: "http://www.w3.org/2000/svg",
      viewBox: `0 0 ${mmText(list.widthMm)} ${mmText(list.heightMm)}`,
      width: `${mmText(list.widthMm)}mm`,
      height: `${mmText(list.heightMm)}mm`,
      ...(title === undefined ? {} : { role: "img", "aria-label": title }),
    },
    children: list.items.flatMap(nodeOfItem),
  };
}

const escapes: Readonly<Record<string, string>> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};

/** Text that XML 1.0 can hold: marks escaped, control characters it forbids replaced by a visible mark. */
function escapeXml(text: string): string {
  const allowed = [...text].map((character) => {
    const code = character.codePointAt(0) ?? 0;
    const forbidden =
      (code < 0x20 && code !== 0x9 && code !== 0xa && code !== 0xd) ||
      (code >= 0xd800 && code <= 0xdfff) ||
      code === 0xfffe ||
      code === 0xffff;
    return forbidden ? "\ufffd" : character;
  });
  return allowed.join("").replace(/[&<>"']/g, (mark) => escapes[mark] ?? mark);
}

function svgText(node: SvgNode): string {
  const attributes = Object.entries(node.attributes).map(([name, value]) => ` ${name}="${escapeXml(value)}"`);
  const inside = node.children.map(svgText).join("") + (node.text === undefined ? "" : escapeXml(node.text));
  return inside === ""
    ? `<${node.tag}${attributes.join("")}/>`
    : `<${node.tag}${attributes.join("")}>${inside}</${node.tag}>`;
}

/** A whole SVG document of a display list, measured in millimetres. Same list, same text. */
export function paintSvg(list: DisplayList, options: SvgOptions = { idPrefix: "" }): string {
  return svgText(svgTree(list, options));
}
