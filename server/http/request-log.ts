import { randomUUID } from "node:crypto";
import type { IncomingMessage, ServerResponse } from "node:http";
import type { Request, RequestHandler } from "express";
import type { Logger } from "pino";
import { type Options, pinoHttp } from "pino-http";
import { describeError } from "../log.ts";
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
    // The library's own would add headers, and the statements in database errors.
    wrapSerializers: false,
    serializers: {
      req: (request: Request) => ({
        id: request.id,
        method: request.method,
        url: withoutSecrets(request.originalUrl ?? request.url),
        from: request.ip,
      }),
      res: ({ statusCode }: ServerResponse) => ({ statusCode }),
      err: describeError,
    },
    customLogLevel: (_request, response, error) => (error || response.statusCode >= 500 ? "error" : "info"),
    autoLogging: { ignore: (request) => /^\/(assets\/|api\/(health|ready)$)/.test(request.url ?? "") },
  };
  return pinoHttp(options);
}
