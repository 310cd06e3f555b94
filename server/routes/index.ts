import type { Routes } from "../http/route.ts";
import { registerAccountRoutes } from "./account.ts";
import { registerArtworkRoutes } from "./artworks.ts";
import { registerClientRoutes } from "./clients.ts";
import { registerJobSignalRoutes } from "./job-signals.ts";
import { registerJobRoutes } from "./jobs.ts";
import { registerLimitRoutes } from "./limits.ts";
import { registerLinkRoutes } from "./links.ts";
import { registerMockupRoutes } from "./mockups.ts";
import { registerNamedDraftRoutes } from "./named-drafts.ts";
import { registerNoteRoutes } from "./notes.ts";
import { registerOutgoingMailRoutes } from "./outgoing-mail.ts";
import { registerPortfolioRoutes } from "./portfolio.ts";
import { registerPriceRoutes } from "./prices.ts";
import { registerRevisionDocumentRoutes } from "./revision-documents.ts";
import { registerRevisionRoutes } from "./revisions.ts";
import { registerSawRoutes } from "./saws.ts";
import { registerSetAsideRoutes } from "./set-asides.ts";
import { registerShopRoutes } from "./shop.ts";
import { registerStockRoutes } from "./stock.ts";
import { registerSystemRoutes } from "./system.ts";
import { registerTeamRoutes } from "./team.ts";
import { registerWallPhotoRoutes } from "./wall-photos.ts";

/** Every route of the application, one line a noun. */
export function registerRoutes(routes: Routes): void {
  registerSystemRoutes(routes);
  registerAccountRoutes(routes);
  registerLinkRoutes(routes);
  registerShopRoutes(routes);
  registerLimitRoutes(routes);
  registerSawRoutes(routes);
  registerPriceRoutes(routes);
  registerTeamRoutes(routes);
  registerClientRoutes(routes);
  registerOutgoingMailRoutes(routes);
  registerArtworkRoutes(routes);
  registerJobRoutes(routes);
  registerJobSignalRoutes(routes);
  registerMockupRoutes(routes);
  registerNamedDraftRoutes(routes);
  registerNoteRoutes(routes);
  registerPortfolioRoutes(routes);
  registerRevisionRoutes(routes);
  registerRevisionDocumentRoutes(routes);
  registerSetAsideRoutes(routes);
  registerStockRoutes(routes);
  registerWallPhotoRoutes(routes);
}
