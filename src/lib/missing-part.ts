const missing = new WeakSet<object>();

/**
 * Remembers, from now on, which parts of the application could not be fetched: the bundler's own loader tells the window, with the error
 * that `import()` then throws (https://vite.dev/guide/build, "Load Error Handling"). Called once, by the application.
 */
export function listenForMissingParts(): void {
  window.addEventListener("vite:preloadError", ({ payload }) => missing.add(payload));
}

/** Whether an error is that a part of the application could not be fetched: the server is away, or a newer version took its place. */
export const isMissingPart = (error: unknown): boolean =>
  typeof error === "object" && error !== null && missing.has(error);
