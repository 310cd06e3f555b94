import type { PageWalk } from "./draw-operations.ts";
import type { GraphicsState } from "./graphics-state.ts";
import { colourOf, isRecord } from "./operands.ts";

/** A transparency group that is being drawn (ISO 32000-1, 11.4.5 and 11.5). */
export type OpenGroup = {
  /** The state it stands in. */
  readonly outside: GraphicsState;
  /** What it masks, when it is a soft mask and not a part of the picture. */
  readonly masks: "alpha" | "luminance" | null;
  /** The colour that lies under a luminance mask. */
  readonly backdrop: string | null;
  hasPicture: boolean;
};

/** Begins a group: what is in it is opaque and unclipped until the group as a whole is painted. */
export function beginGroup(walk: PageWalk, group: Readonly<Record<string, unknown>>): void {
  const smask = isRecord(group.smask) ? group.smask : null;
  const masks = smask ? (smask.subtype === "Luminosity" ? "luminance" : "alpha") : null;
  walk.groups.push({ outside: { ...walk.state }, masks, backdrop: colourOf(smask?.backdrop), hasPicture: false });
  walk.writer.beginGroup();
  walk.state = {
    ...walk.state,
    clip: { id: null, bounds: walk.pageBox },
    mask: null,
    fillAlpha: 1,
    strokeAlpha: 1,
    isBlended: false,
  };
}

/** Paints a group as a whole, or keeps it as a mask. */
export function endGroup(walk: PageWalk): void {
  const group = walk.groups.pop();
  if (!group) return;
  const content = walk.writer.finishGroup();
  walk.state = group.outside;
  if (group.masks) {
    // Without its picture a mask would hide what it was meant to show.
    if (group.hasPicture) walk.warnings.add("pdf.mask-left-out");
    walk.pendingMask = group.hasPicture ? null : maskOf(walk, content, group);
    return;
  }
  if (content === "") return;
  const { fillAlpha, isBlended, clip, mask } = walk.state;
  if (isBlended) walk.warnings.add("blend.ignored");
  const whole = fillAlpha < 1 ? `<g opacity="${Math.max(0, fillAlpha)}">${content}</g>` : content;
  walk.writer.draw(whole, { clip, mask });
}

function maskOf({ writer, pageBox }: PageWalk, content: string, { masks, backdrop }: OpenGroup): string {
  const { x, y, width, height } = pageBox;
  const under =
    masks === "luminance" && backdrop !== null && backdrop !== "#000000"
      ? `<rect x="${x}" y="${y}" width="${width}" height="${height}" fill="${backdrop}"/>`
      : "";
  return writer.addMask(under + content, { by: masks ?? "alpha", page: pageBox });
}
