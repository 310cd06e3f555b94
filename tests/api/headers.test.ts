import { mkdir, mkdtemp, rm, writeFile } from "node:fs/promises";
import { request } from "node:http";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { connect } from "#server/db/connection.ts";
import { problemSchema } from "#shared/contracts/errors.ts";
import { startTestApp, type TestApp } from "../support/app.ts";

let app: TestApp;
let clientDir: string;
beforeAll(async () => {
  clientDir = await mkdtemp(join(tmpdir(), "standproud-client-"));
  await mkdir(join(clientDir, "assets"));
  await writeFile(join(clientDir, "index.html"), "<!doctype html><title>The one page</title>");
  await writeFile(join(clientDir, "assets", "main-4f2a.js"), "export {};");
  for (const name of ["plan.worker-4f2a.js", "plan.workers-4f2a.js"])
    await writeFile(join(clientDir, "assets", name), "export {};");
  app = await startTestApp({ env: { CLIENT_DIR: clientDir } });
});
afterAll(async () => {
  await app.stop();
  await rm(clientDir, { recursive: true });
});

const headersOf = async (path: string): Promise<Headers> => (await app.visitor().send("GET", path)).headers;

describe("every answer", () => {
  it.each(["/", "/assets/main-4f2a.js", "/api/health", "/api/nothing", "/auth/csrf"])(
    "of %s forbids foreign scripts and frames, hides where one came from and has an id",
    async (path) => {
      const headers = await headersOf(path);
      const policy = new Map(
        (headers.get("content-security-policy") ?? "").split(";").map((part) => {
          const [name = "", ...values] = part.trim().split(" ");
          return [name, values.join(" ")];
        }),
      );
      expect(policy.get("default-src")).toBe("'self'");
      expect(policy.get("script-src")).toBe("'self' 'wasm-unsafe-eval'");
      expect(policy.get("worker-src")).toBe("'self' blob:");
      expect(policy.get("frame-ancestors")).toBe("'none'");
      // Over plain http it would break every page.
      expect(policy.has("upgrade-insecure-requests")).toBe(false);
      expect(headers.get("referrer-policy")).toBe("no-referrer");
      expect(headers.get("x-content-type-options")).toBe("nosniff");
      expect(headers.get("x-request-id")).toMatch(/^[0-9a-f-]{36}$/);
      expect(headers.has("x-powered-by")).toBe(false);
      expect(headers.has("strict-transport-security")).toBe(false);
    },
  );

  it("lets the worker that plans cuts, and nothing that is only named like it, load the geometry kernel", async () => {
    const worker = (await headersOf("/assets/plan.worker-4f2a.js")).get("content-security-policy");
    expect(worker).toContain("default-src 'none'");
    expect(worker).toContain("'unsafe-eval'");
    const other = (await headersOf("/assets/plan.workers-4f2a.js")).get("content-security-policy");
    expect(other).not.toContain("'unsafe-eval'");
  });

  it("over https asks for https from then on and marks the cookie secure", async () => {
    const secure = await startTestApp({ env: { PUBLIC_URL: "https://signs.example" } });
    try {
      const { headers } = await secure.visitor().send("GET", "/auth/csrf");
      expect(headers.get("strict-transport-security")).toBe("max-age=15552000");
      expect(headers.get("content-security-policy")).toContain("upgrade-insecure-requests");
      expect(
        headers.getSetCookie().every((cookie) => /^__(Host|Secure)-/.test(cookie) && /; Secure/.test(cookie)),
      ).toBe(true);
    } finally {
      await secure.stop();
    }
  });
});

describe("the browser's part", () => {
  it("is one page for every address that is no file, never kept by the browser", async () => {
    for (const path of ["/", "/shop/x/bench", `/link/${"t".repeat(43)}`, "/apiary"]) {
      const { status, text, headers } = await app.visitor().send("GET", path);
      expect({ status, text }).toEqual({ status: 200, text: "<!doctype html><title>The one page</title>" });
      expect(headers.get("cache-control")).toBe("no-store");
    }
  });

  it("keeps hashed files for a year, and a missing one is not the page", async () => {
    expect((await headersOf("/assets/main-4f2a.js")).get("cache-control")).toBe("public, max-age=31536000, immutable");
    expect((await app.visitor().send("GET", "/assets/main-0000.js")).status).toBe(404);
    expect((await app.visitor().send("GET", "/assets/..%2f..%2fetc%2fpasswd")).status).toBe(400);
  });

  it("leads from another name of this machine to the one that has the cookies, and nowhere else", async () => {
    const { port } = new URL(app.baseUrl);
    const location = await new Promise<string | undefined>((resolve, reject) => {
      const headers = { Host: `localhost:${port}` };
      request({ host: "127.0.0.1", port, path: "//evil.example/x", headers }, (answer) => {
        answer.resume();
        resolve(answer.headers.location);
      })
        .on("error", reject)
        .end();
    });
    expect(location).toBe(`${app.baseUrl}//evil.example/x`);
    expect(new URL(location ?? "").host).toBe(`127.0.0.1:${port}`);
  });
});

