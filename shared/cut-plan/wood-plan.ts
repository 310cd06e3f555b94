import type { Limits } from "../dry-fit/limits.ts";
import { frameRefusalWords } from "../frame/frame-words.ts";
import type { Frame } from "../frame/lay-out-frame.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { BradMap } from "../slats/brad-map.ts";
import { type GlueArea, glueArea } from "../slats/glue-area.ts";
import { type SawSetting, sawSettings } from "../slats/saw-settings.ts";
import type { SlatLayout } from "../slats/slat-layout.ts";
import { slatRefusalWords } from "../slats/slat-words.ts";
import { frameOf, slatsOf } from "../stack/backer.ts";
import { bradsOf } from "../stack/brads-of.ts";
import type { LengthUnit } from "../units/length.ts";

/** What can be made, or in words what must be changed first. */
export type Planned<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly words: string };

export type SlatPlan = {
  readonly layout: SlatLayout;
  readonly settings: readonly SawSetting[];
  readonly brads: Planned<BradMap>;
  /** Null when the layout covers nothing. */
  readonly glue: GlueArea | null;
};

/** Slats and frame of a sign as the workshop lays them; null for what it has not. */
export type WoodPlan = { readonly slats: Planned<SlatPlan> | null; readonly frame: Planned<Frame> | null };

/** Works out slats with their brads and glue, and the frame. What can't be made says in words what to change. */
export function woodPlan({
  document,
  limits,
  unit,
  kernel,
}: {
  readonly document: MockupDocument;
  readonly limits: Limits;
  readonly unit: LengthUnit;
  readonly kernel: Kernel;
}): WoodPlan {
  const slats = slatsOf(document, kernel);
  const frame = frameOf(document, kernel);
  return {
    slats:
      slats &&
      (slats.ok
        ? { ok: true, value: slatPlan(document, slats.value, limits, unit, kernel) }
        : { ok: false, words: slatRefusalWords(slats.reason, unit) }),
    frame: frame && (frame.ok ? frame : { ok: false, words: frameRefusalWords(frame.reason, unit) }),
  };
}

function slatPlan(
  document: MockupDocument,
  layout: SlatLayout,
  { bradTrimMm: trim, footBradMm: barrel }: Limits,
  unit: LengthUnit,
  kernel: Kernel,
): SlatPlan {
  const brads = bradsOf(document, layout, { trim, barrel }, kernel);
  const glue = glueArea(layout);
  return {
    layout,
    settings: sawSettings(layout.slats),
    brads: brads.ok ? brads : { ok: false, words: slatRefusalWords(brads.reason, unit) },
    glue: glue.ok ? glue.value : null,
  };
}
