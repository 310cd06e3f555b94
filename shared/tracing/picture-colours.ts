import type { Rgb } from "./picture.ts";

/** A colour as six hexadecimal digits, mixed with white where it is not opaque. */
export function hexOf({ red, green, blue, alpha }: Rgb): string {
  const mixed = [red, green, blue].map((channel) => Math.round((channel * alpha) / 255 + 255 - alpha));
  return `#${mixed.map((channel) => channel.toString(16).padStart(2, "0")).join("")}`.toUpperCase();
}

/** The opaque colour of six hexadecimal digits; null when the text is none. */
export function colourOfHex(text: string): Rgb | null {
  const digits = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(text);
  if (!digits) return null;
  const [red = 0, green = 0, blue = 0] = digits.slice(1).map((pair) => Number.parseInt(pair, 16));
  return { red, green, blue, alpha: 255 };
}
