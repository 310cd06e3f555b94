import { boxContains, boxGrow, boxIntersection } from "../../geometry/box.ts";
import type { Box } from "../../geometry/path.ts";
import type { Matrix } from "../../geometry/transform.ts";
import { artworkLimits } from "../limits.ts";
import { ArtworkRefused } from "../refusals.ts";

/** What is left to paint in: the clip's id, null when there is none, and a box that nothing of it leaves. */
export type Clip = { readonly id: string | null; readonly bounds: Box };

/** A path of a clip or of a painted shape, with the way to the page. */
export type Outline = { readonly data: string; readonly rule: "nonzero" | "evenodd"; readonly matrix: Matrix };

type Sheet = { readonly parts: string[]; key: string };

/** Edges of clips are this much, in points, off the page's own without meaning it. */
const slackPt = 0.05;

/**
 * Collects a page as SVG text. Neighbours with the same clip and mask share a group; the same clip is written once.
 * Throws ArtworkRefused when the page holds more than artwork may.
 */
export class SvgWriter {
  private readonly definitions: string[] = [];
  private readonly known = new Map<string, string>();
  private readonly sheets: Sheet[] = [{ parts: [], key: "" }];
  private ids = 0;
  private paths = 0;
  private length = 0;

  /** Adds an element on the page under a clip and a mask. */
  draw(element: string, { clip, mask }: { clip: Clip; mask: string | null }): void {
    const sheet = this.top();
    const key = `${clip.id === null ? "" : ` clip-path="url(#${clip.id})"`}${mask === null ? "" : ` mask="url(#${mask})"`}`;
    if (key !== sheet.key) {
      closeGroup(sheet);
      if (key !== "") sheet.parts.push(`<g${key}>`);
      sheet.key = key;
    }
    sheet.parts.push(this.counted(element));
  }

  countPath(): void {
    if (++this.paths > artworkLimits.paths) throw new ArtworkRefused("svg.too-many-paths");
  }

  /** Collects what follows apart, until `finishGroup` gives it back. */
  beginGroup(): void {
    this.sheets.push({ parts: [], key: "" });
  }

  finishGroup(): string {
    const sheet = this.sheets.pop();
    if (!sheet || this.sheets.length === 0) throw new Error("A group was finished that was never begun.");
    closeGroup(sheet);
    return sheet.parts.join("");
  }

  /** What is left of a clip within outlines. An upright rectangle that covers all that was left changes nothing. */
  clipTo(clip: Clip, outlines: readonly Outline[], rectangle: Box | null = null): Clip {
    if (rectangle && boxContains(boxGrow(rectangle, slackPt), clip.bounds)) return clip;
    const bounds = rectangle
      ? (boxIntersection(rectangle, clip.bounds) ?? { ...rectangle, width: 0, height: 0 })
      : clip.bounds;
    const inside = outlines.map((outline) => pathElement(outline, `clip-rule="${outline.rule}"`)).join("");
    const outer = clip.id === null ? "" : ` clip-path="url(#${clip.id})"`;
    return { id: this.defined(`clipPath${outer}`, "clipPath", inside), bounds };
  }

  /** A mask of what was drawn in a group, over the whole page. */
  addMask(content: string, { by, page }: { by: "alpha" | "luminance"; page: Box }): string {
    const { x, y, width, height } = boxGrow(page, Math.max(page.width, page.height));
    const frame = `maskUnits="userSpaceOnUse" x="${x}" y="${y}" width="${width}" height="${height}"`;
    return this.defined(`mask ${frame} mask-type="${by}"`, "mask", content);
  }

  /** The whole drawing. Groups that are still open are closed as they stand. */
  finish(root: string): string {
    while (this.sheets.length > 1) {
      const left = this.finishGroup();
      this.top().parts.push(left);
    }
    closeGroup(this.top());
    return `${root}<defs>${this.definitions.join("")}</defs>${this.top().parts.join("")}</svg>`;
  }

  private defined(opening: string, name: string, content: string): string {
    const text = `${opening}>${content}`;
    const known = this.known.get(text);
    if (known !== undefined) return known;
    const id = `d${++this.ids}`;
    this.known.set(text, id);
    this.definitions.push(this.counted(`<${opening} id="${id}">${content}</${name}>`));
    return id;
  }

  private counted(text: string): string {
    this.length += text.length;
    if (this.length > artworkLimits.textBytes) throw new ArtworkRefused("svg.too-many-points");
    return text;
  }

  private top(): Sheet {
    const sheet = this.sheets.at(-1);
    if (!sheet) throw new Error("A drawing has a sheet to draw on.");
    return sheet;
  }
}

/** A path element with attributes beside its outline. */
export function pathElement({ data, matrix }: Pick<Outline, "data" | "matrix">, attributes: string): string {
  const { a, b, c, d, e, f } = matrix;
  const transform = [a, b, c, d, e, f].map((value) => Number(value.toFixed(8))).join(" ");
  return `<path d="${data}" transform="matrix(${transform})" ${attributes}/>`;
}

function closeGroup(sheet: Sheet): void {
  if (sheet.key !== "") sheet.parts.push("</g>");
  sheet.key = "";
}
