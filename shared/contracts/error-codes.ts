import type { Problem } from "./errors.ts";

/** Every code an answer can carry, with its status and title. Both sides switch on `code`, never on text. */
export const errorCodes = {
  validation_failed: { status: 422, title: "Check the highlighted fields." },
  malformed_request: { status: 400, title: "The request could not be read." },
  not_signed_in: { status: 401, title: "Sign in to go on." },
  not_allowed: { status: 403, title: "You may look, but not do this." },
  forged_request: { status: 403, title: "This request did not come from the application." },
  not_found: { status: 404, title: "There is nothing here that you may see." },
  stale: { status: 409, title: "Someone saved a newer version." },
  wrong_state: { status: 409, title: "That can't be done now." },
  already_exists: { status: 409, title: "That is there already." },
  link_spent: { status: 410, title: "This link has been used." },
  link_expired: { status: 410, title: "This link has run out." },
  too_large: { status: 413, title: "That is too large." },
  unsupported_type: { status: 415, title: "That kind of file can't be taken." },
  dry_fit_stops: { status: 409, title: "The dry fit has stops." },
  too_many_requests: { status: 429, title: "Too many tries. Wait a little." },
  not_ready: { status: 503, title: "Not ready yet." },
  internal: { status: 500, title: "Something went wrong on our side." },
} as const;

export type ErrorCode = keyof typeof errorCodes;

/** Whether an answer's body is a problem document as far as a reader needs it: a code that is known, with words. */
export function isProblem(value: unknown): value is Problem {
  if (typeof value !== "object" || value === null) return false;
  const { code, title, status, detail } = value as Partial<Record<keyof Problem, unknown>>;
  return (
    typeof code === "string" &&
    Object.hasOwn(errorCodes, code) &&
    typeof title === "string" &&
    typeof status === "number" &&
    (detail === undefined || typeof detail === "string")
  );
}
