import type { z } from "zod";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { type Problem, problemSchema } from "#shared/contracts/errors.ts";

export type Given<E extends Endpoint> = {
  params?: z.input<E["params"]>;
  query?: z.input<E["query"]>;
  body?: z.input<E["body"]>;
};
export type Answer = { status: number; headers: Headers; text: string };

/** A browser without a screen: keeps cookies, sends our header with each write, and speaks in endpoints. */
export class Visitor {
  readonly #baseUrl: string;
  readonly cookies = new Map<string, string>();

  constructor(baseUrl: string) {
    this.#baseUrl = baseUrl;
  }

  /** One request as it is. `body` is sent as JSON unless it is text or a form. */
  async send(
    method: string,
    path: string,
    { body, headers = {} }: { body?: unknown; headers?: Record<string, string> } = {},
  ): Promise<Answer> {
    const isRaw = body === undefined || typeof body === "string" || body instanceof FormData;
    const response = await fetch(this.#baseUrl + path, {
      method,
      redirect: "manual",
      headers: {
        ...(method === "GET" ? {} : { "X-Standproud": "1" }),
        ...(isRaw ? {} : { "Content-Type": "application/json" }),
        ...(this.cookies.size > 0
          ? { Cookie: [...this.cookies].map(([key, value]) => `${key}=${value}`).join("; ") }
          : {}),
        ...headers,
      },
      ...(body === undefined ? {} : { body: isRaw ? (body as string | FormData) : JSON.stringify(body) }),
    });
    for (const line of response.headers.getSetCookie()) this.#keep(line);
    return { status: response.status, headers: response.headers, text: await response.text() };
  }

  /** The answer to an endpoint, whatever it is. */
  ask<E extends Endpoint>(endpoint: E, given: Given<E> = {}): Promise<Answer> {
    const params = (given.params ?? {}) as Record<string, unknown>;
    const path = endpoint.path.replace(/:([A-Za-z]+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
    const query = new URLSearchParams((given.query ?? {}) as Record<string, string>).toString();
    return this.send(endpoint.method, query ? `${path}?${query}` : path, { body: given.body });
  }

  /** The result of an endpoint that is expected to do what it is asked. */
  async get<E extends Endpoint>(endpoint: E, given: Given<E> = {}): Promise<z.output<E["result"]>> {
    const { status, text } = await this.ask(endpoint, given);
    if (status !== (endpoint.status ?? 200)) throw new Error(`${endpoint.method} ${endpoint.path}: ${status} ${text}`);
    return endpoint.result.parse(text === "" ? undefined : JSON.parse(text)) as z.output<E["result"]>;
  }

  /** The problem document of an endpoint that is expected to refuse. */
  async refusal<E extends Endpoint>(endpoint: E, given: Given<E> = {}): Promise<Problem> {
    const { status, headers, text } = await this.ask(endpoint, given);
    if (status < 400) throw new Error(`${endpoint.method} ${endpoint.path} did not refuse: ${status} ${text}`);
    if (!headers.get("content-type")?.startsWith("application/problem+json")) throw new Error(`No problem: ${text}`);
    return problemSchema.parse(JSON.parse(text));
  }

  /** Signs in the way the page does. Says where Auth.js leads; a refusal has `error` in it. */
  async signIn(provider: "password" | "link", fields: Record<string, string>): Promise<URL> {
    return this.#auth(`/auth/callback/${provider}`, fields);
  }

  async signOut(): Promise<void> {
    await this.#auth("/auth/signout", {});
  }

  async #auth(path: string, fields: Record<string, string>): Promise<URL> {
    const { csrfToken } = JSON.parse((await this.send("GET", "/auth/csrf")).text) as { csrfToken: string };
    const { text } = await this.send("POST", path, {
      body: { ...fields, csrfToken, callbackUrl: this.#baseUrl },
      headers: { "X-Auth-Return-Redirect": "1" },
    });
    return new URL((JSON.parse(text) as { url: string }).url);
  }

  #keep(line: string): void {
    const [pair = "", ...attributes] = line.split(";");
    const name = pair.slice(0, pair.indexOf("="));
    const value = pair.slice(pair.indexOf("=") + 1);
    const gone = attributes.some((attribute) => {
      const [key = "", at = ""] = attribute.trim().split("=");
      return (
        (key.toLowerCase() === "max-age" && Number(at) <= 0) ||
        (key.toLowerCase() === "expires" && Date.parse(at) <= Date.now())
      );
    });
    if (gone || value === "") this.cookies.delete(name);
    else this.cookies.set(name, value);
  }
}
