const digits = new Intl.NumberFormat("en-GB", { maximumSignificantDigits: 4, useGrouping: false });
const whole = new Intl.NumberFormat("en-GB", { maximumFractionDigits: 0, useGrouping: false });
const tenPower = ["⁰", "¹", "²", "³", "⁴", "⁵", "⁶", "⁷", "⁸", "⁹"];

/**
 * A computed figure as the sheet prints it: four significant digits, whole from 1000, and a power of ten under a
 * thousandth. Words stay as they are.
 */
export function formatFigure(value: number | string): string {
  if (typeof value === "string") return value;
  const size = Math.abs(value);
  const sign = value < 0 ? "−" : "";
  // What is left of a difference that should be nothing.
  if (size < 1e-12) return "0";
  if (size >= 1000) return sign + whole.format(size);
  if (size >= 0.001) return sign + digits.format(size);
  const power = Math.floor(Math.log10(size));
  const raised = [...String(-power)].map((digit) => tenPower[Number(digit)]).join("");
  return `${sign}${digits.format(size / 10 ** power)} · 10⁻${raised}`;
}
