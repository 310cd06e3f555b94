import compression from "compression";
import express, { type Express, Router } from "express";
import { addArtwork, traceArtwork } from "#shared/contracts/artworks.ts";
import { inspectUnsubscribe, unsubscribe } from "#shared/contracts/mail-choices.ts";
import { saveMockup } from "#shared/contracts/mockups.ts";
import { keepDraft } from "#shared/contracts/named-drafts.ts";
import { addWallPhoto } from "#shared/contracts/wall-photos.ts";
import { authentication } from "./auth/auth.ts";
import { clientFiles } from "./http/client-files.ts";
import type { Services } from "./http/context.ts";
import { forgeryGuard } from "./http/forgery-guard.ts";
import { limited } from "./http/limits.ts";
import { answerProblems, noSuchAddress } from "./http/problems.ts";
import { requestLog } from "./http/request-log.ts";
import type { Registered } from "./http/route.ts";
import { securityHeaders } from "./http/security-headers.ts";
import { signedInOnly } from "./http/signed-in-only.ts";
import { soundPieces } from "./http/sound-pieces.ts";
import { registerRoutes } from "./routes/index.ts";

const smallBody = "256kb";
/** A mockup of a few thousand pieces. */
const mockupBody = "8mb";

export type App = { readonly handler: Express; readonly registered: readonly Registered[] };

/** The whole application as one request handler, and the list of its routes. */
export function createApp(services: Services): App {
  const { env, log } = services;
  const app = express();
  app.disable("x-powered-by");
  app.set(
    "trust proxy",
    env.TRUST_PROXY.split(",").map((part) => part.trim()),
  );
  app.set("query parser", "simple");
  app.use(requestLog(log));
  app.use(securityHeaders(env));
  app.use(compression());
  app.use(["/api", "/auth"], forgeryGuard(env));

  app.use("/auth", express.json({ limit: "16kb" }));
  const account = limited("account", env);
  app.post("/auth/callback/password", limited("signIn", env), account);
  app.post("/auth/callback/link", limited("links", env));
  app.use("/auth", authentication(services));

  app.post("/api/register", limited("register", env));
  app.post(["/api/links/inspect", "/api/invitations/accept", "/api/password/reset"], limited("links", env));
  app.post(["/api/links/fresh", "/api/links/request", "/api/password/forgot"], limited("mails", env));
  app.post("/api/account/password", limited("signIn", env));
  app.get("/api/share/:token", limited("links", env));
  app.post([unsubscribe.path, inspectUnsubscribe.path], limited("unsubscribe", env));
  app.post([addArtwork.path, addWallPhoto.path], limited("uploads", env));
  app.post(traceArtwork.path, limited("traces", env));
  app.put(saveMockup.path, signedInOnly(env), express.json({ limit: mockupBody }), soundPieces);
  app.post(keepDraft.path, signedInOnly(env), express.json({ limit: mockupBody }), soundPieces);
  app.use("/api", express.json({ limit: smallBody }));
  // Who opens another shop tells a known account's password here too.
  app.post("/api/register", account);

  const router = Router();
  const registered: Registered[] = [];
  registerRoutes({ router, services, registered });
  app.use(router);
  app.use("/api", noSuchAddress);
  app.use(clientFiles(env));
  app.use(noSuchAddress);
  app.use(answerProblems);
  return { handler: app, registered };
}
