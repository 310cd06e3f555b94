import { z } from "zod";

export const nothing = z.strictObject({});
export const noContent = z.undefined();

/** A shop's name in addresses: /shop/copperlark-signs. */
export const shopSlug = z.string().regex(/^[a-z0-9](?:[a-z0-9-]{0,58}[a-z0-9])?$/);
export const inShop = z.strictObject({ shop: shopSlug });

export const email = z
  .email({ message: "Write an e-mail address, like name@example.com." })
  .max(254)
  .transform((text) => text.toLowerCase());
export const password = z
  .string()
  .min(10, "A password has at least 10 characters.")
  .max(200, "A password has at most 200 characters.");
export const instant = z.iso.datetime();
/** A calendar day of four-digit years that every part of ours can store. */
export const day = z.iso
  .date({ error: "Write a day that exists, like 2031-05-06.", abort: true })
  .refine((text) => text >= "1900", "Write a day after 1900.");
/** The secret part of a mailed or shared link. */
export const token = z.string().regex(/^[A-Za-z0-9_-]{43}$/, "This link is not complete. Open it from the mail again.");
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
/** Controls other than tab and line feed never belong in text that people typed, nor half a surrogate pair. */
const controls = /(?![\t\n])[\p{Cc}\p{Cs}]/u;
export const writtenText = (longest: number) =>
  z
    .string()
    .transform((text) => text.replace(/\r\n?/g, "\n").trim())
    .refine((text) => !controls.test(text), "Remove the control characters.")
    .refine((text) => text.length <= longest, `At most ${longest} characters.`);

export const pageQuery = {
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(30),
};
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.strictObject({ items: z.array(item), next: z.string().nullable() });

/** One line of text, as a name or a title. */
export const writtenLine = (longest: number, whenEmpty: string) =>
  z
    .string()
    .trim()
    .min(1, whenEmpty)
    .max(longest, `At most ${longest} characters.`)
    .refine((text) => !/[\p{Cc}\p{Cs}]/u.test(text), "Remove the control characters.");

export const personName = writtenLine(120, "Write a name.");

/** A length of a sign or a piece in mm, as a form takes it. */
export const lengthMm = z.number().finite().positive("Write a length over 0.").max(10_000, "At most 10 m (32 feet).");
