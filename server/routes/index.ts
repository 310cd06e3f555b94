import type { Routes } from "../http/route.ts";
import { registerSystemRoutes } from "./system.ts";

/** Every route of the application, one line a noun. */
export function registerRoutes(routes: Routes): void {
  registerSystemRoutes(routes);
}
