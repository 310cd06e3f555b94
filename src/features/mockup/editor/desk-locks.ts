const nameOf = (deskId: string) => `standproud:desk:${deskId}`;

/**
 * Says to other tabs that this desk is open, until what is given back is called; the browser says the opposite when the tab
 * dies (Web Locks, www.w3.org/TR/web-locks). On plain http there are no locks, and nobody is told.
 */
export function holdDesk(deskId: string): () => void {
  let letGo = () => {};
  const held = new Promise<void>((resolve) => {
    letGo = resolve;
  });
  if ("locks" in navigator) void navigator.locks.request(nameOf(deskId), () => held);
  return () => letGo();
}

/** Which of these desks are open in some tab. */
export async function openDesks(deskIds: readonly string[]): Promise<Set<string>> {
  if (!("locks" in navigator) || deskIds.length === 0) return new Set();
  const { held = [] } = await navigator.locks.query();
  const names = new Set(held.map(({ name }) => name));
  return new Set(deskIds.filter((deskId) => names.has(nameOf(deskId))));
}
