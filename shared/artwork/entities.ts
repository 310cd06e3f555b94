import { artworkLimits } from "./limits.ts";

/**
 * The entities a DOCTYPE declares, by name; null when it does more than name a few short texts: references inside
 * values, markup, outside files, parameter entities, too many or too long ones.
 */
export function readEntities(doctype: string): Readonly<Record<string, string>> | null {
  const entities: Record<string, string> = {};
  const declared = doctype.match(/<!ENTITY/g)?.length ?? 0;
  if (declared === 0) return entities;
  const plain = /<!ENTITY\s+([A-Za-z_][\w.-]*)\s+(?:"([^"]*)"|'([^']*)')\s*>/g;
  let read = 0;
  for (const [, name, double, single] of doctype.matchAll(plain)) {
    const value = double ?? single ?? "";
    if (!name || value.length > artworkLimits.entityLength || /[&<%]/.test(value)) return null;
    entities[name] = value;
    read++;
  }
  return read === declared && declared <= artworkLimits.entities ? entities : null;
}
