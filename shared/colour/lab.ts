import {
  converter,
  differenceCiede2000,
  formatHex,
  modeLab65,
  modeRgb,
  modeXyz65,
  useMode as registerMode,
} from "culori/fn";

registerMode(modeRgb);
registerMode(modeXyz65);
registerMode(modeLab65);
const toLab65 = converter("lab65");
const difference = differenceCiede2000();

/** CIELAB under D65 with the 2-degree observer, the white that sRGB itself has. */
export type Lab = { readonly L: number; readonly a: number; readonly b: number };

/** An sRGB colour written #RRGGBB as CIELAB (IEC 61966-2-1, CIE 15). Throws a RangeError for any other text. */
export function labOf(colour: string): Lab {
  const lab = /^#[0-9a-f]{6}$/i.test(colour) ? toLab65(colour) : undefined;
  if (!lab) throw new RangeError(`${colour} is no colour of the form #RRGGBB.`);
  return { L: lab.l, a: lab.a, b: lab.b };
}

/** A CIELAB colour as sRGB, #RRGGBB in capitals; one that a screen can't show is taken to the nearest channel by channel. */
export function colourOf({ L, a, b }: Lab): string {
  return formatHex({ mode: "lab65", l: L, a, b }).toUpperCase();
}

/**
 * Colour difference ΔE00 between two CIELAB colours (Sharma, Wu, Dalal, Color Research and Application 30(1), 2005),
 * with kL = kC = kH = 1. The same in both orders.
 */
export function deltaE00(one: Lab, other: Lab): number {
  return difference(
    { mode: "lab65", l: one.L, a: one.a, b: one.b },
    { mode: "lab65", l: other.L, a: other.a, b: other.b },
  );
}
