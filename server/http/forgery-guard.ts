import type { RequestHandler } from "express";
import type { Environment } from "../env.ts";
import { AppError } from "./app-error.ts";

const readOnly = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Refuses writes that a foreign page could have caused with the reader's cookie: a form or an image can't send our
 * header, and a script elsewhere can't either without a preflight that we never answer. The origin, where the browser
 * names one, must be the one people reach us by.
 */
export function forgeryGuard({ PUBLIC_URL }: Pick<Environment, "PUBLIC_URL">): RequestHandler {
  const { origin } = new URL(PUBLIC_URL);
  return (request, _response, next) => {
    if (readOnly.has(request.method)) return next();
    const named = request.get("origin");
    if (request.get("x-standproud") !== "1" || (named !== undefined && named !== origin)) {
      return next(new AppError("forged_request", { detail: `Open ${PUBLIC_URL} and do it there.` }));
    }
    next();
  };
}
