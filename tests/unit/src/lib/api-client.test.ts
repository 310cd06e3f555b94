import { createServer, type IncomingMessage, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from "vitest";
import { changeAccount, endSession, whoAmI } from "#shared/contracts/account.ts";
import { listJobs } from "#shared/contracts/jobs.ts";
import { getProof } from "#shared/contracts/revisions.ts";
import { ApiProblem, addressOf, call, onNotSignedIn } from "@/lib/api-client.ts";

type Seen = { method?: string; url?: string; headers: IncomingMessage["headers"]; body: string };
let server: Server;
let answer: { status: number; body: string } = { status: 200, body: "{}" };
let seen: Seen[] = [];
const fetchOfNode = globalThis.fetch;

beforeAll(async () => {
  server = createServer((request, response) => {
    let body = "";
    request.on("data", (chunk: Buffer) => {
      body += chunk.toString();
    });
    request.on("end", () => {
      seen.push({ method: request.method, url: request.url, headers: request.headers, body });
      response.writeHead(answer.status).end(answer.body);
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  // A browser knows its own origin, Node does not: paths get this server's.
  vi.stubGlobal("fetch", (path: string, init: RequestInit) => fetchOfNode(base + path, init));
});
afterAll(() => {
  vi.unstubAllGlobals();
  server.close();
});
afterEach(() => {
  seen = [];
});

const problemOfCall = async (made: Promise<unknown>): Promise<ApiProblem> => {
  const thrown: unknown = await made.then(
    () => null,
    (error: unknown) => error,
  );
  if (!(thrown instanceof ApiProblem)) throw new Error("no ApiProblem was thrown");
  return thrown;
};

describe("addressOf", () => {
  it("fills in parameters, escaped, and keeps the rest of the path", () => {
    expect(addressOf(getProof, { params: { shop: "copper lark", revisionId: "r/1" } })).toBe(
      "/api/shops/copper%20lark/revisions/r%2F1/proof.pdf",
    );
  });
  it("leaves out what is not asked for", () => {
    expect(
      addressOf(listJobs, { params: { shop: "s" }, query: { q: "ring & planet", cursor: undefined, limit: 30 } }),
    ).toBe("/api/shops/s/jobs?q=ring+%26+planet&limit=30");
  });
});

describe("call", () => {
  it("reads without the header of writes", async () => {
    answer = { status: 200, body: '{"person":null}' };
    await expect(call(whoAmI, {})).resolves.toEqual({ person: null });
    expect(seen[0]).toMatchObject({ method: "GET", url: "/api/me", body: "" });
    expect(seen[0]?.headers["x-standproud"]).toBeUndefined();
  });

  it("writes JSON with the header that foreign pages cannot set", async () => {
    answer = { status: 200, body: "{}" };
    await call(changeAccount, { body: { name: "Ida Fenn" } });
    expect(seen[0]).toMatchObject({ method: "PATCH", url: "/api/account", body: '{"name":"Ida Fenn"}' });
    expect(seen[0]?.headers).toMatchObject({ "x-standproud": "1", "content-type": "application/json" });
  });

  it("gives nothing for an answer without content", async () => {
    answer = { status: 204, body: "" };
    await expect(call(endSession, { params: { sessionId: "x" } })).resolves.toBeUndefined();
  });

  it("throws the problem with its code, its detail before its title, and its fields", async () => {
    const errors = [{ pointer: "/name", detail: "Write a name." }];
    answer = {
      status: 422,
      body: JSON.stringify({
        type: "/problems/validation",
        title: "Check.",
        status: 422,
        code: "validation_failed",
        detail: "More.",
        errors,
      }),
    };
    const problem = await problemOfCall(call(changeAccount, { body: { name: "" } }));
    expect([problem.code, problem.status, problem.message]).toEqual(["validation_failed", 422, "More."]);
    expect(problem.problem?.errors).toEqual(errors);
  });

  it.each([
    { status: 502, body: "<html>Bad gateway</html>", code: "internal" },
    { status: 429, body: "slow down", code: "too_many_requests" },
    { status: 413, body: "", code: "too_large" },
  ])("makes a problem of a $status that is none of ours", async ({ status, body, code }) => {
    answer = { status, body };
    const problem = await problemOfCall(call(whoAmI, {}));
    expect([problem.code, problem.status]).toEqual([code, status]);
  });

  it("refuses a success that cannot be read", async () => {
    answer = { status: 200, body: "<html>" };
    expect((await problemOfCall(call(whoAmI, {}))).code).toBe("internal");
  });

  it("tells the application once when nobody is signed in", async () => {
    const told = vi.fn();
    onNotSignedIn(told);
    answer = {
      status: 401,
      body: JSON.stringify({ type: "/problems/not_signed_in", title: "Sign in.", status: 401, code: "not_signed_in" }),
    };
    expect((await problemOfCall(call(whoAmI, {}))).code).toBe("not_signed_in");
    expect(told).toHaveBeenCalledTimes(1);
  });

  it("passes on that a request was given up, and is no problem then", async () => {
    const signal = AbortSignal.abort(new Error("given up"));
    await expect(call(whoAmI, { signal })).rejects.toThrow("given up");
  });

  it("says that the server can't be reached", async () => {
    vi.stubGlobal("fetch", () => fetchOfNode("http://127.0.0.1:9/"));
    expect((await problemOfCall(call(whoAmI, {}))).code).toBe("unreachable");
  });
});
