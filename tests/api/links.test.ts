import { request } from "node:http";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { tokenHash } from "#server/auth/tokens.ts";
import { Event } from "#server/models/event.ts";
import { Invitation } from "#server/models/invitation.ts";
import { OneTimeLink } from "#server/models/one-time-link.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Person } from "#server/models/person.ts";
import { Session } from "#server/models/session.ts";
import {
  acceptInvitation,
  forgotPassword,
  inspectLink,
  requestLink,
  resetPassword,
  sendFreshLink,
  whoAmI,
} from "#shared/contracts/account.ts";
import { inviteMember, revokeInvitation } from "#shared/contracts/shop.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { type BuiltContact, buildContact } from "../support/factories/client.ts";
import { buildMember, type Member } from "../support/factories/member.ts";
import { buildPerson, testPassword } from "../support/factories/person.ts";
import { caughtMails, tokenIn } from "../support/mail.ts";
import { signInAs } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 10 });
});
afterAll(() => app.stop());

async function newestTokenTo(address: string): Promise<string> {
  await app.runJobs();
  const mail = (await caughtMails(app)).find(({ to }) => to === address);
  return tokenIn(mail?.text ?? "");
}

async function mailedContact(): Promise<BuiltContact & { token: string }> {
  const built = await buildContact();
  await app.visitor().get(requestLink, { body: { email: built.email } });
  return { ...built, token: await newestTokenTo(built.email) };
}

async function invited(role: "maker" | "rep", email: string): Promise<{ owner: Member; token: string }> {
  const owner = await buildMember();
  const visitor = await signInAs(app, owner);
  await visitor.get(inviteMember, { params: { shop: owner.shop.slug }, body: { email, role } });
  return { owner, token: await newestTokenTo(email) };
}

const hasFailed = (url: URL): boolean => url.searchParams.has("error");

