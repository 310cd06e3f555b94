import type { ServerResponse } from "node:http";
import { join, resolve } from "node:path";
import express, { Router } from "express";
import compressedFiles from "express-static-gzip";
import type { Environment } from "../env.ts";

const loopbackNames = new Set(["localhost", "127.0.0.1", "[::1]"]);

/**
 * The geometry kernel's glue makes functions from text when it loads. That is allowed inside its own workers alone, which have no
 * page, no cookies to read and nothing to fetch but their code; pages stay under the strict policy.
 */
function allowKernel(response: ServerResponse, path: string): void {
  if (!/[\\/](?:board|engine|examples|lettering|plan|shape|wall)\.worker-[\w-]+\.js(?:\.br)?$/.test(path)) return;
  response.setHeader(
    "Content-Security-Policy",
    "default-src 'none'; script-src 'self' 'wasm-unsafe-eval' 'unsafe-eval'; connect-src 'self'",
  );
}

/** The built browser application: hashed files for a year, and its one page for every address that is not a file. */
export function clientFiles({ CLIENT_DIR, PUBLIC_URL }: Pick<Environment, "CLIENT_DIR" | "PUBLIC_URL">): Router {
  const root = resolve(CLIENT_DIR);
  const router = Router();
  const home = new URL(PUBLIC_URL);
  // The same machine under another of its names would get no cookie and no write past the forgery guard.
  router.use((request, response, next) => {
    const host = request.get("host")?.replace(/:\d+$/, "") ?? "";
    const strays = loopbackNames.has(host) && loopbackNames.has(home.hostname) && host !== home.hostname;
    if (strays && request.method === "GET") return response.redirect(302, home.origin + request.originalUrl);
    next();
  });
  router.use(
    "/assets",
    compressedFiles(join(root, "assets"), {
      enableBrotli: true,
      orderPreference: ["br"],
      index: false,
      serveStatic: { immutable: true, maxAge: "1y", fallthrough: false, setHeaders: allowKernel },
    }),
  );
  router.use(express.static(root, { index: false, maxAge: "1h" }));
  router.get(/^(?!\/(?:api|auth)(?:\/|$)).*/, (_request, response) => {
    response.setHeader("Cache-Control", "no-store");
    response.sendFile(join(root, "index.html"), { cacheControl: false });
  });
  return router;
}
