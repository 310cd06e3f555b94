/** Relative luminance of an sRGB colour #RRGGBB, 0 to 1 (WCAG 2.2). Throws a RangeError for any other text. */
export function relativeLuminance(colour: string): number {
  const digits = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(colour);
  if (!digits) throw new RangeError(`${colour} is no colour of the form #RRGGBB.`);
  const [red, green, blue] = digits.slice(1).map((pair) => linear(Number.parseInt(pair, 16) / 255));
  return 0.2126 * (red ?? 0) + 0.7152 * (green ?? 0) + 0.0722 * (blue ?? 0);
}

/** Contrast ratio of two sRGB colours, 1 to 21, the same in both orders (WCAG 2.2). Compare it unrounded. */
export function contrastRatio(one: string, other: string): number {
  const a = relativeLuminance(one);
  const b = relativeLuminance(other);
  return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}

function linear(channel: number): number {
  return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
}
