import type { RequestHandler } from "express";
import type { Environment } from "../env.ts";
import { AppError } from "./app-error.ts";
import { readSession } from "./session.ts";

/** Turns away who has no session before a large body is read for them. The route itself asks once more, and more closely. */
export function signedInOnly(env: Environment): RequestHandler {
  return async (request, _response, next) => {
    if (!(await readSession(request, env, new Date()))) throw new AppError("not_signed_in");
    next();
  };
}
