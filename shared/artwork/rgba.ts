/** A colour of 0 to 255 per channel, with how much it covers from 0 to 1. */
export type Rgba = { readonly r: number; readonly g: number; readonly b: number; readonly a: number };

export const white: Rgba = { r: 255, g: 255, b: 255, a: 1 };

/** The colour a translucent one over another gives (source-over, Compositing and Blending 1, section 9.1.4). */
export function rgbaOver(top: Rgba, below: Rgba): Rgba {
  const a = top.a + below.a * (1 - top.a);
  if (a === 0) return { r: 0, g: 0, b: 0, a: 0 };
  const channel = (over: number, under: number) => (over * top.a + under * below.a * (1 - top.a)) / a;
  return { r: channel(top.r, below.r), g: channel(top.g, below.g), b: channel(top.b, below.b), a };
}

/** Whether nothing shows through: a difference under half a step of 255 can't be seen. */
export const isOpaque = ({ a }: Rgba) => a > 1 - 0.5 / 255;
/** Whether nothing of it shows. */
export const isInvisible = ({ a }: Rgba) => a < 0.5 / 255;

/** The colour as # and six hexadecimal digits in capitals. */
export function rgbaToHex({ r, g, b }: Rgba): string {
  const digits = (value: number) =>
    Math.round(Math.max(0, Math.min(255, value)))
      .toString(16)
      .padStart(2, "0");
  return `#${digits(r)}${digits(g)}${digits(b)}`.toUpperCase();
}

/** Reads #rrggbb; null for anything else. */
export function rgbaFromHex(text: string, a = 1): Rgba | null {
  const match = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(text.trim());
  if (!match) return null;
  const channel = (index: number) => Number.parseInt(match[index] ?? "0", 16);
  return { r: channel(1), g: channel(2), b: channel(3), a };
}

/** Two colours with the same key are one colour in the drawing. */
export function rgbaKey(colour: Rgba): string {
  return `${rgbaToHex(colour)}${isOpaque(colour) ? "" : `/${Math.round(colour.a * 255)}`}`;
}

/** Luminance from 0 to 1 as a mask uses it (CSS Masking 1, section 7.10: sRGB values, coefficients of feColorMatrix). */
export function maskLuminance({ r, g, b }: Rgba): number {
  return (0.2125 * r + 0.7154 * g + 0.0721 * b) / 255;
}
