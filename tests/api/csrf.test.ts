import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Client } from "#server/models/client.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildMember } from "../support/factories/member.ts";
import { testPassword } from "../support/factories/person.ts";
import { signInAs } from "../support/sign-in.ts";
import type { Visitor } from "../support/visitor.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

/** A write with the reader's cookie and exactly these headers. */
async function write(
  visitor: Visitor,
  path: string,
  headers: Record<string, string>,
  body: unknown,
): Promise<Response> {
  const cookie = [...visitor.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
  return fetch(app.baseUrl + path, {
    method: "POST",
    headers: { Cookie: cookie, "Content-Type": "application/json", ...headers },
    body: JSON.stringify(body),
  });
}

describe("a write that a foreign page caused", () => {
  it.each([
    { what: "without our header", headers: {} },
    { what: "with another value in our header", headers: { "X-Standproud": "yes" } },
    { what: "from another origin", headers: { "X-Standproud": "1", Origin: "http://evil.example" } },
    { what: "from an origin that is hidden", headers: { "X-Standproud": "1", Origin: "null" } },
    { what: "from our host by another scheme", headers: { "X-Standproud": "1", Origin: "https://127.0.0.1" } },
  ])("is refused $what, and changes nothing", async ({ headers }) => {
    const { shop, email } = await buildMember();
    const visitor = await signInAs(app, { email });
    const answer = await write(visitor, `/api/shops/${shop.slug}/clients`, headers as Record<string, string>, {
      name: "X",
    });
    expect(answer.status).toBe(403);
    expect(answer.headers.get("content-type")).toContain("application/problem+json");
    expect(await answer.json()).toMatchObject({ code: "forged_request", instance: `/api/shops/${shop.slug}/clients` });
    expect(await Client.count({ where: { shopId: shop.id } })).toBe(0);
  });

  it("is taken from our own page", async () => {
    const { shop, email } = await buildMember();
    const visitor = await signInAs(app, { email });
    const headers = { "X-Standproud": "1", Origin: app.baseUrl };
    expect((await write(visitor, `/api/shops/${shop.slug}/clients`, headers, { name: "X" })).status).toBe(201);
    expect(await Client.count({ where: { shopId: shop.id } })).toBe(1);
  });

  it("can't sign its reader in as somebody else", async () => {
    const { email } = await buildMember();
    const visitor = app.visitor();
    const { csrfToken } = JSON.parse((await visitor.send("GET", "/auth/csrf")).text) as { csrfToken: string };
    const fields = { email, password: testPassword, csrfToken };
    const answer = await write(visitor, "/auth/callback/password", { Origin: "http://evil.example" }, fields);
    expect(answer.status).toBe(403);
    expect(answer.headers.getSetCookie()).toEqual([]);
  });

  it("gets no leave to read: no CORS header answers it", async () => {
    const answer = await fetch(`${app.baseUrl}/api/me`, { headers: { Origin: "http://evil.example" } });
    expect([...answer.headers.keys()].filter((name) => name.startsWith("access-control"))).toEqual([]);
    const preflight = await fetch(`${app.baseUrl}/api/register`, {
      method: "OPTIONS",
      headers: { Origin: "http://evil.example", "Access-Control-Request-Headers": "x-standproud" },
    });
    expect([...preflight.headers.keys()].filter((name) => name.startsWith("access-control"))).toEqual([]);
  });
});