describe("a sign-in link", () => {
  it("is 43 characters of which only the hash is kept, and holds for 14 days", async () => {
    const { token, email, contact } = await mailedContact();
    const link = await OneTimeLink.findOne({ where: { address: email }, rejectOnEmpty: true });
    expect(token).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect(link).toMatchObject({ tokenHash: tokenHash(token), purpose: "sign in", contactId: contact.id });
    expect(link.expiresAt.getTime() - link.createdAt.getTime()).toBe(14 * 24 * 3_600_000);
  });

  it("signs its contact in once and is refused the second time", async () => {
    const { token, person, client } = await mailedContact();
    const visitor = app.visitor();
    expect(hasFailed(await visitor.signIn("link", { token }))).toBe(false);
    expect(await visitor.get(whoAmI)).toMatchObject({ person: { id: person.id }, session: "link" });
    const again = app.visitor();
    expect(hasFailed(await again.signIn("link", { token }))).toBe(true);
    expect((await again.get(whoAmI)).person).toBeNull();
    const events = await Event.findAll({ where: { shopId: client.shopId, kind: "signed in" } });
    expect(events.map(({ data, side }) => ({ data, side }))).toEqual([{ data: { by: "link" }, side: "client" }]);
  });

  it("lets exactly one of four in who use it at the same moment", async () => {
    const { token, person } = await mailedContact();
    const visitors = [1, 2, 3, 4].map(() => app.visitor());
    const urls = await Promise.all(visitors.map((visitor) => visitor.signIn("link", { token })));
    expect(urls.filter((url) => !hasFailed(url))).toHaveLength(1);
    expect(await Session.count({ where: { personId: person.id } })).toBe(1);
  });

  it("is not spent by a scanner that opens it or by the page that looks at it", async () => {
    const { token, email } = await mailedContact();
    const scanner = app.visitor();
    for (const path of [`/link/${token}`, `/auth/callback/link?token=${token}`, `/auth/signin/link?token=${token}`]) {
      await scanner.send("GET", path);
      await scanner.send("HEAD", path);
    }
    expect(scanner.cookies.has("authjs.session-token")).toBe(false);
    const seen = await scanner.get(inspectLink, { body: { token } });
    expect(seen).toMatchObject({ state: "open", purpose: "sign in", knownPerson: false });
    expect(seen.addressHint).toBe(`p•••••${email.slice(email.indexOf("@"))}`);
    expect(seen.shopName).toContain("Shop");
    const visitor = app.visitor();
    expect(hasFailed(await visitor.signIn("link", { token }))).toBe(false);
    expect((await scanner.get(inspectLink, { body: { token } })).state).toBe("spent");
  });

  it("is refused when it has run out, and when it was never ours", async () => {
    const { token } = await mailedContact();
    await OneTimeLink.update({ expiresAt: new Date(Date.now() - 1) }, { where: { tokenHash: tokenHash(token) } });
    expect(hasFailed(await app.visitor().signIn("link", { token }))).toBe(true);
    expect((await app.visitor().get(inspectLink, { body: { token } })).state).toBe("expired");

    const forged = `${token.slice(0, 42)}${token.endsWith("A") ? "B" : "A"}`;
    expect(hasFailed(await app.visitor().signIn("link", { token: forged }))).toBe(true);
    expect(await app.visitor().get(inspectLink, { body: { token: forged } })).toEqual({
      state: "unknown",
      purpose: null,
      shopName: null,
      addressHint: null,
      knownPerson: false,
      role: null,
      goTo: null,
    });
    expect((await app.visitor().refusal(inspectLink, { body: { token: "short" } })).code).toBe("validation_failed");
  });

  it("does not sign in where another kind of link was mailed", async () => {
    const person = await buildPerson();
    await app.visitor().get(forgotPassword, { body: { email: person.email } });
    const token = await newestTokenTo(person.email);
    expect(hasFailed(await app.visitor().signIn("link", { token }))).toBe(true);
    expect((await app.visitor().get(inspectLink, { body: { token } })).state).toBe("open");
  });

  it("a spent or expired one brings a fresh one to the same address, and the old one is dead", async () => {
    const { token, email, contact } = await mailedContact();
    const link = await OneTimeLink.findOne({ where: { tokenHash: tokenHash(token) }, rejectOnEmpty: true });
    await link.update({ expiresAt: new Date(Date.now() - 1), goTo: "/shop/x/sheets/y" });
    await app.visitor().get(sendFreshLink, { body: { token } });
    await link.reload();
    expect(link.killedAt).not.toBeNull();
    const fresh = await newestTokenTo(email);
    expect(fresh).not.toBe(token);
    expect(await OneTimeLink.count({ where: { contactId: contact.id } })).toBe(2);
    expect(hasFailed(await app.visitor().signIn("link", { token: fresh }))).toBe(false);
  });
});

describe("asking for mail", () => {
  it("answers alike whether the address or token is known or not, and mails nobody unknown", async () => {
    const { email } = await buildContact();
    const visitor = app.visitor();
    const before = await OutgoingMail.count();
    for (const [endpoint, known] of [
      [requestLink, email],
      [forgotPassword, email],
    ] as const) {
      const answers = await Promise.all(
        [known, "nobody@nowhere.example"].map((address) => visitor.ask(endpoint, { body: { email: address } })),
      );
      expect(answers.map(({ status, text }) => ({ status, text }))).toEqual([
        { status: 202, text: "" },
        { status: 202, text: "" },
      ]);
    }
    expect((await visitor.ask(sendFreshLink, { body: { token: "x".repeat(43) } })).status).toBe(202);
    expect(await OutgoingMail.count()).toBe(before + 2);
    expect((await visitor.refusal(requestLink, { body: { email: "not one" } })).errors).toEqual([
      { pointer: "/email", detail: "Write an e-mail address, like name@example.com." },
    ]);
  });

  it("stops at five mails an hour to one address, whoever asks", async () => {
    const { email } = await buildContact();
    for (let time = 0; time < 8; time += 1) await app.visitor().get(requestLink, { body: { email } });
    expect(await OutgoingMail.count({ where: { address: email } })).toBe(5);
  });

  it("the Host header does not bend the address of a link, nor where sign-in leads", async () => {
    const { email } = await buildContact();
    const visitor = app.visitor();
    // fetch() sets Host itself, so this one is written by hand.
    const port = Number(new URL(app.baseUrl).port);
    const post = (path: string, body: object): Promise<{ status: number; text: string }> =>
      new Promise((resolve, reject) => {
        const headers = {
          Host: "evil.example",
          "X-Forwarded-Host": "evil.example",
          "Content-Type": "application/json",
          "X-Standproud": "1",
          "X-Auth-Return-Redirect": "1",
          Cookie: [...visitor.cookies].map(([key, value]) => `${key}=${value}`).join("; "),
        };
        const sent = request({ host: "127.0.0.1", port, path, method: "POST", headers }, (answer) => {
          let text = "";
          answer.on("data", (chunk) => {
            text += chunk;
          });
          answer.on("end", () => resolve({ status: answer.statusCode ?? 0, text }));
        });
        sent.on("error", reject);
        sent.end(JSON.stringify(body));
      });
    expect((await post("/api/links/request", { email })).status).toBe(202);
    await app.runJobs();
    const mail = (await caughtMails(app)).find(({ to }) => to === email);
    expect(mail?.source).not.toContain("evil.example");
    expect(mail?.text).toContain(`${app.baseUrl}/link/`);

    const { csrfToken } = JSON.parse((await visitor.send("GET", "/auth/csrf")).text) as { csrfToken: string };
    const token = tokenIn(mail?.text ?? "");
    const { text } = await post("/auth/callback/link", { token, csrfToken, callbackUrl: "http://evil.example/" });
    expect(text).toBe(JSON.stringify({ url: app.baseUrl }));
  });
});