describe("what can't be read", () => {
  it.each([
    { what: "broken JSON", body: '{"email":', type: "application/json", code: "malformed_request", status: 400 },
    {
      what: "JSON that is no object",
      body: '"text"',
      type: "application/json",
      code: "malformed_request",
      status: 400,
    },
    {
      what: "another character set",
      body: "{}",
      type: "application/json; charset=klingon",
      code: "unsupported_type",
      status: 415,
    },
    {
      what: "too much",
      body: `{"email":"${"x".repeat(300_000)}"}`,
      type: "application/json",
      code: "too_large",
      status: 413,
    },
    {
      what: "a form",
      body: "email=a%40b.example",
      type: "application/x-www-form-urlencoded",
      code: "validation_failed",
      status: 422,
    },
  ])("$what is answered as a problem document", async ({ body, type, code, status }) => {
    const answer = await app.visitor().send("POST", "/api/links/request", { body, headers: { "Content-Type": type } });
    expect(answer.status).toBe(status);
    expect(answer.headers.get("content-type")).toContain("application/problem+json");
    const problem = problemSchema.parse(JSON.parse(answer.text));
    expect(problem).toMatchObject({ code, status, type: `/problems/${code}`, instance: "/api/links/request" });
    expect(problem.requestId).toBe(answer.headers.get("x-request-id"));
  });

  it("an address that is no address, and one that nobody registered", async () => {
    const malformed = await app.visitor().send("GET", "/api/shops/%E0%A4%A/clients");
    expect(JSON.parse(malformed.text)).toMatchObject({ code: "malformed_request", status: 400 });
    const unknown = await app.visitor().send("DELETE", "/api/me");
    expect(JSON.parse(unknown.text)).toMatchObject({ code: "not_found", status: 404 });
  });

  it("our own mistake tells the reader an id and the log the rest", async () => {
    // A table that is gone stands for any fault of ours.
    const owner = connect(app.database.ownerUrl, { poolMax: 1 });
    try {
      await owner.query("alter table people rename to persons");
      const answer = await app.visitor().send("POST", "/api/links/request", { body: { email: "a@b.example" } });
      const problem = JSON.parse(answer.text);
      expect(problem).toMatchObject({ code: "internal", status: 500, title: "Something went wrong on our side." });
      expect(answer.text).not.toContain("people");
      const line = app.logged.find((entry) => entry.includes(problem.requestId) && entry.includes('"err"')) ?? "";
      expect(line).toContain("SequelizeDatabaseError");
      expect(line).not.toContain("a@b.example");
    } finally {
      await owner.query("alter table persons rename to people");
      await owner.close();
    }
  });
});

describe("rate limits", () => {
  it.each([
    { path: "/auth/callback/password", body: { email: "a@b.example", password: "x" }, times: 30 },
    { path: "/api/register", body: {}, times: 10 },
    { path: "/api/links/request", body: {}, times: 15 },
    { path: "/api/links/inspect", body: {}, times: 60 },
  ])("$path answers 429 after $times tries", async ({ path, body, times }) => {
    const limited = await startTestApp({ env: { RATE_LIMIT_FACTOR: "1" } });
    try {
      const visitor = limited.visitor();
      const statuses: number[] = [];
      for (let time = 0; time < times; time += 1) statuses.push((await visitor.send("POST", path, { body })).status);
      expect(statuses).not.toContain(429);
      const answer = await visitor.send("POST", path, { body });
      expect(answer.status).toBe(429);
      expect(JSON.parse(answer.text)).toMatchObject({ code: "too_many_requests" });
      expect(Number(answer.headers.get("retry-after"))).toBeGreaterThan(0);
    } finally {
      await limited.stop();
    }
  });
});
