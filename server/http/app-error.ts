import { type ErrorCode, errorCodes } from "#shared/contracts/error-codes.ts";

export type FieldError = { readonly pointer: string; readonly detail: string };

/** The one error that turns into an answer. Anything else is our own mistake and answers `internal`. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly detail: string | undefined;
  readonly errors: readonly FieldError[] | undefined;
  readonly extra: Readonly<Record<string, unknown>> | undefined;

  constructor(
    code: ErrorCode,
    {
      detail,
      errors,
      extra,
    }: { detail?: string; errors?: readonly FieldError[]; extra?: Record<string, unknown> } = {},
  ) {
    super(detail ?? errorCodes[code].title);
    this.name = "AppError";
    this.code = code;
    this.detail = detail;
    this.errors = errors;
    this.extra = extra;
  }
}

/** What someone may not see is not found. */
export const notFound = (what: string): AppError => new AppError("not_found", { detail: `No such ${what} here.` });
/** What someone sees but may not do. */
export const notAllowed = (detail: string): AppError => new AppError("not_allowed", { detail });
export const wrongState = (detail: string, extra?: Record<string, unknown>): AppError =>
  new AppError("wrong_state", extra ? { detail, extra } : { detail });
export const stale = (detail: string, newer: unknown): AppError => new AppError("stale", { detail, extra: { newer } });
export const invalid = (errors: readonly FieldError[]): AppError => new AppError("validation_failed", { errors });
