/** Prints rows under a title, columns padded to their widest cell. */
export function printTable(title: string, rows: readonly (readonly (string | number)[])[]): void {
  const widths = (rows[0] ?? []).map((_, column) => Math.max(...rows.map((row) => String(row[column] ?? "").length)));
  const lines = rows.map((row) =>
    row
      .map((cell, column) => String(cell).padEnd(widths[column] ?? 0))
      .join("  ")
      .trimEnd(),
  );
  console.log(`${title}\n${lines.join("\n")}`);
}
