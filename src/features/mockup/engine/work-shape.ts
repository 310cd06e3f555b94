import type { Kernel } from "#shared/geometry/kernel.ts";
import { type CutPiece, cutAway } from "#shared/shaping/cut-away.ts";
import { type Joined, joinOutlines, type Named } from "#shared/shaping/join-outlines.ts";
import { type LooseBelow, looseBits, type WithoutBits } from "#shared/shaping/loose-bits.ts";
import { type MarginChoice, type MarginPlate, marginPlate } from "#shared/shaping/margin-plate.ts";
import type { Outline } from "#shared/shaping/shaped.ts";
import { type Bed, type Split, type SplitChoice, splitToBed } from "#shared/shaping/split-to-bed.ts";

/** What is to be made of pieces. */
export type ShapeTask =
  | { readonly kind: "margin"; readonly outlines: readonly Outline[]; readonly choice: MarginChoice }
  | { readonly kind: "join"; readonly outlines: readonly Named<Outline>[] }
  | {
      readonly kind: "cut away";
      readonly outlines: readonly Named<Outline>[];
      readonly by: readonly Outline[];
      readonly roomMm: number;
    }
  | { readonly kind: "loose bits"; readonly outlines: readonly Named<Outline>[]; readonly below: LooseBelow }
  | { readonly kind: "split"; readonly outline: Outline; readonly bed: Bed; readonly choice: SplitChoice };

/** What was made of them. */
export type ShapeMade =
  | { readonly kind: "margin"; readonly made: MarginPlate | null }
  | { readonly kind: "join"; readonly made: readonly Joined[] }
  | { readonly kind: "cut away"; readonly made: readonly CutPiece[] }
  | { readonly kind: "loose bits"; readonly made: readonly WithoutBits[] }
  | { readonly kind: "split"; readonly made: Split | null };

export function workShape(task: ShapeTask, kernel: Kernel): ShapeMade {
  switch (task.kind) {
    case "margin":
      return { kind: "margin", made: marginPlate(task.outlines, task.choice, kernel) };
    case "join":
      return { kind: "join", made: joinOutlines(task.outlines, kernel) };
    case "cut away":
      return { kind: "cut away", made: cutAway(task.outlines, task, kernel) };
    case "loose bits":
      return { kind: "loose bits", made: looseBits(task.outlines, task.below, kernel) };
    case "split":
      return { kind: "split", made: splitToBed(task.outline, task.bed, task.choice, kernel) };
  }
}
