import { expect } from "vitest";
import { boxesOverlap, boxGrow, boxOfRegion } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import type { NestingRequest, SheetLayout } from "#shared/sheets/nesting.ts";

/** What the kernel's flattened arcs may take from an offset, mm. */
const arcMm = 0.011;

/**
 * Expects a layout to be one that can be cut, from the request and the placements alone and with nothing of the nester:
 * outlines placed anew, grown with the kernel and cut against each other and against the sheet less its margin; every
 * copy either laid once or listed as unplaced; turns and mirroring as allowed.
 */
export function expectSoundLayout(request: NestingRequest, layout: SheetLayout, kernel: Kernel): void {
  const { rules } = request;
  const gap = rules.kerfMm + rules.spacingMm;
  const seen: string[] = [];
  for (const { stockId, region: sheet, placements } of layout.sheets) {
    const stock = request.stock.find(({ id }) => id === stockId);
    const inside = kernel.offset(sheet, arcMm - rules.marginMm, "round");
    const laid = placements.map((placement) => {
      const piece = request.pieces.find(({ id }) => id === placement.pieceId);
      if (!piece || !stock) throw new Error(`Nobody asked for ${placement.pieceId} on ${stockId}.`);
      seen.push(`${placement.pieceId}/${placement.copy}`);
      expect(placement.mirrored && !piece.mayMirror, `${piece.id} is mirrored`).toBe(false);
      if (piece.turns.kind === "steps") {
        const steps = (placement.turn - stock.grainTurn - piece.turns.from) / piece.turns.every;
        expect(Math.abs(steps - Math.round(steps)), `${piece.id} is turned by ${placement.turn}`).toBeLessThan(1e-6);
      }
      const region = placeRegion(kernel.union(flattenPath(piece.path), "evenodd"), { ...placement, scale: 1 });
      return {
        id: `${piece.id}/${placement.copy}`,
        region,
        box: boxOfRegion(region) ?? { x: 0, y: 0, width: 0, height: 0 },
      };
    });
    for (const [index, one] of laid.entries()) {
      expect(kernel.difference(one.region, inside), `${one.id} reaches over its margin`).toEqual([]);
      const grown = kernel.offset(one.region, gap - arcMm, "round");
      for (const other of laid.slice(index + 1)) {
        if (!boxesOverlap(boxGrow(one.box, gap), other.box)) continue;
        const shared = kernel.intersect(grown, other.region);
        expect(shared, `${one.id} and ${other.id} are nearer than ${gap} mm`).toEqual([]);
      }
    }
  }
  expect(new Set(seen).size, "no copy is laid twice").toBe(seen.length);
  for (const { id, quantity } of request.pieces) {
    const placed = seen.filter((copy) => copy.startsWith(`${id}/`)).length;
    const missing = layout.unplaced.find(({ pieceId }) => pieceId === id)?.copies ?? 0;
    expect(placed + missing, `${id} is accounted for`).toBe(quantity);
  }
}
