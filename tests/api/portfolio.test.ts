import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { ShareLink } from "#server/models/share-link.ts";
import { setConsent } from "#shared/contracts/jobs.ts";
import { addNote } from "#shared/contracts/notes.ts";
import {
  listPortfolioPieces,
  listShareLinks,
  makeShareLink,
  openShareLink,
  revokeShareLink,
} from "#shared/contracts/portfolio.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { approve } from "../support/decide.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { runSql } from "../support/run-sql.ts";
import { signInAs } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
let heron: World;
let weir: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  heron = await approved("Heron");
  weir = await approved("Weir");
});
afterAll(() => app.stop());

const sign = (width: number) => buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]);
async function approved(title: string): Promise<World> {
  const own = await buildJob(world, { title });
  const { id } = await buildRevision(app, own, { document: sign(90) });
  await own.visitors.approver.get(addNote, {
    params: { ...own.params, revisionId: id },
    body: { text: "Between ourselves", kind: "question", anchor: { on: "whole" } },
  });
  await approve(own, id, { consentToPortfolio: true });
  await app.runJobs();
  return own;
}
const consent = (own: World, given: boolean) =>
  own.visitors.approver.get(setConsent, { params: { ...own.params, jobId: own.job.id }, body: { given } });
const make = (jobIds: string[], rest: { label?: string; days?: number } = {}, visitor = world.visitors.rep) =>
  visitor.get(makeShareLink, { params: world.params, body: { label: "For the town hall", jobIds, ...rest } });
const tokenOf = (url: string): string => url.split("/").at(-1) ?? "";

describe("the portfolio", () => {
  it("lists approved pieces, newest first, with whether they may be shown", async () => {
    const unapproved = await buildJob(world, { title: "Not yet" });
    await buildRevision(app, unapproved, { document: sign(90) });
    await consent(weir, false);
    const { maker } = world.visitors;
    const first = await maker.get(listPortfolioPieces, { params: world.params, query: { limit: 1 } });
    expect(first.items).toMatchObject([
      { title: "Weir", letter: "A", widthMm: 600, heightMm: 400, consent: false, client: world.approver.client.name },
    ]);
    const rest = await maker.get(listPortfolioPieces, { params: world.params, query: { cursor: first.next ?? "" } });
    expect(rest.items.map(({ title, consent: may }) => [title, may])).toEqual([["Heron", true]]);
    await consent(weir, true);
    expect((await world.visitors.approver.refusal(listPortfolioPieces, { params: world.params })).code).toBe(
      "not_found",
    );
  });
});

