import { artworkLimits } from "./limits.ts";
import { ArtworkRefused } from "./refusals.ts";

/** Counts what a drawing costs while it is worked out. Each method throws ArtworkRefused when its limit is passed. */
export class ArtworkBudget {
  private paths = 0;
  private vertices = 0;
  private dashes = 0;

  countPath(): void {
    if (++this.paths > artworkLimits.paths) throw new ArtworkRefused("svg.too-many-paths");
  }

  countVertices(count: number): void {
    this.vertices += count;
    if (this.vertices > artworkLimits.vertices) throw new ArtworkRefused("svg.too-many-points");
  }

  countDashes(count: number): void {
    this.dashes += count;
    if (!(this.dashes <= artworkLimits.dashes)) throw new ArtworkRefused("svg.too-many-dashes");
  }
}
