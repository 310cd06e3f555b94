/** jsdom lays nothing out, so nothing ever changes its size; an element that watches its own is told nothing. */
class NoSizes implements ResizeObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}

/** Lets tables that scroll by themselves be drawn. */
export function claimNoSizes(): void {
  globalThis.ResizeObserver ??= NoSizes;
}
