import type { z } from "zod";
import type { AddressOf } from "#shared/contracts/addresses.ts";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { type ErrorCode, errorCodes, isProblem } from "#shared/contracts/error-codes.ts";
import type { Problem } from "#shared/contracts/errors.ts";

/** Sent with every write: a form on a foreign page cannot set it. */
export const writeHeaders = { "X-Standproud": "1" } as const;

/** An answer that is not a success, or no answer at all (`unreachable`). `message` is written for the reader. */
export class ApiProblem extends Error {
  override readonly name = "ApiProblem";
  constructor(
    readonly code: ErrorCode | "unreachable",
    message: string,
    readonly problem: Problem | null,
  ) {
    super(message);
  }
  get status(): number {
    return this.problem?.status ?? 0;
  }
}

type Needed<Name extends string, Value> =
  Record<string, never> extends Value ? { readonly [N in Name]?: Value } : { readonly [N in Name]: Value };

export type CallOptions<E extends Endpoint> = Needed<"params", z.input<E["params"]>> &
  Needed<"query", z.input<E["query"]>> &
  Needed<"body", z.input<E["body"]>> & { readonly signal?: AbortSignal };

type Loose = {
  readonly params?: unknown;
  readonly query?: unknown;
  readonly body?: unknown;
  readonly signal?: AbortSignal;
};

let handleNotSignedIn: () => void = () => undefined;

/** What to do when a request finds nobody signed in; attached once, by the application. */
export function onNotSignedIn(handler: () => void): void {
  handleNotSignedIn = handler;
}

const entriesOf = (value: unknown): [string, unknown][] => Object.entries((value ?? {}) as Record<string, unknown>);

/** The address of an endpoint with its parameters filled in, for links to files as well as for requests. */
export function addressOf<E extends Endpoint>(
  endpoint: E | AddressOf<E>,
  options: Needed<"params", z.input<E["params"]>> & { readonly query?: z.input<E["query"]> },
): string {
  const loose: Loose = options;
  const params = Object.fromEntries(entriesOf(loose.params));
  const path = endpoint.path.replace(/:([A-Za-z]+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const query = new URLSearchParams();
  for (const [name, value] of entriesOf(loose.query)) {
    if (value !== undefined && value !== null && value !== "") query.set(name, String(value));
  }
  const text = query.toString();
  return text === "" ? path : `${path}?${text}`;
}

/** Reads a problem document; whatever else came is told as our own fault, with the status it had. */
export function problemOf(status: number, body: string): ApiProblem {
  let parsed: unknown = null;
  try {
    parsed = JSON.parse(body);
  } catch {
    parsed = null;
  }
  if (isProblem(parsed)) return new ApiProblem(parsed.code, parsed.detail ?? parsed.title, parsed);
  const code: ErrorCode = status === 413 ? "too_large" : status === 429 ? "too_many_requests" : "internal";
  const title = errorCodes[code].title;
  return new ApiProblem(code, title, { type: `/problems/${code}`, title, status, code });
}

export const unreachable = (): ApiProblem =>
  new ApiProblem("unreachable", "The server can't be reached. Check the connection and try again.", null);

/**
 * Makes one request and gives the typed answer.
 * Throws ApiProblem for every answer that is not a success, and the signal's own reason when the request is given up.
 */
export async function call<E extends Endpoint>(
  endpoint: E | AddressOf<E>,
  options: CallOptions<E>,
): Promise<z.output<E["result"]>> {
  const loose: Loose = options;
  const writes = endpoint.method !== "GET";
  const carriesBody = writes && loose.body !== undefined;
  let response: Response;
  let text: string;
  try {
    response = await fetch(addressOf(endpoint, options), {
      method: endpoint.method,
      credentials: "same-origin",
      headers: {
        Accept: "application/json",
        ...(writes ? writeHeaders : {}),
        ...(carriesBody ? { "Content-Type": "application/json" } : {}),
      },
      ...(carriesBody ? { body: JSON.stringify(loose.body) } : {}),
      ...(loose.signal ? { signal: loose.signal } : {}),
    });
    text = await response.text();
  } catch (error) {
    if (loose.signal?.aborted) throw error;
    throw unreachable();
  }
  if (!response.ok) {
    const problem = problemOf(response.status, text);
    if (problem.code === "not_signed_in") handleNotSignedIn();
    throw problem;
  }
  if (text === "") return undefined as z.output<E["result"]>;
  try {
    return JSON.parse(text) as z.output<E["result"]>;
  } catch {
    throw problemOf(500, text);
  }
}
