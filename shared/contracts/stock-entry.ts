import { z } from "zod";
import { checkHardware } from "../hardware/check-hardware.ts";
import { checkScrew } from "../materials/check-screw.ts";
import { checkSheets, checkThicknesses } from "../materials/check-sheets.ts";
import type { StockFault } from "../materials/stock-fault.ts";
import { blindStudSchema, capStudSchema, edgeGripSchema, throughScrewSchema } from "../mockup/hardware-schemas.ts";
import { acrylicSchema, adhesiveSchema, screwSchema, woodSchema } from "../mockup/stock-schemas.ts";
import type { LengthUnit } from "../units/length.ts";
import { lengthMm, writtenLine } from "./common.ts";

export const stockKind = z.enum(["acrylic", "wood", "hardware", "screw", "adhesive"]);
export type StockKind = z.infer<typeof stockKind>;

const name = writtenLine(120, "Write a name.");
const colour = z
  .string()
  .trim()
  .transform((text) => text.toUpperCase())
  .refine((text) => /^#[0-9A-F]{6}$/.test(text), "Write a colour as # and six hexadecimal digits, like #27314F.");
/** As many of a thing as anybody counts; null until somebody did. */
export const quantityOnHand = z.int().min(0, "At least 0.").max(1_000_000, "At most 1 000 000.").nullable();

export const sheetsOnHandSchema = z.strictObject({
  thicknessMm: z.number(),
  widthMm: lengthMm,
  heightMm: lengthMm,
  quantity: quantityOnHand,
});
const thicknessesMm = z
  .array(z.number())
  .max(60)
  .transform((all) => all.toSorted((a, b) => a - b));

const entry = z.discriminatedUnion("kind", [
  z.strictObject({
    kind: z.literal("acrylic"),
    acrylic: acrylicSchema
      .omit({ kind: true, stockId: true })
      .extend({ name, colour, densityKgM3: z.number().min(100, "At least 100.").max(25_000, "At most 25 000.") }),
    thicknessesMm,
    sheets: z.array(sheetsOnHandSchema).max(200),
  }),
  z.strictObject({
    kind: z.literal("wood"),
    wood: woodSchema.omit({ kind: true, stockId: true }).extend({
      name,
      colour,
      gravity: z.number().min(0.08, "At least 0.08.").max(1.5, "At most 1.5."),
    }),
    thicknessesMm,
  }),
  z.strictObject({
    kind: z.literal("hardware"),
    hardware: z.discriminatedUnion("kind", [
      capStudSchema.omit({ stockId: true }).extend({ name, finish: colour }),
      throughScrewSchema.omit({ stockId: true }).extend({ name, finish: colour }),
      blindStudSchema.omit({ stockId: true }).extend({ name, finish: colour }),
      edgeGripSchema.omit({ stockId: true }).extend({ name, finish: colour }),
    ]),
    quantity: quantityOnHand,
  }),
  z.strictObject({ kind: z.literal("screw"), screw: screwSchema.extend({ name }), quantity: quantityOnHand }),
  z.strictObject({ kind: z.literal("adhesive"), adhesive: adhesiveSchema.omit({ stockId: true }).extend({ name }) }),
]);

/** One thing of the stock list as a shop writes it. */
export type StockEntry = z.output<typeof entry>;

/** An entry whose fields agree with each other; what does not is said in words, with lengths in `unit`. */
export const stockEntryIn = (unit: LengthUnit) =>
  entry.superRefine((written, context) => {
    for (const { path, detail } of faultsOf(written, unit))
      context.addIssue({ code: "custom", path: [...path], message: detail });
  });

function faultsOf(written: StockEntry, unit: LengthUnit): StockFault[] {
  switch (written.kind) {
    case "acrylic":
      return [
        ...within("thicknessesMm", checkThicknesses(written.thicknessesMm, unit)),
        ...within("sheets", checkSheets(written.sheets, written.thicknessesMm, unit)),
      ];
    case "wood":
      return within("thicknessesMm", checkThicknesses(written.thicknessesMm, unit));
    case "hardware":
      return within("hardware", checkHardware({ ...written.hardware, stockId: null }, unit));
    case "screw":
      return within("screw", checkScrew(written.screw, unit));
    case "adhesive":
      return [];
  }
}

const within = (field: string, faults: readonly StockFault[]): StockFault[] =>
  faults.map(({ path, detail }) => ({ path: [field, ...path], detail }));

/** The material or part that an entry is about. */
export function nameOfEntry(written: StockEntry): string {
  switch (written.kind) {
    case "acrylic":
      return written.acrylic.name;
    case "wood":
      return written.wood.name;
    case "hardware":
      return written.hardware.name;
    case "screw":
      return written.screw.name;
    case "adhesive":
      return written.adhesive.name;
  }
}
