import { z } from "zod";
import { idOf, line } from "../mockup/schema-parts.ts";
import { currencyDigits } from "./currency.ts";
import { mostPrice } from "./money.ts";

const price = z
  .number("A price must be a number.")
  .int("A price is given in whole minor units, as cents.")
  .min(0, "A price can't be below 0.")
  .max(mostPrice, "A price this high can't be right: look for a slip in its digits.");

const share = (most: number, what: string) =>
  z
    .number(`${what} must be a number: 0.15 for 15 %.`)
    .min(0, `${what} can't be below 0.`)
    .max(most, `${what} is a share, 0.15 for 15 %; ${most} at most.`);

const pace = (what: string) =>
  z
    .number(`${what} must be a number.`)
    .min(0.01, `${what} must be above 0.`)
    .max(1e9, `${what} is too high to be right.`);

const minutes = (what: string) =>
  z.number(`${what} must be a number.`).min(0, `${what} can't be below 0.`).max(10_000, `${what}: a week is too long.`);

const entry = {
  id: idOf(200),
  name: line.min(1, "Every entry needs a name."),
};

/** What an adhesive is counted in: a liquid's volume, a paste's mass, a tape's area. */
export const adhesiveUnits = ["ml", "g", "cm²"] as const;
export type AdhesiveUnit = (typeof adhesiveUnits)[number];

/** How a material is bought: what one price is for. */
export const materialUnits = ["m²", "ft²", "m", "ft", "sheet", "bar", "each"] as const;
export type MaterialUnit = (typeof materialUnits)[number];

const list = <T extends { id: string }>(schema: z.ZodType<T>) =>
  z
    .array(schema)
    .max(500, "A price book holds 500 entries of a kind.")
    .superRefine((entries, context) => {
      const seen = new Set<string>();
      for (const [index, { id }] of entries.entries()) {
        if (seen.has(id)) context.addIssue({ code: "custom", path: [index, "id"], message: `“${id}” is there twice.` });
        seen.add(id);
      }
    });

/**
 * What a shop pays and asks. Prices are whole minor units of one currency; shares are 0.15 for 15 %. Nothing in it is
 * ever shown to a client.
 */
export const priceBookSchema = z.strictObject({
  version: z.literal(1),
  currency: z
    .string()
    .refine(
      (code) => currencyDigits(code) !== null,
      "This isn't the code of a currency: three capitals, as EUR or USD.",
    ),
  /** `waste` is added to areas and lengths; whole sheets and bars have it in them already. */
  materials: list(z.strictObject({ ...entry, unit: z.enum(materialUnits), price, waste: share(5, "Waste") })),
  machines: list(
    z.strictObject({
      ...entry,
      perHour: price,
      cutMmPerMinute: pace("The cutting pace"),
      pocketMm2PerMinute: pace("The pocketing pace"),
      setUpMinutes: minutes("The time to set up"),
    }),
  ),
  /** Price of a pack; one of it is charged in proportion. */
  hardware: list(
    z.strictObject({
      ...entry,
      price,
      pack: z
        .number("A pack holds a number of things.")
        .int("A pack holds whole things.")
        .min(1, "A pack holds at least 1.")
        .max(100_000, "A pack holds 100,000 at most."),
    }),
  ),
  /** Price of a container, and what is spread over an area or laid as a bead; all counted in `unit` where it isn't ml. */
  adhesives: list(
    z.strictObject({
      ...entry,
      price,
      unit: z.enum(adhesiveUnits).optional(),
      containerMl: z
        .number("What a container holds must be a number.")
        .int("What a container holds is a whole number.")
        .min(1, "A container holds at least 1.")
        .max(1_000_000, "A container holds 1 000 000 at most."),
      mlPerM2: z.number("The spread must be a number.").min(0, "The spread can't be below 0.").max(100_000),
      mlPerM: z.number("The bead must be a number.").min(0, "The bead can't be below 0.").max(100_000),
    }),
  ),
  /** Price and time for a square metre of one coat. */
  finishes: list(
    z.strictObject({ ...entry, pricePerM2: price, minutesPerM2: minutes("The time for a coat"), perHour: price }),
  ),
  /** Work by piece, by slat, by sign or by whatever is counted. */
  labour: list(z.strictObject({ ...entry, perHour: price, minutesEach: minutes("The time for one") })),
  markup: share(10, "Markup"),
  tax: z.strictObject({ name: line.min(1).max(40), share: share(1, "Tax") }),
});

export type PriceBook = z.infer<typeof priceBookSchema>;

/** What keeps a price book or an estimate from being used: where, as "materials.2.price", and why. */
export type CostProblem = { readonly field: string; readonly words: string };

export type PriceBookOutcome =
  | { readonly ok: true; readonly value: PriceBook }
  | { readonly ok: false; readonly problems: readonly CostProblem[] };

/** A price book from data of any kind, or every fault that it has. */
export function parsePriceBook(data: unknown): PriceBookOutcome {
  const parsed = priceBookSchema.safeParse(data);
  if (parsed.success) return { ok: true, value: parsed.data };
  return {
    ok: false,
    problems: parsed.error.issues.map(({ path, message }) => ({ field: path.join("."), words: message })),
  };
}
