import type { RequestHandler } from "express";
import helmet from "helmet";
import type { Environment } from "../env.ts";

/**
 * What the browser may do with our pages: load only from us, run no script written into a page, be framed by nobody,
 * and tell no other site where the reader came from, since some addresses hold a token.
 */
export function securityHeaders({ PUBLIC_URL }: Pick<Environment, "PUBLIC_URL">): RequestHandler {
  const overTls = PUBLIC_URL.startsWith("https:");
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        // The geometry kernel is WebAssembly.
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        scriptSrcAttr: ["'none'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", "data:", "blob:"],
        fontSrc: ["'self'", "data:"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", "blob:"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        upgradeInsecureRequests: overTls ? [] : null,
      },
    },
    referrerPolicy: { policy: "no-referrer" },
    strictTransportSecurity: overTls ? { maxAge: 15_552_000, includeSubDomains: false } : false,
    frameguard: { action: "deny" },
  });
}
