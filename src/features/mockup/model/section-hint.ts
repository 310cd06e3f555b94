import type { Layer } from "#shared/mockup/document.ts";

/** What a hand can do in the section with these layers, in a few words; null where there is nothing to say. */
export function sectionHint(layers: readonly Layer[]): string | null {
  const free = layers.filter(({ locked }) => !locked);
  const holds = (kind: Layer["hold"]["kind"]) => free.some(({ hold }) => hold.kind === kind);
  if (holds("standoff") && holds("pocket")) return "drag a layer to raise it or let it in";
  if (holds("standoff")) return "drag a layer to raise it";
  if (holds("pocket")) return "drag a layer to let it in";
  // What is bonded lies where it lies.
  return free.length === 0 ? null : "a layer on standoffs can be raised";
}
