import type { Brief } from "#shared/contracts/jobs.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";

type Asked = Pick<Brief, "widthMm" | "heightMm" | "quantity">;

/**
 * Where the mockup is not what the brief asks for, a sentence each. What the brief does not say is not compared, and
 * lengths that read alike in the shop's unit are alike. Of a framed sign whose measures mean overall, the frame counts.
 */
export function againstBrief(
  { widthMm, heightMm, quantity }: Asked,
  document: Pick<MockupDocument, "board" | "frame" | "quantity">,
  unit: LengthUnit,
): string[] {
  const { board, frame } = document;
  const isFramed = frame !== null && board.measures === "overall";
  const { width, height } = isFramed ? signBox(document) : board;
  const of = isFramed ? "the sign with its frame" : "the board";
  return [
    ...lengthAgainst({ what: "wide", asked: widthMm, is: width, of, unit }),
    ...lengthAgainst({ what: "high", asked: heightMm, is: height, of, unit }),
    ...(quantity === document.quantity
      ? []
      : [`The brief asks for ${quantity} of this sign, the mockup is for ${document.quantity}.`]),
  ];
}

type LengthAsked = {
  readonly what: string;
  readonly asked: number | null;
  readonly is: number;
  readonly of: string;
  readonly unit: LengthUnit;
};

function lengthAgainst({ what, asked: askedMm, is: isMm, of, unit }: LengthAsked): string[] {
  if (askedMm === null) return [];
  const asked = formatLengthWithUnit(askedMm, unit);
  const is = formatLengthWithUnit(isMm, unit);
  return asked === is ? [] : [`The brief asks for ${asked} ${what}, ${of} is ${is} ${what}.`];
}
