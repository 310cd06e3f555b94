import type { Brief } from "#shared/contracts/jobs.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";

type Asked = Pick<Brief, "widthMm" | "heightMm" | "quantity">;

/**
 * Where the mockup is not what the brief asks for, a sentence each. What the brief does not say is not compared, and
 * lengths that read alike in the shop's unit are alike.
 */
export function againstBrief(
  { widthMm, heightMm, quantity }: Asked,
  document: Pick<MockupDocument, "board" | "quantity">,
  unit: LengthUnit,
): string[] {
  const { width, height } = document.board;
  return [
    ...lengthAgainst({ what: "wide", asked: widthMm, is: width, unit }),
    ...lengthAgainst({ what: "high", asked: heightMm, is: height, unit }),
    ...(quantity === document.quantity
      ? []
      : [`The brief asks for ${quantity} of this sign, the mockup is for ${document.quantity}.`]),
  ];
}

function lengthAgainst(of: { what: string; asked: number | null; is: number; unit: LengthUnit }): string[] {
  if (of.asked === null) return [];
  const asked = formatLengthWithUnit(of.asked, of.unit);
  const is = formatLengthWithUnit(of.is, of.unit);
  return asked === is ? [] : [`The brief asks for ${asked} ${of.what}, the board is ${is} ${of.what}.`];
}
