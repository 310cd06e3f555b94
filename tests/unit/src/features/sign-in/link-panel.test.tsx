// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { z } from "zod";
import type { inspectLink, Me } from "#shared/contracts/account.ts";
import { LinkPanel } from "@/features/sign-in/components/link-panel.tsx";
import { type Asked, startAnswers } from "../../support/answers.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";

type Link = z.infer<typeof inspectLink.result>;

const nobody: Me = { person: null, session: null, memberOf: [], contactOf: [] };
const open: Link = {
  state: "open",
  purpose: "sign in",
  shopName: "Copperlark Signs",
  addressHint: "c•••••@orrery.example",
  knownPerson: true,
  role: null,
  goTo: "/shop/copperlark-signs/bench",
};
const notWhole = {
  type: "/problems/validation_failed",
  title: "Check the highlighted fields.",
  status: 422,
  code: "validation_failed",
  errors: [{ pointer: "/token", detail: "This link is not complete. Open it from the mail again." }],
  instance: "/api/links/inspect",
  requestId: "r1",
};
let link = open;
let refused = false;
let isWhole = true;
let me = nobody;
let server: Awaited<ReturnType<typeof startAnswers>>;

beforeAll(async () => {
  server = await startAnswers(({ path }) => {
    if (path === "/api/links/inspect" && !isWhole) return { status: 422, json: notWhole };
    if (path === "/api/links/inspect") return { status: 200, json: link };
    if (path === "/api/me") return { status: 200, json: me };
    if (path === "/auth/signout") {
      me = nobody;
      return { status: 200, json: { url: "http://x.example/" } };
    }
    if (path === "/auth/csrf") return { status: 200, json: { csrfToken: "t0" } };
    if (path === "/api/links/fresh") return { status: 202 };
    if (path === "/api/invitations/accept") {
      return { status: 200, json: { shop: "copperlark-signs", email: "newhand@copperlark.example" } };
    }
    return { status: 200, json: { url: refused ? "http://x.example/?error=CredentialsSignin" : "http://x.example/" } };
  });
});
afterAll(() => server.end());
beforeEach(() => {
  link = open;
  refused = false;
  isWhole = true;
  me = nobody;
  server.asked.length = 0;
});

async function openPage(): Promise<() => string> {
  const router = createMemoryRouter([
    { path: "/", element: <LinkPanel token="secret-of-the-link" /> },
    { path: "*", element: <p>arrived</p> },
  ]);
  await render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  await until(() => document.querySelector("h1"));
  return () => router.state.location.pathname;
}
const writes = (): Asked[] => server.asked.filter(({ path }) => path !== "/api/links/inspect" && path !== "/api/me");

describe("the page of a mailed link", () => {
  it("spends nothing by being opened", async () => {
    await openPage();
    expect(button("Open Copperlark Signs")).toBeTruthy();
    expect(writes()).toEqual([]);
  });

  it("spends the link when the button is pressed, and leads on", async () => {
    const where = await openPage();
    await press(button("Open Copperlark Signs"));
    await until(() => where() === "/shop/copperlark-signs/bench");
    expect(writes().map(({ path, body }) => [path, body])).toEqual([
      ["/auth/csrf", null],
      ["/auth/callback/link", { token: "secret-of-the-link", csrfToken: "t0", callbackUrl: window.location.origin }],
    ]);
  });

  it("offers a fresh link when another was quicker", async () => {
    refused = true;
    const where = await openPage();
    await press(button("Open Copperlark Signs"));
    await until(() => document.body.textContent?.includes("has been used or has run out"));
    expect(button("Send a fresh one to the same address")).toBeTruthy();
    expect(where()).toBe("/");
  });

  it.each([
    { state: "spent", heading: "This link has been used" },
    { state: "expired", heading: "This link has run out" },
  ] as const)("a $state link sends a fresh one to the same address only", async ({ state, heading }) => {
    link = { ...open, state };
    await openPage();
    expect(document.querySelector("h1")?.textContent).toBe(heading);
    await press(button("Send a fresh one to the same address"));
    await until(() => document.body.textContent?.includes("A fresh link is on its way"));
    expect(writes()).toEqual([{ method: "POST", path: "/api/links/fresh", body: { token: "secret-of-the-link" } }]);
  });

  it("says of a link that was cut short what to do, and nothing of fields", async () => {
    isWhole = false;
    await openPage();
    expect(document.querySelector("h1")?.textContent).toBe("This link is not known");
    expect(document.body.textContent).not.toContain("fields");
    expect(document.querySelector("a")?.getAttribute("href")).toBe("/sign-in");
  });

  it("lets those who are still signed in go on from a used link", async () => {
    link = { ...open, state: "spent" };
    me = {
      ...nobody,
      person: {
        id: "00000000-0000-4000-8000-000000000007",
        name: "Ines Calloway",
        email: "client@orrery.example",
        hasPassword: false,
      },
      session: "link",
    };
    const where = await openPage();
    expect(document.body.textContent).toContain("still signed in here as client@orrery.example");
    await press(button("Go on"));
    await until(() => where() === "/shop/copperlark-signs/bench");
    expect(writes()).toEqual([]);
  });

  it("lets someone new join with name and password, and signs them in", async () => {
    link = { ...open, purpose: "join shop", knownPerson: false, role: "maker" };
    const where = await openPage();
    await type(field("Your name"), "Jory Tallow");
    await type(field("Password"), "short");
    await press(button("Join Copperlark Signs"));
    await until(() => document.body.textContent?.includes("A password has at least 10 characters."));
    expect(writes()).toEqual([]);
    await type(field("Password"), "plain words in a row");
    await press(button("Join Copperlark Signs"));
    await until(() => where() === "/shop/copperlark-signs/bench");
    expect(writes().find(({ path }) => path === "/api/invitations/accept")?.body).toEqual({
      token: "secret-of-the-link",
      name: "Jory Tallow",
      password: "plain words in a row",
    });
  });

  it.each([
    { who: "nobody is signed in", session: null },
    { who: "a mailed link signed them in", session: "link" as const },
  ])("asks someone known for their password when $who, and comes back to the link", async ({ session }) => {
    link = { ...open, purpose: "join shop", knownPerson: true };
    const person = { id: "p1", name: "Ida Fenn", email: "ida@saltgrass.example", hasPassword: true };
    me = session ? { ...nobody, person, session } : nobody;
    await openPage();
    const way = [...document.querySelectorAll("a")].find((a) => a.textContent === "Sign in to accept");
    expect(way?.getAttribute("href")).toBe("/sign-in?next=%2Flink%2Fsecret-of-the-link");
  });

  it("lets someone else's session go, and then asks who is there", async () => {
    link = { ...open, purpose: "join shop", knownPerson: true };
    me = {
      ...nobody,
      person: { id: "p1", name: "Ida Fenn", email: "ida@saltgrass.example", hasPassword: true },
      session: "password",
    };
    await openPage();
    await until(() => document.body.textContent?.includes("You are signed in as ida@saltgrass.example."));
    await press(button("That is not me"));
    await until(() => document.body.textContent?.includes("Sign in with it to accept."));
  });
});
