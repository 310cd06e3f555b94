import fc from "fast-check";
import { expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { reuseUnchanged } from "#shared/mockup/reuse-unchanged.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

function whole(document: MockupDocument, kernel: Kernel) {
  const figures = computeFigures(document, kernel);
  const findings = runDryFit({ document, figures, limits: defaultLimits, context: usualContext, kernel });
  return { figures, findings };
}

type Edit = (document: MockupDocument, random: number) => void;
const pick = <T>(list: readonly T[], random: number): T | undefined => list[Math.floor(random * list.length)];
const edits: readonly Edit[] = [
  (document, random) => {
    const piece = pick(
      document.layers.flatMap(({ pieces }) => pieces),
      random,
    );
    if (piece) piece.placement.x += (random - 0.5) * 200;
  },
  (document, random) => {
    const piece = pick(
      document.layers.flatMap(({ pieces }) => pieces),
      random,
    );
    if (piece) piece.placement.scale = 0.4 + random;
  },
  (document, random) => {
    const layer = pick(document.layers, random);
    if (layer) layer.thickness = 2 + Math.round(random * 6);
  },
  (document, random) => {
    const layer = pick(document.layers, random);
    if (layer?.hold.kind === "standoff") layer.hold.offset = Math.round(random * 30);
    else layer?.pieces.shift();
  },
  (document) => document.layers.reverse(),
  (document, random) => {
    document.board.width = 300 + random * 400;
  },
];

it("what is remembered gives the same figures and findings as working all out anew, edit by edit", async () => {
  const plain = await loadKernel();
  fc.assert(
    fc.property(
      fc.array(fc.tuple(fc.nat(edits.length - 1), fc.double({ min: 0, max: 0.999, noNaN: true })), {
        minLength: 2,
        maxLength: 4,
      }),
      (steps) => {
        const kernel = rememberingKernel(plain);
        let document = orreryBooks();
        for (const [which, random] of steps) {
          const next = structuredClone(document);
          edits[which]?.(next, random);
          document = reuseUnchanged(document, next);
          kernel.startRun();
          expect(whole(document, kernel)).toEqual(whole(structuredClone(document), plain));
        }
      },
    ),
    { numRuns: 4 },
  );
});
