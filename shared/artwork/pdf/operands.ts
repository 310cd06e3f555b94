import type { Matrix } from "../../geometry/transform.ts";

/** The operand at a place as a finite number; `otherwise` when it is something else. */
export function numberAt(args: ArrayLike<unknown>, index: number, otherwise = 0): number {
  const value = args[index];
  return typeof value === "number" && Number.isFinite(value) ? value : otherwise;
}

/** The numbers of an array or a typed array; empty for anything else, and for numbers that are not finite. */
export function numbersOf(value: unknown): readonly number[] {
  const list = Array.isArray(value) || value instanceof Float32Array ? Array.from<unknown>(value) : [];
  return list.every((one): one is number => typeof one === "number" && Number.isFinite(one)) ? list : [];
}

/** Six numbers as a matrix; null for anything else. */
export function matrixOf(value: unknown): Matrix | null {
  const [a, b, c, d, e, f, ...more] = numbersOf(value);
  if (a === undefined || b === undefined || c === undefined || d === undefined || more.length > 0) return null;
  return e === undefined || f === undefined ? null : { a, b, c, d, e, f };
}

/** A colour as "#rrggbb"; null for anything else. */
export function colourOf(value: unknown): string | null {
  return typeof value === "string" && /^#[0-9a-f]{6}$/i.test(value) ? value.toLowerCase() : null;
}

/** Whether a value is an object whose fields can be looked at. */
export function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === "object" && value !== null;
}
