import type { DisplayList } from "#shared/drawing/display-list.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import type { Mend } from "#shared/dry-fit/mend.ts";
import type { DryFitContext } from "#shared/dry-fit/rule.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";

/** What a picture is made of. */
export type PictureInput = {
  readonly document: MockupDocument;
  readonly context: DryFitContext;
  readonly limits: Limits;
  /** Millimetres of the sign to one on paper: sizes lettering and lines for the window. */
  readonly paperScale: number;
  /** Dimension lines around the board, or the sign alone. */
  readonly dimensions: boolean;
  /** Under a hand that drags only figures are wanted: they take a small part of the time. */
  readonly what: "all" | "figures";
};

/** `fine` is the number of rules that found nothing; `mends` stand in the order of the findings. */
export type DryFit = {
  readonly findings: readonly Finding[];
  readonly mends: readonly (readonly Mend[])[];
  readonly fine: number;
};

export type Picture = {
  readonly figures: Figures;
  /** What else was wanted. */
  readonly drawing: { readonly elevation: DisplayList; readonly dryFit: DryFit } | null;
};

export type PictureOutcome =
  | { readonly ok: true; readonly picture: Picture }
  | { readonly ok: false; readonly reason: string };

export type PictureRequest = PictureInput & { readonly sequence: number };
export type PictureAnswer = { readonly sequence: number; readonly outcome: PictureOutcome };
export type PictureResult = { readonly input: PictureInput; readonly outcome: PictureOutcome };
