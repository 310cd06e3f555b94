import { readdir, stat } from "node:fs/promises";
import { join } from "node:path";
import { setTimeout } from "node:timers/promises";
import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Person } from "#server/models/person.ts";
import { Session } from "#server/models/session.ts";
import {
  acceptInvitation,
  changePassword,
  endSession,
  listSessions,
  registerShop,
  requestLink,
  whoAmI,
} from "#shared/contracts/account.ts";
import { getPicture } from "#shared/contracts/revisions.ts";
import { inviteMember } from "#shared/contracts/shop.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { testPassword } from "../support/factories/person.ts";
import { artworksPath, buildRevision, buildWorld, formWith, plainSvg } from "../support/factories/work.ts";
import { caughtMails, tokenIn } from "../support/mail.ts";
import { runSql } from "../support/run-sql.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

describe("an address that somebody else opened an account with", () => {
  it("is not proven by its reader accepting an invitation while signed in by a link", async () => {
    const email = "harbour.master@quay.example";
    const password = "squatting-here";
    await app.visitor().get(registerShop, { body: { shopName: "Squat", name: "S. Quat", email, password } });
    const squatter = app.visitor();
    await squatter.signIn("password", { email, password });
    const person = await Person.findOne({ where: { email }, rejectOnEmpty: true });
    await buildContact({ client: await buildClient(), person });
    const reader = await signInByMail(app, { email });

    const owner = await buildMember();
    const inviter = await signInAs(app, owner);
    await inviter.get(inviteMember, { params: { shop: owner.shop.slug }, body: { email, role: "owner" } });
    await app.runJobs();
    const mail = (await caughtMails(app)).find(({ to }) => to === email);
    const body = { token: tokenIn(mail?.text ?? "") };
    expect((await reader.refusal(acceptInvitation, { body })).code).toBe("not_signed_in");

    // Nor does the squatter see or end where the reader is signed in.
    const seen = (await squatter.get(listSessions)).items;
    expect(seen.map(({ began }) => began)).toEqual(["password"]);
    const { id: sessionId } = (await reader.get(listSessions)).items[0] ?? { id: "" };
    expect((await squatter.refusal(endSession, { params: { sessionId } })).code).toBe("not_found");
    const change = { current: password, password: "squatting-still" };
    await squatter.get(changePassword, { body: change });
    expect((await reader.get(whoAmI)).session).toBe("link");

    const { memberOf, contactOf } = await squatter.get(whoAmI);
    expect(memberOf.map(({ shopName }) => shopName)).toEqual(["Squat"]);
    expect(contactOf).toEqual([]);
  });
});

describe("a password that is being changed", () => {
  it("lets nobody in who typed the old one a moment before", async () => {
    const { email, person } = await buildMember();
    const owner = new pg.Client({ connectionString: app.database.ownerUrl });
    await owner.connect();
    try {
      await owner.query("begin");
      await owner.query("update people set password_hash = 'changed' where id = $1", [person.id]);
      // It reads the old hash, which is not gone yet, and finds it right.
      const visitor = app.visitor();
      const signedIn = visitor.signIn("password", { email, password: testPassword });
      await untilSomebodyWaits(owner);
      await owner.query("commit");
      expect((await signedIn).searchParams.get("error")).toBe("CredentialsSignin");
      expect(await Session.count({ where: { personId: person.id } })).toBe(0);
    } finally {
      await owner.end();
    }
  });

  /** Until another connection to this database waits for a row. */
  async function untilSomebodyWaits(client: pg.Client): Promise<void> {
    for (let round = 0; round < 500; round += 1) {
      const { rows } = await client.query(
        "select 1 from pg_locks where not granted and pid in (select pid from pg_stat_activity where datname = current_database())",
      );
      if (rows.length > 0) return;
      await setTimeout(10);
    }
    throw new Error("Nobody waits for the row.");
  }
});

describe("a large body", () => {
  it("is not read for somebody without a session", async () => {
    const path = "/api/shops/any/jobs/11111111-1111-4111-8111-111111111111/mockup";
    const headers = { "Content-Type": "application/json" };
    const body = `{"version":0,"document":"${"x".repeat(1_000_000)}`;
    const answer = await app.visitor().send("PUT", path, { body, headers });
    expect(JSON.parse(answer.text)).toMatchObject({ code: "not_signed_in" });
    const visitor = await signInAs(app, await buildMember());
    expect(JSON.parse((await visitor.send("PUT", path, { body, headers })).text).code).toBe("malformed_request");
  });

  it("that is wrong all over is answered with its first fifty faults", async () => {
    const fields = Object.fromEntries(Array.from({ length: 10_000 }, (_, index) => [`f${index}`, 0]));
    const answer = await app.visitor().send("POST", "/api/links/request", { body: fields });
    const { code, errors } = JSON.parse(answer.text) as { code: string; errors: { pointer: string }[] };
    expect(code).toBe("validation_failed");
    expect(errors).toHaveLength(50);
    expect(errors[0]?.pointer).toBe("/email");
    expect(errors[49]?.pointer).toBe("/f48");
  });
});

describe("heavy work of one shop", () => {
  it("carries the flag by which the queue passes over more of it, so that mails of the others go on", async () => {
    const world = await buildWorld(app);
    await world.visitors.owner.send("POST", artworksPath(world), { body: formWith("logo.svg", plainSvg()) });
    await app.visitor().get(requestLink, { body: { email: world.approver.email } });
    const rows = await runSql(
      app.database.ownerUrl,
      "select task_identifier as task, flags from graphile_worker.jobs order by id",
    );
    expect(rows).toEqual([
      { task: "import-artwork", flags: { "import-artwork": true } },
      { task: "send-mail", flags: null },
    ]);
    await app.runJobs();
  });
});

describe("what is kept", () => {
  it("is on the disk for the server's own user alone, and the picture of a sign runs nothing", async () => {
    const world = await buildWorld(app);
    const revision = await buildRevision(app, world);
    const open: string[] = [];
    const walk = async (folder: string): Promise<void> => {
      for (const entry of await readdir(folder, { withFileTypes: true })) {
        const path = join(folder, entry.name);
        if (((await stat(path)).mode & 0o077) !== 0) open.push(path);
        if (entry.isDirectory()) await walk(path);
      }
    };
    await walk(app.services.env.FILES_DIR);
    expect(open).toEqual([]);
    expect(await readdir(join(app.services.env.FILES_DIR, "kept"))).toContain(world.owner.shop.id);

    const params = { ...world.params, revisionId: revision.id };
    const picture = await world.visitors.rep.ask(getPicture, { params });
    expect(picture.headers.get("content-type")).toBe("image/svg+xml");
    expect(picture.headers.get("content-security-policy")).toMatch(/^sandbox; default-src 'none'/);
  });
});
