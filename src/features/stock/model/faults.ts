/** What is wrong with an entry that is being written, by the field's path, as "hardware.floorHole". */
export type Faults = ReadonlyMap<string, string>;

type Issue = { readonly path: readonly PropertyKey[]; readonly message: string };

/** The first fault of each field. */
export function faultsOf(issues: readonly Issue[]): Faults {
  const faults = new Map<string, string>();
  for (const { path, message } of issues) {
    const field = path.map(String).join(".");
    if (!faults.has(field)) faults.set(field, message);
  }
  return faults;
}

/** The first fault of a field or of anything within it. */
export function faultWithin(faults: Faults, field: string): string | undefined {
  for (const [path, message] of faults) if (path === field || path.startsWith(`${field}.`)) return message;
  return undefined;
}
