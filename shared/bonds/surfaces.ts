import type { Acrylic, Coat } from "../mockup/document.ts";
import type { Surface } from "./adhesive-families.ts";

/**
 * What the back of a sheet is to an adhesive. A mirror has its coat there, and so has a sheet whose faces differ for
 * another reason than being frosted: it is painted. Common practice.
 */
export function backSurface({ look, facesDiffer }: Pick<Acrylic, "look" | "facesDiffer">): Surface {
  return look === "mirror" || (facesDiffer && look !== "frosted") ? "coated back" : "acrylic";
}

/** What the face of wood is to an adhesive: anything that was put on it closes it, sanding leaves it raw. Common practice. */
export function woodSurface(finish: readonly Coat[]): Surface {
  return finish.some((coat) => coat.kind !== "sanding") ? "finished wood" : "raw wood";
}
