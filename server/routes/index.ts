import type { Routes } from "../http/route.ts";
import { registerArtworkRoutes } from "./artworks.ts";
import { registerJobRoutes } from "./jobs.ts";
import { registerMockupRoutes } from "./mockups.ts";
import { registerNoteRoutes } from "./notes.ts";
import { registerPortfolioRoutes } from "./portfolio.ts";
import { registerRevisionRoutes } from "./revisions.ts";
import { registerStockRoutes } from "./stock.ts";
import { registerSystemRoutes } from "./system.ts";

/** Every route of the application, one line a noun. */
export function registerRoutes(routes: Routes): void {
  registerSystemRoutes(routes);
  registerArtworkRoutes(routes);
  registerJobRoutes(routes);
  registerMockupRoutes(routes);
  registerNoteRoutes(routes);
  registerPortfolioRoutes(routes);
  registerRevisionRoutes(routes);
  registerStockRoutes(routes);
}
