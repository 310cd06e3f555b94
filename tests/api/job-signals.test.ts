import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Note } from "#server/models/note.ts";
import { Session } from "#server/models/session.ts";
import { endSession, listSessions } from "#shared/contracts/account.ts";
import { removeContact } from "#shared/contracts/clients.ts";
import { streamJobSignals } from "#shared/contracts/job-signals.ts";
import { addNote, setNoteState } from "#shared/contracts/notes.ts";
import { withdrawRevision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { type EventReader, readEvents } from "../support/event-stream.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { runSql } from "../support/run-sql.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";
import type { Visitor } from "../support/visitor.ts";

let app: TestApp;
let world: World;
let template: string;
const readers: EventReader[] = [];
beforeAll(async () => {
  app = await startTestApp({ poolMax: 10 });
  world = await buildWorld(app);
  const document = buildSign([buildLayer("B", [plate("p1", 90, 40, [200, 200])])]);
  template = (await buildRevision(app, world, { document })).id;
});
afterAll(async () => {
  for (const reader of readers) reader.leave();
  await app.stop();
});

const issued = () => buildIssued(app, world, template);

async function look(own: World, visitor: Visitor, after?: number, headers?: Record<string, string>) {
  const path = `/api/shops/${own.params.shop}/jobs/${own.job.id}/signals${after === undefined ? "" : `?after=${after}`}`;
  const reader = await readEvents(app.baseUrl, visitor, path, headers);
  readers.push(reader);
  return reader;
}

const say = (own: World, visitor: Visitor, revisionId: string, shopOnly = false) =>
  visitor.get(addNote, {
    params: { ...own.params, revisionId },
    body: { text: "Please widen", kind: "question", anchor: { on: "whole" }, shopOnly },
  });

describe("whoever looks at a job", () => {
  it("hears at once that a note was left, by its id and without a word of it", async () => {
    const { own, revisionId } = await issued();
    const maker = await look(own, own.visitors.maker);
    const client = await look(own, own.visitors.approver);
    const note = await say(own, own.visitors.approver, revisionId);
    expect(await maker.until(1)).toEqual([{ kind: "note", id: note.id }]);
    expect(await client.until(1)).toEqual([{ kind: "note", id: note.id }]);
    expect(JSON.stringify([...maker.events, ...client.events])).not.toMatch(/widen|question/);
  });

  it("hears nothing of the shop's own notes as a client, and can't count them", async () => {
    const { own, revisionId } = await issued();
    const maker = await look(own, own.visitors.maker);
    const client = await look(own, own.visitors.approver);
    const first = await say(own, own.visitors.maker, revisionId);
    const secret = await say(own, own.visitors.maker, revisionId, true);
    await own.visitors.maker.get(setNoteState, {
      params: { ...own.params, noteId: secret.id },
      body: { state: "settled" },
    });
    const last = await say(own, own.visitors.maker, revisionId);
    expect((await maker.until(4)).map(({ id }) => id)).toEqual([first.id, secret.id, secret.id, last.id]);
    expect((await client.until(2)).map(({ id }) => id)).toEqual([first.id, last.id]);
    const ids = client.events.map(({ id }) => Number(id));
    expect(ids).toEqual([ids[0], (ids[0] ?? 0) + 1, (ids[0] ?? 0) + 2]);
  });

  it("misses nothing of a break: it goes on after what its browser had last", async () => {
    const { own, revisionId } = await issued();
    const before = await look(own, own.visitors.approver);
    await say(own, own.visitors.approver, revisionId);
    await before.until(1);
    const had = before.events.at(-1)?.id ?? "";
    before.leave();
    const missed = [
      await say(own, own.visitors.maker, revisionId),
      await say(own, own.visitors.maker, revisionId, true),
      await say(own, own.visitors.approver, revisionId),
    ];
    const after = await look(own, own.visitors.approver, 0, { "Last-Event-ID": had });
    expect((await after.until(2)).map(({ id }) => id)).toEqual([missed[0]?.id, missed[2]?.id]);
  });

  it("hears of a revision that is taken back, and of nothing on another job", async () => {
    const [here, there] = [await issued(), await issued()];
    const reader = await look(here.own, here.own.visitors.maker);
    await say(there.own, there.own.visitors.maker, there.revisionId);
    await here.own.visitors.maker.get(withdrawRevision, {
      params: { ...here.own.params, revisionId: here.revisionId },
      body: { reason: "Wrong wood" },
    });
    expect(await reader.until(1)).toEqual([{ kind: "revision", id: here.revisionId }]);
  });

  it("gets ten notes left in one moment in one row without a gap", async () => {
    const { own, revisionId } = await issued();
    const reader = await look(own, own.visitors.maker);
    await Promise.all(
      Array.from({ length: 10 }, (_, turn) => say(own, own.visitors.maker, revisionId, turn % 3 === 0)),
    );
    await reader.until(10);
    const numbers = reader.events.filter(({ event }) => event === "signal").map(({ id }) => Number(id));
    expect(numbers).toEqual(Array.from({ length: 10 }, (_, index) => (numbers[0] ?? 0) + index));
    const notes = await Note.findAll({ where: { jobId: own.job.id } });
    expect(new Set(reader.signals().map(({ id }) => id))).toEqual(new Set(notes.map(({ id }) => id)));
  });
});

describe("a stream ends", () => {
  it("at once when the session does", async () => {
    const { own } = await issued();
    const visitor = await signInAs(app, await buildMember({ shop: own.owner.shop, role: "maker" }));
    const reader = await look(own, visitor);
    const [session] = (await visitor.get(listSessions)).items;
    await visitor.get(endSession, { params: { sessionId: session?.id ?? "" } });
    await reader.ended();
  });

  it("at once when the contact is taken away, without a word of what comes after", async () => {
    const { own, revisionId } = await issued();
    const contact = await buildContact({ client: own.approver.client });
    const visitor = await signInByMail(app, contact);
    const reader = await look(own, visitor);
    expect(reader.status).toBe(200);
    await own.visitors.owner.get(removeContact, { params: { ...own.params, contactId: contact.contact.id } });
    await say(own, own.visitors.maker, revisionId);
    await reader.ended();
    expect(reader.signals()).toEqual([]);
  });

  it("when the session runs out: a page that lies open does not prolong it", async () => {
    const { own, revisionId } = await issued();
    const visitor = await signInAs(app, await buildMember({ shop: own.owner.shop, role: "maker" }));
    const { items } = await visitor.get(listSessions);
    const where = { where: { id: items[0]?.id ?? "" } };
    const longAgo = new Date(Date.now() - 3_600_000);
    await Session.update({ lastSeenAt: longAgo }, where);
    const given = { params: { ...own.params, jobId: own.job.id }, query: { after: 0, once: "1" as const } };
    expect((await visitor.ask(streamJobSignals, given)).status).toBe(200);
    expect((await Session.findOne({ ...where, rejectOnEmpty: true })).lastSeenAt).toEqual(longAgo);
    // Whereas who reads anything else is there.
    await visitor.get(listSessions);
    expect((await Session.findOne({ ...where, rejectOnEmpty: true })).lastSeenAt.getTime()).toBeGreaterThan(
      longAgo.getTime(),
    );
    const reader = await look(own, visitor);
    await Session.update({ expiresAt: new Date(Date.now() - 1000) }, where);
    await say(own, own.visitors.maker, revisionId);
    await reader.ended();
  });

  it("after what there is when that is all that was asked for", async () => {
    const { own, revisionId } = await issued();
    const note = await say(own, own.visitors.maker, revisionId);
    const text = await own.visitors.maker.ask(streamJobSignals, {
      params: { ...own.params, jobId: own.job.id },
      query: { after: 0, once: "1" },
    });
    expect(text.status).toBe(200);
    expect(text.headers.get("content-type")).toMatch(/^text\/event-stream/);
    expect(text.text).toContain(`data: ${JSON.stringify({ kind: "note", id: note.id })}`);
  });
});

it("of a job that one may not see there is no stream", async () => {
  const { own } = await issued();
  const elsewhere = await signInByMail(
    app,
    await buildContact({ client: await buildClient({ shop: own.owner.shop }) }),
  );
  const otherShop = await signInAs(app, await buildMember());
  for (const visitor of [elsewhere, otherShop]) expect((await look(own, visitor)).status).toBe(404);
  expect((await look(own, app.visitor())).status).toBe(401);
  expect((await look({ ...own, job: { ...own.job, id: own.owner.shop.id } }, own.visitors.maker)).status).toBe(404);
});

it("what happens while the connection to the database is broken is told when it is back", async () => {
  const { own, revisionId } = await issued();
  const reader = await look(own, own.visitors.maker);
  const broken = await runSql(
    process.env.TEST_CLUSTER_URL ?? "",
    "select pg_terminate_backend(pid) from pg_stat_activity where datname = $1 and query like 'listen %'",
    [new URL(app.database.appUrl).pathname.slice(1)],
  );
  expect(broken).toHaveLength(1);
  const note = await say(own, own.visitors.maker, revisionId);
  expect(await reader.until(1)).toEqual([{ kind: "note", id: note.id }]);
});
