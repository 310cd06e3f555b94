import type { Request, RequestHandler } from "express";
import { ipKeyGenerator, rateLimit } from "express-rate-limit";
import type { Environment } from "../env.ts";
import { AppError } from "./app-error.ts";

type Limit = { readonly minutes: number; readonly times: number; readonly by: (request: Request) => string };

const byAddress = (request: Request): string => ipKeyGenerator(request.ip ?? "");
/** The account that is tried, so that many addresses together can't try it more often. */
const byAccount = (request: Request): string => {
  const email: unknown = request.body?.email;
  return typeof email === "string" ? email.trim().toLowerCase().slice(0, 254) : "";
};

const limits = {
  signIn: { minutes: 15, times: 30, by: byAddress },
  account: { minutes: 15, times: 50, by: byAccount },
  register: { minutes: 60, times: 10, by: byAddress },
  links: { minutes: 15, times: 60, by: byAddress },
  /** Mail programs press for many readers at once. */
  unsubscribe: { minutes: 15, times: 300, by: byAddress },
  mails: { minutes: 15, times: 15, by: byAddress },
  uploads: { minutes: 10, times: 60, by: byAddress },
  traces: { minutes: 10, times: 120, by: byAddress },
} satisfies Record<string, Limit>;

export type LimitName = keyof typeof limits;

/** How often one address (or one account) may do what costs us much or could be guessed. Counted in this process. */
export function limited(
  name: LimitName,
  { RATE_LIMIT_FACTOR }: Pick<Environment, "RATE_LIMIT_FACTOR">,
): RequestHandler {
  const { minutes, times, by } = limits[name];
  return rateLimit({
    windowMs: minutes * 60_000,
    limit: Math.max(1, Math.round(times * RATE_LIMIT_FACTOR)),
    keyGenerator: by,
    standardHeaders: "draft-8",
    legacyHeaders: false,
    identifier: name,
    handler: (_request, _response, next) =>
      next(new AppError("too_many_requests", { detail: `Too many tries. Wait ${minutes} minutes, then try again.` })),
  });
}
