import type { ErrorRequestHandler, RequestHandler } from "express";
import { type ErrorCode, errorCodes } from "#shared/contracts/error-codes.ts";
import type { Problem } from "#shared/contracts/errors.ts";
import { AppError, notFound } from "./app-error.ts";
import { withoutSecrets } from "./without-secrets.ts";

/** Addresses under /api that nobody registered. */
export const noSuchAddress: RequestHandler = (_request, _response, next) => next(notFound("page"));

/** The one place that writes error bodies: problem documents (RFC 9457). What is not an AppError is ours and is logged. */
export const answerProblems: ErrorRequestHandler = (error: unknown, request, response, _next) => {
  const known = error instanceof AppError ? error : problemOfParser(error);
  if (!known) request.log.error({ err: error }, "A request failed");
  if (response.headersSent) {
    // Half an answer is out: cutting the connection is the only way left to say that it is not whole.
    response.destroy();
    return;
  }
  const { code, detail, errors, extra } = known ?? new AppError("internal");
  const { status, title } = errorCodes[code];
  const problem: Problem = {
    type: `/problems/${code}`,
    title,
    status,
    code,
    ...(detail === undefined ? {} : { detail }),
    ...(errors === undefined ? {} : { errors: [...errors] }),
    ...(extra === undefined ? {} : { extra }),
    instance: withoutSecrets(request.originalUrl),
    requestId: String(request.id),
  };
  response.status(status).setHeader("Cache-Control", "no-store");
  response.type("application/problem+json").send(JSON.stringify(problem));
};

/** Bodies and addresses that Express could not read come as errors with a status of the 400s. */
function problemOfParser(error: unknown): AppError | null {
  if (!(error instanceof Error) || !("status" in error) || typeof error.status !== "number") return null;
  if (error.status < 400 || error.status >= 500) return null;
  const codes: Partial<Record<number, ErrorCode>> = { 404: "not_found", 413: "too_large", 415: "unsupported_type" };
  return new AppError(codes[error.status] ?? "malformed_request");
}
