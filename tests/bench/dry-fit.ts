import { loadKernel } from "#server/artwork/load-kernel.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { reuseUnchanged } from "#shared/mockup/reuse-unchanged.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { type Measure, summarise, timed } from "../support/benchmark.ts";
import { largeSign } from "../support/large-sign.ts";

function check(document: MockupDocument, kernel: Kernel): void {
  const figures = computeFigures(document, kernel);
  runDryFit({ document, figures, limits: defaultLimits, context: usualContext, kernel });
}

/** The document as it comes over a worker's border after one piece was moved. */
function withOneMoved(document: MockupDocument, step: number): MockupDocument {
  const copy = structuredClone(document);
  const pieces = copy.layers.flatMap((layer) => layer.pieces);
  const piece = pieces[1 + (step % (pieces.length - 1))];
  if (piece) piece.placement.x += step % 2 === 0 ? 0.5 : -0.5;
  return copy;
}

/**
 * The whole dry fit of a sign of 300 pieces and 20,000 nodes, and what one moved piece costs, as the engine's worker does
 * both; against one union of the same outlines.
 */
export const measure: Measure = async () => {
  const plain = await loadKernel();
  const sign = largeSign();
  const rings = sign.layers.flatMap(({ pieces }) =>
    pieces.flatMap(({ path, placement }) => flattenPath(placePath(path, placement))),
  );
  const union = await timed("union of 300 outlines of 20,000 nodes", () => plain.union(rings, "nonzero"));
  const full = await timed("dry fit of them, all of it", () => check(sign, plain), { iterations: 5 });

  const kernel = rememberingKernel(plain);
  let document = sign;
  let step = 0;
  const move = () => {
    const next = reuseUnchanged(document, withOneMoved(document, step));
    step += 1;
    document = next;
    kernel.startRun();
    check(document, kernel);
  };
  move();
  const moved = await timed("dry fit after one piece moved", move);
  const copy = await timed("handing the document to the worker", () => structuredClone(document));
  const over = (name: string, median: number) => summarise(name, "× union", [median / union.median]);
  return [
    union,
    full,
    moved,
    copy,
    over("  all of it over one union", full.median),
    over("  one moved over one union", moved.median),
  ];
};
