import { rm } from "node:fs/promises";
import { pipeline } from "node:stream/promises";
import type { Request, Response, Router } from "express";
import type { z } from "zod";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { Shop } from "../models/shop.ts";
import { AppError, invalid, notFound } from "./app-error.ts";
import { asOneChange } from "./change.ts";
import type { Context, ReadContext, Services } from "./context.ts";
import { FileAnswer } from "./file-answer.ts";
import { actorAt, readSession } from "./session.ts";
import { type ReceivedFile, receiveFile } from "./uploads.ts";

type Any = z.ZodType;
type Parsed<E extends Endpoint> = {
  params: z.output<E["params"]>;
  query: z.output<E["query"]>;
  body: z.output<E["body"]>;
};
/** What a reader of a stream asks for, with the last event that its browser says it had. */
type Streamed<E extends Endpoint> = Parsed<E> & { readonly lastEventId: string | undefined };
/** An endpoint whose result is nothing answers nothing, or a file. */
type Answer<E extends Endpoint> =
  undefined extends z.input<E["result"]> ? undefined | FileAnswer : z.input<E["result"]>;

/** Who may reach the handler at all: anyone, someone signed in, or someone with a place in the shop of the address. */
export type Reach = "anyone" | "signed in" | "insiders";
export type Registered = { readonly endpoint: Endpoint; readonly reach: Reach };

/** The router with the services it hands to handlers and the list of what was registered, which the policy tests walk. */
export type Routes = { readonly router: Router; readonly services: Services; readonly registered: Registered[] };

type Options = { readonly reach?: Reach };

/** A request that only reads. */
export function read<E extends Endpoint>(
  routes: Routes,
  endpoint: E,
  handle: (context: ReadContext, input: Parsed<E>) => Promise<Answer<E>>,
  options: Options = {},
): void {
  register(routes, endpoint, options, async (context, input) => handle(context, input as Parsed<E>));
}

/** A request that changes rows: all of it in one transaction, committed before the answer goes out. */
export function write<E extends Endpoint>(
  routes: Routes,
  endpoint: E,
  handle: (context: Context, input: Parsed<E>) => Promise<Answer<E>>,
  options: Options = {},
): void {
  register(routes, endpoint, options, (context, input) =>
    asOneChange(context, (transaction) => handle({ ...context, transaction }, input as Parsed<E>)),
  );
}

/**
 * A request that brings a file. `allow` is asked before the first byte is taken; `handle` then runs in one transaction with the
 * file in quarantine, which is removed afterwards unless the handler moved it away. What takes long with a file is done by `prepare`, before
 * the transaction holds a connection.
 */
export function upload<E extends Endpoint, F extends ReceivedFile = ReceivedFile>(
  routes: Routes,
  endpoint: E,
  {
    maxBytes,
    allow,
    prepare = async (file) => file as F,
    handle,
  }: {
    maxBytes: number;
    allow: (context: ReadContext, params: z.output<E["params"]>) => Promise<void>;
    prepare?: (file: ReceivedFile, context: ReadContext) => Promise<F>;
    handle: (context: Context, input: { params: z.output<E["params"]>; file: F }) => Promise<Answer<E>>;
  },
): void {
  routes.registered.push({ endpoint, reach: "insiders" });
  routes.router.post(endpoint.path, async (request, response) => {
    const context = await contextOf(request, routes.services, "insiders");
    const params = parsed(endpoint.params, request.params, "params") as z.output<E["params"]>;
    await allow(context, params);
    const file = await receiveFile(request, response, { dir: routes.services.storage.quarantineDir, maxBytes });
    try {
      const ready = await prepare(file, context);
      const answer = await asOneChange(context, (transaction) =>
        handle({ ...context, transaction }, { params, file: ready }),
      );
      await send(response, endpoint, answer, routes.services.env.NODE_ENV);
    } finally {
      await rm(file.path, { force: true });
    }
  });
}

/**
 * A request that is answered by events as they come. `ask` says anew who is there, or throws when nobody is; `open` has looked at it
 * once before it sends anything, so that a refusal is an answer like any other.
 */
export function stream<E extends Endpoint>(
  routes: Routes,
  endpoint: E,
  open: (ask: () => Promise<ReadContext>, input: Streamed<E>, response: Response) => Promise<void>,
): void {
  routes.registered.push({ endpoint, reach: "insiders" });
  routes.router.get(endpoint.path, async (request, response) => {
    // A page that lies open is nobody's doing: it must not keep a session from running out.
    const ask = () => contextOf(request, routes.services, "insiders", { isUse: false });
    await ask();
    const input = {
      params: parsed(endpoint.params, request.params, "params"),
      query: parsed(endpoint.query, request.query, "query"),
      body: parsed(endpoint.body, request.body ?? {}, ""),
      lastEventId: request.get("last-event-id"),
    };
    await open(ask, input as Streamed<E>, response);
  });
}

