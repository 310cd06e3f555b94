import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildMember } from "../support/factories/member.ts";
import { testPassword } from "../support/factories/person.ts";
import type { Answer, Visitor } from "../support/visitor.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ env: { RATE_LIMIT_FACTOR: "1" } });
});
afterAll(() => app.stop());

/** A guess at a password, from an address of the guesser's choice. */
async function guess(
  visitor: Visitor,
  { email, password, path = "/auth/callback/password", from = "203.0.113.1" }: Record<string, string>,
): Promise<Answer> {
  const { csrfToken } = JSON.parse((await visitor.send("GET", "/auth/csrf")).text) as { csrfToken: string };
  return visitor.send("POST", path, {
    body: { email, password, csrfToken },
    headers: { "X-Forwarded-For": from, "X-Auth-Return-Redirect": "1" },
  });
}

describe("guessing a password", () => {
  it.each([
    "/auth//callback/password",
    "/auth/callback//password",
    "/auth/callback/password//",
    "/auth/signin/password",
  ])("finds no way round the limits by %s", async (path) => {
    const { email } = await buildMember();
    const visitor = app.visitor();
    const answer = await guess(visitor, { email, password: testPassword, path });
    expect(answer.status).toBe(404);
    expect(visitor.cookies.has("authjs.session-token")).toBe(false);
  });
});

describe("an account that is guessed at by opening shops with its address", () => {
  it("counts each guess, from wherever it comes", async () => {
    const { email } = await buildMember();
    const body = { shopName: "Guess", name: "G. Uess", email: email.toUpperCase(), password: "not the password" };
    const statuses: number[] = [];
    for (let time = 0; time < 50; time += 1) {
      const headers = { "X-Forwarded-For": `198.51.100.${Math.floor(time / 10)}` };
      statuses.push((await app.visitor().send("POST", "/api/register", { body, headers })).status);
    }
    expect(new Set(statuses)).toEqual(new Set([409]));
    const answer = await guess(app.visitor(), { email, password: testPassword, from: "198.51.100.99" });
    expect(answer.status).toBe(429);
  });
});

describe("work that costs us much", () => {
  const nobody = "00000000-0000-4000-8000-000000000000";
  it.each([
    { what: "artwork and photos of walls together", paths: ["jobs/ID/artworks", "jobs/ID/wall-photos"], times: 60 },
    { what: "pictures traced again", paths: ["artworks/ID/trace"], times: 120 },
  ])("is counted by the address it comes from: $what", async ({ paths, times }) => {
    const visitor = app.visitor();
    const headers = { "X-Forwarded-For": "203.0.113.77" };
    const ask = (index: number) =>
      visitor.send("POST", `/api/shops/any/${paths[index % paths.length]?.replace("ID", nobody)}`, { headers });
    for (let index = 0; index < times; index += 1) expect((await ask(index)).status).toBe(401);
    for (const index of paths.keys()) expect((await ask(index)).status).toBe(429);
  });
});