describe("a new password", () => {
  it("is set once by a mailed link, ends every session and proves the address", async () => {
    const person = await buildPerson({ addressProvenAt: null });
    await buildMember({ person });
    const signedIn = await signInAs(app, person);
    await app.visitor().get(forgotPassword, { body: { email: person.email } });
    const token = await newestTokenTo(person.email);
    const short = await app.visitor().refusal(resetPassword, { body: { token, password: "short" } });
    expect(short.errors?.[0]?.pointer).toBe("/password");

    const body = { token, password: "plover-in-reeds" };
    expect(await app.visitor().get(resetPassword, { body })).toEqual({ email: person.email });
    expect((await signedIn.get(whoAmI)).person).toBeNull();
    await person.reload();
    expect(person.addressProvenAt).not.toBeNull();
    const visitor = app.visitor();
    expect(hasFailed(await visitor.signIn("password", { email: person.email, password: testPassword }))).toBe(true);
    expect(hasFailed(await visitor.signIn("password", { email: person.email, password: "plover-in-reeds" }))).toBe(
      false,
    );
    expect((await app.visitor().refusal(resetPassword, { body })).code).toBe("link_spent");
  });

  it("is refused after an hour, and each new link ends the one before", async () => {
    const { email } = await buildPerson();
    await app.visitor().get(forgotPassword, { body: { email } });
    const token = await newestTokenTo(email);
    const link = await OneTimeLink.findOne({ where: { tokenHash: tokenHash(token) }, rejectOnEmpty: true });
    expect(link.expiresAt.getTime() - link.createdAt.getTime()).toBe(3_600_000);
    await link.update({ expiresAt: new Date(Date.now() - 1) });
    const body = { token, password: "plover-in-reeds" };
    expect((await app.visitor().refusal(resetPassword, { body })).code).toBe("link_expired");
    await app.visitor().get(sendFreshLink, { body: { token } });
    const fresh = await newestTokenTo(email);
    await app.visitor().get(sendFreshLink, { body: { token: fresh } });
    expect((await app.visitor().refusal(resetPassword, { body: { ...body, token: fresh } })).code).toBe("link_expired");
  });
});