function register(
  routes: Routes,
  endpoint: Endpoint,
  options: Options,
  run: (context: ReadContext, input: Parsed<Endpoint>) => Promise<unknown>,
): void {
  const reach = options.reach ?? (endpoint.path.startsWith("/api/shops/:shop") ? "insiders" : "signed in");
  routes.registered.push({ endpoint, reach });
  const method = endpoint.method.toLowerCase() as "get" | "post" | "put" | "patch" | "delete";
  routes.router[method](endpoint.path, async (request, response) => {
    const context = await contextOf(request, routes.services, reach);
    const input = {
      params: parsed(endpoint.params, request.params, "params"),
      query: parsed(endpoint.query, request.query, "query"),
      body: parsed(endpoint.body, request.body ?? {}, ""),
    };
    await send(response, endpoint, await run(context, input), routes.services.env.NODE_ENV);
  });
}

async function contextOf(
  request: Request,
  services: Services,
  reach: Reach,
  use: { isUse?: boolean } = {},
): Promise<ReadContext> {
  const now = new Date();
  const live = await readSession(request, services.env, now, use);
  if (reach !== "anyone" && !live) throw new AppError("not_signed_in");
  const slug = typeof request.params.shop === "string" ? request.params.shop : null;
  const shop = slug ? await Shop.findOne({ where: { slug } }) : null;
  const actor = await actorAt(live, shop?.id ?? null);
  if (reach === "insiders" && (!shop || (actor.kind !== "staff" && actor.kind !== "contact"))) throw notFound("page");
  return {
    services,
    actor,
    shop: shop ? { id: shop.id, slug: shop.slug } : null,
    now,
    requestId: String(request.id),
    address: request.ip ?? "",
    agent: (request.get("user-agent") ?? "").slice(0, 400),
    log: request.log,
  };
}

function parsed(schema: Any, value: unknown, within: string): unknown {
  const outcome = schema.safeParse(value);
  if (outcome.success) return outcome.data;
  // A malformed id in the address is an address of nothing.
  if (within === "params") throw notFound("page");
  throw invalid(
    outcome.error.issues
      .flatMap((issue) =>
        issue.code === "unrecognized_keys"
          ? issue.keys.map((key) => ({ pointer: pointerOf([...issue.path, key]), detail: "This field is not known." }))
          : [{ pointer: pointerOf(issue.path), detail: issue.message }],
      )
      .slice(0, mostFaults),
  );
}

/** Nobody mends more at once, and the answer must not outgrow the question. */
const mostFaults = 50;

/** JSON pointer (RFC 6901). */
function pointerOf(path: readonly PropertyKey[]): string {
  return path.map((step) => `/${String(step).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}

async function send(response: Response, endpoint: Endpoint, answer: unknown, mode: string): Promise<void> {
  response.setHeader("Cache-Control", "no-store");
  if (answer instanceof FileAnswer) {
    if (answer.keepForSeconds > 0) {
      response.setHeader("Cache-Control", `private, max-age=${answer.keepForSeconds}`);
      // Kept for who asked: the next person at the same browser has another session, and is asked for it.
      response.vary("Cookie");
    }
    response.setHeader("Content-Type", answer.mediaType);
    response.setHeader("Content-Length", answer.byteSize);
    response.setHeader("X-Content-Type-Options", "nosniff");
    response.setHeader("Content-Disposition", `${answer.disposition}; filename*=UTF-8''${headerText(answer.fileName)}`);
    const policy = policyOf(answer);
    if (policy) response.setHeader("Content-Security-Policy", policy);
    await sendBytes(answer, response);
    return;
  }
  response.status(endpoint.status ?? 200);
  if (answer === undefined) {
    response.end();
    return;
  }
  // Outside production a field too many in an answer fails here, before it can leak.
  response.json(mode === "production" ? answer : endpoint.result.parse(answer));
}

/** Files run nothing and fetch nothing. A PDF shown in the page keeps the pages' policy: browsers' readers don't work in a sandbox. */
function policyOf({ disposition, mediaType }: FileAnswer): string | null {
  if (disposition === "attachment") return "sandbox; default-src 'none'";
  return mediaType === "application/pdf"
    ? null
    : "sandbox; default-src 'none'; img-src data:; style-src 'unsafe-inline'";
}

/** Sends the bytes as fast as the reader takes them. A reader who leaves in the middle is no failure of ours. */
async function sendBytes(answer: FileAnswer, response: Response): Promise<void> {
  try {
    await pipeline(answer.stream, response);
  } catch (error) {
    const left = error instanceof Error && "code" in error && error.code === "ERR_STREAM_PREMATURE_CLOSE";
    if (!left) throw error;
  }
}

/** A value as RFC 8187 writes it, which leaves less as it is than encodeURIComponent does. */
function headerText(text: string): string {
  return encodeURIComponent(text).replace(/['()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`);
}
