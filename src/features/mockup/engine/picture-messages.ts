import type { SignMeasures } from "#shared/cost/measure-sign.ts";
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

/** `fine` is the number of rules that found nothing. */
export type DryFit = { readonly findings: readonly Finding[]; readonly fine: number };

/** What mends each finding of a dry fit, in their order; shorter while the rest is still being worked out. */
export type Mends = readonly (readonly Mend[])[];

export type Picture = {
  readonly figures: Figures;
  /** What else was wanted. */
  readonly drawing: {
    readonly elevation: DisplayList;
    readonly dryFit: DryFit;
    /** What goes into a sign, to be priced by those who may see prices. */
    readonly measures: SignMeasures;
  } | null;
};

export type PictureOutcome =
  | { readonly ok: true; readonly picture: Picture }
  | { readonly ok: false; readonly reason: string };

export type PictureRequest = PictureInput & { readonly sequence: number };
/** First the picture, then, when nothing newer was asked, what would mend its findings. */
export type PictureAnswer =
  | { readonly sequence: number; readonly outcome: PictureOutcome }
  | { readonly sequence: number; readonly mends: MendsOutcome };

export type MendsOutcome =
  | { readonly ok: true; readonly list: Mends }
  | { readonly ok: false; readonly reason: string };
export type PictureResult = { readonly input: PictureInput; readonly outcome: PictureOutcome };
