/** A number as people write it, with a point or a comma, with or without % or °; null when it is none. */
export function readNumber(text: string): number | null {
  const value = Number(
    text
      .trim()
      .replace(",", ".")
      .replace("−", "-")
      .replace(/\s*[°%]$/, ""),
  );
  return text.trim() === "" || !Number.isFinite(value) ? null : value;
}

/** Degrees from a whole turn back to a whole turn on; null when it is no such number. */
export function readDegrees(text: string): number | null {
  const degrees = readNumber(text);
  return degrees === null || Math.abs(degrees) > 360 ? null : degrees;
}