describe("an invitation", () => {
  it("lets someone new join with a name and a password, once", async () => {
    const { owner, token } = await invited("maker", "new.hand@joinery.example");
    const seen = await app.visitor().get(inspectLink, { body: { token } });
    expect(seen).toMatchObject({ state: "open", purpose: "join shop", role: "maker", knownPerson: false });
    expect(seen.goTo).toBe(`/shop/${owner.shop.slug}/bench`);
    const bare = await app.visitor().refusal(acceptInvitation, { body: { token } });
    expect(bare.errors?.map(({ pointer }) => pointer)).toEqual(["/name", "/password"]);

    const body = { token, name: "Nell Hand", password: "dovetail-saw-7" };
    expect(await app.visitor().get(acceptInvitation, { body })).toEqual({
      shop: owner.shop.slug,
      email: "new.hand@joinery.example",
    });
    const visitor = app.visitor();
    await visitor.signIn("password", { email: "new.hand@joinery.example", password: "dovetail-saw-7" });
    expect((await visitor.get(whoAmI)).memberOf).toMatchObject([{ shop: owner.shop.slug, role: "maker" }]);
    expect((await app.visitor().refusal(acceptInvitation, { body })).code).toBe("link_spent");
    const joined = await Event.findOne({ where: { shopId: owner.shop.id, kind: "member joined" } });
    expect(joined).toMatchObject({ who: "Nell Hand", data: { role: "maker" } });
  });

  it("asks someone with a password to sign in first, as the invited address", async () => {
    const known = await buildPerson();
    const { owner, token } = await invited("rep", known.email);
    expect((await app.visitor().get(inspectLink, { body: { token } })).knownPerson).toBe(true);
    const body = { token, name: "Imposter", password: "i-know-the-link" };
    expect((await app.visitor().refusal(acceptInvitation, { body })).code).toBe("not_signed_in");
    const other = await signInAs(app, await buildPerson());
    expect((await other.refusal(acceptInvitation, { body: { token } })).code).toBe("not_signed_in");
    const visitor = await signInAs(app, known);
    await visitor.get(acceptInvitation, { body: { token } });
    expect((await visitor.get(whoAmI)).memberOf).toMatchObject([{ shop: owner.shop.slug, role: "rep" }]);
    await known.reload();
    expect(known.name).not.toBe("Imposter");
  });

  it("lets exactly one of four in who accept it at the same moment", async () => {
    const { owner, token } = await invited("maker", "many.hands@joinery.example");
    const answers = await Promise.all(
      [1, 2, 3, 4].map((hand) =>
        app.visitor().ask(acceptInvitation, { body: { token, name: `Hand ${hand}`, password: "dovetail-saw-7" } }),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410, 410, 410]);
    const joined = await Event.count({ where: { shopId: owner.shop.id, kind: "member joined" } });
    expect(joined).toBe(1);
    expect(await Person.count({ where: { email: "many.hands@joinery.example" } })).toBe(1);
  });

  it("stops working at once when it is taken back, and brings no fresh link", async () => {
    const email = "taken.back@joinery.example";
    const { owner, token } = await invited("maker", email);
    const invitation = await Invitation.findOne({ where: { email }, rejectOnEmpty: true });
    const visitor = await signInAs(app, owner);
    const params = { shop: owner.shop.slug, invitationId: invitation.id };
    await visitor.get(revokeInvitation, { params });
    const body = { token, name: "Late", password: "dovetail-saw-7" };
    expect((await app.visitor().refusal(acceptInvitation, { body })).code).toBe("link_expired");
    const before = await OutgoingMail.count();
    await app.visitor().get(sendFreshLink, { body: { token } });
    expect(await OutgoingMail.count()).toBe(before);
  });
});

describe("secrets", () => {
  it("no token, password or cookie stands in the log, a job row or a mail row", async () => {
    const { token, email } = await mailedContact();
    const visitor = app.visitor();
    await visitor.signIn("link", { token });
    await visitor.send("GET", `/link/${token}`);
    await visitor.send("GET", `/api/share/${token}`);
    await visitor.send("GET", `/auth/callback/link?token=${token}`);
    await visitor.get(whoAmI);
    const member = await buildMember();
    await signInAs(app, member);
    await app.visitor().get(requestLink, { body: { email } });

    const log = app.logged.join("");
    expect(log).toContain("/link/[token]");
    expect(log).toContain("/api/share/[token]");
    const cookie = visitor.cookies.get("authjs.session-token") ?? "missing";
    for (const secret of [token, tokenHash(token), testPassword, cookie]) expect(log).not.toContain(secret);
    const jobs = JSON.stringify(await app.queuedJobs());
    expect(jobs).toContain("send-mail");
    const mails = JSON.stringify(await OutgoingMail.findAll({ raw: true }));
    for (const rows of [jobs, mails]) expect(rows).not.toMatch(/[A-Za-z0-9_-]{43}/);
  });
});