describe("a portfolio link", () => {
  it("shows its address once; only its hash is kept, and nothing of it is logged", async () => {
    const { url, link } = await make([heron.job.id, weir.job.id, heron.job.id]);
    const token = tokenOf(url);
    expect(url).toBe(`${app.baseUrl}/share/${token}`);
    expect(token).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect(link).toMatchObject({ label: "For the town hall", state: "live", openings: 0, lastOpenedAt: null });
    expect(link.pieces.map(({ title }) => title).sort()).toEqual(["Heron", "Weir"]);
    await app.visitor().get(openShareLink, { params: { token } });
    const rows = await runSql(app.database.ownerUrl, "select to_jsonb(share_links) as row from share_links");
    const jobs = await runSql(app.database.ownerUrl, "select to_jsonb(j) as row from graphile_worker._private_jobs j");
    const events = await runSql(app.database.ownerUrl, "select to_jsonb(events) as row from events");
    expect(JSON.stringify([rows, jobs, events])).not.toContain(token);
    expect(app.logged.join("\n")).not.toContain(token);
    const row = await ShareLink.findByPk(link.id, { rejectOnEmpty: true });
    expect(row.tokenHash).toMatch(/^[0-9a-f]{64}$/);
    expect(row.expiresAt.getTime() - row.createdAt.getTime()).toBe(30 * 24 * 3_600_000);
    expect((await Event.findOne({ where: { kind: "share link made" } }))?.data).toEqual({ label: "For the town hall" });
  });

  it("shows a guest the pieces and no person, note, file, price or id", async () => {
    const { url, link } = await make([weir.job.id, heron.job.id]);
    const guest = app.visitor();
    const { text, headers } = await guest.ask(openShareLink, { params: { token: tokenOf(url) } });
    const shown = openShareLink.result.parse(JSON.parse(text)) as { pieces: Record<string, unknown>[] };
    expect(shown).toMatchObject({ shopName: world.owner.shop.name, unit: "mm" });
    expect(shown.pieces.map(({ title }) => title).sort()).toEqual(["Heron", "Weir"]);
    expect(Object.keys(shown.pieces[0] ?? {}).sort()).toEqual([
      "client",
      "elevation",
      "heightMm",
      "materials",
      "offWallMm",
      "section",
      "title",
      "widthMm",
    ]);
    expect(shown.pieces[0]).toMatchObject({ materials: [expect.any(String), "Midnight acrylic"], offWallMm: 21 });
    expect(headers.get("cache-control")).toBe("no-store");
    for (const secret of [
      world.approver.contact.name,
      world.approver.email,
      world.owner.person.name,
      world.owner.email,
      "Ada Quill",
      "Between ourselves",
      "HERON & WEIR",
      heron.job.id,
      heron.job.number,
      link.id,
      world.owner.shop.id,
    ])
      expect(text).not.toContain(secret);
    expect(text).not.toMatch(/[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}|sha256/i);
  });

  it("counts its openings; a guest who is signed in elsewhere stays a guest in the log", async () => {
    const { url, link } = await make([heron.job.id], { label: "Counted" });
    const params = { token: tokenOf(url) };
    const elsewhere = await buildMember();
    await (await signInAs(app, elsewhere)).get(openShareLink, { params });
    await app.visitor().get(openShareLink, { params });
    const { items } = await world.visitors.maker.get(listShareLinks, { params: world.params });
    expect(items.find(({ id }) => id === link.id)).toMatchObject({ openings: 2, lastOpenedAt: expect.any(String) });
    const events = await Event.findAll({ where: { kind: "share link opened", shopId: world.owner.shop.id } });
    const ours = events.filter(({ data }) => "label" in data && data.label === "Counted");
    expect(ours.map(({ side, who, personId }) => [side, who, personId])).toEqual([["guest", "A guest", null]]);
  });

  it("stops showing a piece at once when its client takes the consent back", async () => {
    const { url } = await make([heron.job.id, weir.job.id]);
    const shown = async () => {
      const { pieces } = await app.visitor().get(openShareLink, { params: { token: tokenOf(url) } });
      return pieces.map(({ title }) => title).sort();
    };
    expect(await shown()).toEqual(["Heron", "Weir"]);
    await consent(heron, false);
    expect(await shown()).toEqual(["Weir"]);
    const problem = await world.visitors.rep.refusal(makeShareLink, {
      params: world.params,
      body: { label: "Again", jobIds: [heron.job.id, weir.job.id] },
    });
    expect(problem.errors).toEqual([
      { pointer: "/jobIds", detail: "Only approved pieces whose client agreed can be shown." },
    ]);
    await consent(heron, true);
    expect(await shown()).toEqual(["Heron", "Weir"]);
  });

  it("opens nothing once it is revoked, has run out, or was never made", async () => {
    const revoked = await make([heron.job.id]);
    const params = { ...world.params, linkId: revoked.link.id };
    await world.visitors.rep.get(revokeShareLink, { params });
    await world.visitors.rep.get(revokeShareLink, { params });
    const expired = await make([heron.job.id], { days: 1 });
    await ShareLink.update({ expiresAt: new Date(Date.now() - 1) }, { where: { id: expired.link.id } });
    for (const { url } of [revoked, expired]) {
      const problem = await app.visitor().refusal(openShareLink, { params: { token: tokenOf(url) } });
      expect(problem).toMatchObject({ status: 410, code: "link_expired" });
      expect(JSON.stringify(problem)).not.toMatch(/Heron|Shop \d/);
    }
    for (const token of ["A".repeat(43), "short", tokenOf(expired.url).toLowerCase()])
      expect((await app.visitor().refusal(openShareLink, { params: { token } })).code).toBe("not_found");
    expect(await Event.count({ where: { kind: "share link revoked" } })).toBe(1);
    const { items } = await world.visitors.rep.get(listShareLinks, { params: world.params });
    const states = Object.fromEntries(items.map(({ id, state }) => [id, state]));
    expect([states[revoked.link.id], states[expired.link.id]]).toEqual(["revoked", "expired"]);
  });

  it("is made and revoked by owners and reps; makers look, the client and others find nothing", async () => {
    const { link } = await make([heron.job.id]);
    const body = { label: "Mine", jobIds: [heron.job.id] };
    const params = { ...world.params, linkId: link.id };
    const { maker, approver, owner } = world.visitors;
    expect((await maker.refusal(makeShareLink, { params: world.params, body })).code).toBe("not_allowed");
    expect((await maker.refusal(revokeShareLink, { params })).code).toBe("not_allowed");
    const stranger = await signInAs(app, await buildMember());
    for (const visitor of [approver, stranger]) {
      expect((await visitor.refusal(makeShareLink, { params: world.params, body })).code).toBe("not_found");
      expect((await visitor.refusal(listShareLinks, { params: world.params })).code).toBe("not_found");
      expect((await visitor.refusal(revokeShareLink, { params })).code).toBe("not_found");
    }
    expect((await app.visitor().refusal(makeShareLink, { params: world.params, body })).code).toBe("not_signed_in");
    expect((await ShareLink.findByPk(link.id))?.revokedAt).toBeNull();
    await make([heron.job.id], {}, owner);
  });

  it("can't be made to what is not the shop's, not approved or not named", async () => {
    const unapproved = await buildJob(world, { title: "Open" });
    const other = await signInAs(app, await buildMember());
    const before = await ShareLink.count();
    for (const jobIds of [[unapproved.job.id], [world.job.id, heron.job.id]])
      expect(
        (await world.visitors.rep.refusal(makeShareLink, { params: world.params, body: { label: "X", jobIds } }))
          .errors,
      ).toHaveLength(1);
    const bad = await world.visitors.rep.refusal(makeShareLink, {
      params: world.params,
      body: { label: " ", jobIds: [], days: 366, token: "mine" } as never,
    });
    expect(bad.errors?.map(({ pointer }) => pointer).sort()).toEqual(["/days", "/jobIds", "/label", "/token"]);
    expect((await other.refusal(listPortfolioPieces, { params: world.params })).code).toBe("not_found");
    expect(await ShareLink.count()).toBe(before);
  });

  it("is listed page by page, newest first, also when two were made in the same moment", async () => {
    await ShareLink.update({ createdAt: new Date("2030-03-03T03:03:03.003Z") }, { where: {} });
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await world.visitors.rep.get(listShareLinks, {
        params: world.params,
        query: { limit: 2, ...(cursor ? { cursor } : {}) },
      });
      seen.push(...page.items.map(({ id }) => id));
      cursor = page.next ?? undefined;
    } while (cursor && seen.length < 99);
    const all = await ShareLink.findAll();
    expect(seen).toEqual(
      all
        .map(({ id }) => id)
        .sort()
        .reverse(),
    );
  });
});
