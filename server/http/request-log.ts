import { randomUUID } from "node:crypto";
import type { IncomingMessage, ServerResponse } from "node:http";
import type { Request, RequestHandler } from "express";
import type { Logger } from "pino";
import { type Options, pinoHttp } from "pino-http";
import { withoutSecrets } from "./without-secrets.ts";

/**
 * Gives each request an id of our own, said in the answer too, and writes one line when it is done. Headers and bodies
 * are never logged: they hold cookies, passwords and tokens.
 */
export function requestLog(log: Logger): RequestHandler {
  const options: Options<IncomingMessage, ServerResponse> = {
    logger: log,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader("X-Request-Id", id);
      return id;
    },
    serializers: {
      req: ({ raw }: { raw: Request }) => ({
        id: raw.id,
        method: raw.method,
        url: withoutSecrets(raw.originalUrl ?? raw.url),
        from: raw.ip,
      }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
    customLogLevel: (_request, response, error) => (error || response.statusCode >= 500 ? "error" : "info"),
    autoLogging: { ignore: (request) => /^\/(assets\/|api\/(health|ready)$)/.test(request.url ?? "") },
  };
  return pinoHttp(options);
}
