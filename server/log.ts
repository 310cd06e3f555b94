import { type Logger, pino, type SerializedError } from "pino";
import type { Environment } from "./env.ts";
import { withoutSecrets } from "./http/without-secrets.ts";

/** JSON lines on standard output. */
export function createLog(env: Pick<Environment, "LOG_LEVEL">, destination?: { write(line: string): void }): Logger {
  const options = { level: env.LOG_LEVEL, base: undefined, serializers: { err: describeError } };
  return destination ? pino(options, destination) : pino(options);
}

/**
 * What the log says of an error: its kind, words and place. Database errors also carry the statement's values, which
 * may be hashes and addresses, so nothing else is taken over.
 */
export function describeError(error: unknown): Pick<SerializedError, "type" | "message" | "stack"> {
  if (!(error instanceof Error)) return { type: typeof error, message: withoutSecrets(String(error)), stack: "" };
  const cause = error.cause instanceof Error ? ` (${error.cause.name}: ${error.cause.message})` : "";
  return {
    type: error.name,
    message: withoutSecrets(error.message + cause),
    stack: withoutSecrets(error.stack ?? ""),
  };
}
