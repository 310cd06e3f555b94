import type { CostProblem } from "./price-book.ts";

export type MaterialMeasure =
  | { readonly kind: "area"; readonly mm2: number }
  | { readonly kind: "length"; readonly mm: number }
  /** Whole sheets, bars or things. */
  | { readonly kind: "count"; readonly count: number };

/** What goes into a sign, each by the id of its entry in the price book. Areas are mm², lengths mm. */
export type CostQuantities = {
  readonly materials: readonly { readonly id: string; readonly measure: MaterialMeasure }[];
  readonly machining: readonly {
    readonly id: string;
    readonly cutMm: number;
    readonly pocketMm2: number;
    readonly setUps: number;
  }[];
  readonly hardware: readonly { readonly id: string; readonly count: number }[];
  /** Faces bonded and beads laid. */
  readonly adhesives: readonly { readonly id: string; readonly areaMm2: number; readonly beadMm: number }[];
  readonly finishes: readonly { readonly id: string; readonly areaMm2: number; readonly coats: number }[];
  readonly labour: readonly { readonly id: string; readonly count: number }[];
};

/** Nothing at all: the start of a list. */
export const noQuantities: CostQuantities = {
  materials: [],
  machining: [],
  hardware: [],
  adhesives: [],
  finishes: [],
  labour: [],
};

/** A square kilometre, a thousand kilometres, a million things: nothing larger is meant. */
const most = { mm2: 1e12, mm: 1e9, count: 1e6, coats: 50 } as const;
const units = { mm2: "mm²", mm: "mm", count: "", coats: "coats" } as const;

/** Every quantity that is no number, below 0 or out of all reason; `where` starts each field's name. */
export function checkQuantities(quantities: CostQuantities, where: string): CostProblem[] {
  const problems: CostProblem[] = [];
  const check = (field: string, value: number, kind: keyof typeof most) => {
    const words = quantityProblem(value, most[kind], units[kind]);
    if (words !== null) problems.push({ field: `${where}.${field}`, words });
  };
  for (const [index, { measure }] of quantities.materials.entries()) {
    const field = `materials.${index}.measure`;
    if (measure.kind === "area") check(field, measure.mm2, "mm2");
    else if (measure.kind === "length") check(field, measure.mm, "mm");
    else check(field, measure.count, "count");
  }
  for (const [index, { cutMm, pocketMm2, setUps }] of quantities.machining.entries()) {
    check(`machining.${index}.cutMm`, cutMm, "mm");
    check(`machining.${index}.pocketMm2`, pocketMm2, "mm2");
    check(`machining.${index}.setUps`, setUps, "count");
  }
  for (const [index, { count }] of quantities.hardware.entries()) check(`hardware.${index}.count`, count, "count");
  for (const [index, { areaMm2, beadMm }] of quantities.adhesives.entries()) {
    check(`adhesives.${index}.areaMm2`, areaMm2, "mm2");
    check(`adhesives.${index}.beadMm`, beadMm, "mm");
  }
  for (const [index, { areaMm2, coats }] of quantities.finishes.entries()) {
    check(`finishes.${index}.areaMm2`, areaMm2, "mm2");
    check(`finishes.${index}.coats`, coats, "coats");
  }
  for (const [index, { count }] of quantities.labour.entries()) check(`labour.${index}.count`, count, "count");
  return problems;
}

function quantityProblem(value: number, most: number, unit: string): string | null {
  if (!Number.isFinite(value)) return "This quantity must be a number.";
  if (value < 0) return "This quantity can't be below 0.";
  return value > most ? `This quantity is more than ${most} ${unit}`.trim().concat(", which can't be meant.") : null;
}
