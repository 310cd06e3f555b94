import type { BarTask } from "#shared/cut-plan/bar-tasks.ts";
import type { SheetTask } from "#shared/cut-plan/sheet-tasks.ts";
import type { ShopSaws } from "#shared/cut-plan/shop-saws.ts";
import type { WoodPlan } from "#shared/cut-plan/wood-plan.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import type { Stock } from "#shared/materials/stock.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { SheetLayout } from "#shared/sheets/nesting.ts";
import type { CuttingPlan } from "#shared/stock-lengths/plan-cutting.ts";
import type { LengthUnit } from "#shared/units/length.ts";

/** What a cut plan is made of. */
export type PlanInput = {
  readonly document: MockupDocument;
  readonly stock: Stock;
  readonly limits: Limits;
  readonly saws: ShopSaws;
  readonly unit: LengthUnit;
};

/** All that is to be cut, and the wood as it is laid. */
export type Work = {
  readonly sheets: readonly SheetTask[];
  readonly bars: readonly BarTask[];
  readonly wood: WoodPlan;
};

/** How the search for a layout ended: by itself, by the clock, or because somebody asked. */
export type Ended = "searched" | "by the clock" | "asked";

export type SheetsLaid = {
  readonly layout: SheetLayout;
  /** What the counted sheets are too few for, on sheets to be bought; null when they suffice. */
  readonly bought: SheetLayout | null;
};

/** What comes out of a task, or why it can't be done. */
export type TaskOutcome<T> =
  | { readonly ok: true; readonly value: T; readonly ended: Ended }
  | { readonly ok: false; readonly words: string };

/** `quick` asks for the first good layout alone. */
export type PlanRequest =
  | { readonly kind: "read"; readonly input: PlanInput }
  | { readonly kind: "sheets"; readonly task: SheetTask; readonly quick: boolean }
  | { readonly kind: "bars"; readonly task: BarTask; readonly quick: boolean };

export type PlanAnswer =
  | { readonly kind: "read"; readonly work: Work }
  /** Now and then while sheets are searched: the best layout so far comes along. */
  | { readonly kind: "progress"; readonly done: number; readonly best: SheetsLaid }
  | { readonly kind: "sheets"; readonly outcome: TaskOutcome<SheetsLaid> }
  | { readonly kind: "bars"; readonly outcome: TaskOutcome<CuttingPlan> }
  /** A fault of ours: `reason` is only of use to us. */
  | { readonly kind: "broken"; readonly reason: string };
