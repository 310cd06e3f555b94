import type { MockupDocument } from "#shared/mockup/document.ts";
import { withFields } from "../same.ts";
import { changeEveryLayer } from "./change-layer.ts";

/** Hides a layer in the picture or shows it again. A locked one can be hidden, too: it stays as it is. */
export function hideLayer(document: MockupDocument, { key, hidden }: { key: string; hidden: boolean }): MockupDocument {
  return changeEveryLayer(document, (layer) => (layer.key === key ? withFields(layer, { hidden }) : layer));
}

/** Locks a layer against every change but being hidden, ordered and unlocked, or unlocks it. */
export function lockLayer(document: MockupDocument, { key, locked }: { key: string; locked: boolean }): MockupDocument {
  return changeEveryLayer(document, (layer) => (layer.key === key ? withFields(layer, { locked }) : layer));
}
