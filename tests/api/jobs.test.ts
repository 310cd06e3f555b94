import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { Job } from "#server/models/job.ts";
import { changeContact, removeContact } from "#shared/contracts/clients.ts";
import { changeJob, getJob, listEvents, listJobs, moveJob, openJob } from "#shared/contracts/jobs.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { approve } from "../support/decide.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { lastLogLine, logKinds } from "../support/job-log.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });

describe("opening a job", () => {
  it("asks for a session, names every bad field and refuses fields it does not know", async () => {
    const body = { clientId: world.approver.client.id, title: "Window" };
    expect((await app.visitor().refusal(openJob, { params: world.params, body })).code).toBe("not_signed_in");
    const { code, errors } = await world.visitors.rep.refusal(openJob, {
      params: world.params,
      body: { clientId: "no-id", title: " \n ", dueOn: "2031-02-30", state: "approved" } as never,
    });
    expect(code).toBe("validation_failed");
    expect(errors?.map(({ pointer }) => pointer).sort()).toEqual(["/clientId", "/dueOn", "/state", "/title"]);
    expect(errors).toContainEqual({ pointer: "/state", detail: "This field is not known." });
  });

  it("takes no day that the calendar of the database does not have", async () => {
    for (const dueOn of ["0000-01-01", "0001-01-01", "10000-01-01"]) {
      const problem = await world.visitors.rep.refusal(openJob, {
        params: world.params,
        body: { clientId: world.approver.client.id, title: "Window", dueOn },
      });
      expect(problem, dueOn).toMatchObject({ code: "validation_failed", errors: [{ pointer: "/dueOn" }] });
    }
  });

  it("finds no client of another shop", async () => {
    const before = await Job.count();
    const foreign = await buildClient();
    const body = { clientId: foreign.id, title: "Window" };
    expect((await world.visitors.rep.refusal(openJob, { params: world.params, body })).code).toBe("not_found");
    expect(await Job.count()).toBe(before);
  });

  it("is not for contacts, and outsiders find no shop", async () => {
    const body = { clientId: world.approver.client.id, title: "Window" };
    expect((await world.visitors.approver.refusal(openJob, { params: world.params, body })).code).toBe("not_allowed");
    const stranger = await signInAs(app, await buildMember());
    expect((await stranger.refusal(openJob, { params: world.params, body })).code).toBe("not_found");
  });

  it("counts numbers up within the shop and writes it to the log", async () => {
    const member = await buildMember({ role: "rep" });
    const client = await buildClient({ shop: member.shop, name: "Linden Dairy" });
    const rep = await signInAs(app, member);
    const params = { shop: member.shop.slug };
    const first = await rep.get(openJob, { params, body: { clientId: client.id, title: "  Fascia " } });
    const second = await rep.get(openJob, {
      params,
      body: { clientId: client.id, title: "Lobby", dueOn: "2030-02-28" },
    });
    expect([first.number, second.number]).toEqual(["SH-0001", "SH-0002"]);
    expect(first).toMatchObject({
      title: "Fascia",
      state: "brief",
      whoseMove: "ours",
      nextStep: "Brief has gaps, fill it in",
      client: { id: client.id, name: "Linden Dairy" },
      dueOn: null,
      briefMissing: [
        "size",
        "inside or outside",
        "viewing distance",
        "words as they shall read",
        "due day",
        "who approves",
      ],
      latest: null,
      approved: null,
      openNotes: 0,
    });
    expect(second.dueOn).toBe("2030-02-28");
    expect(await logKinds(first.id)).toEqual(["job opened"]);
    expect(await lastLogLine(first.id)).toBe(`${member.person.name}: Opened the job Fascia`);
  });
});

describe("changing a job", () => {
  it("leaves what is not named, clears what is null, and logs in words only what changed", async () => {
    const own = await buildJob(world, { brief: { wall: "Brick" } });
    const changed = await own.visitors.rep.get(changeJob, {
      params: of(own),
      body: { title: "Stair sign", dueOn: null, brief: { widthMm: null, wall: "Brick", words: "ONE\r\nTWO " } },
    });
    expect(changed).toMatchObject({ title: "Stair sign", dueOn: null, state: "brief" });
    expect(changed.brief).toEqual({ ...own.job.brief, widthMm: null, words: "ONE\nTWO" });
    expect(changed.briefMissing).toEqual(["size", "due day"]);
    expect(await lastLogLine(own.job.id)).toMatch(/: Changed width, words, title, due day$/);
    const again = await Event.count({ where: { jobId: own.job.id } });
    await own.visitors.rep.get(changeJob, { params: of(own), body: { title: "Stair sign" } });
    expect(await Event.count({ where: { jobId: own.job.id } })).toBe(again);
    const completed = await own.visitors.rep.get(changeJob, {
      params: of(own),
      body: { dueOn: "2031-01-02", brief: { widthMm: 612.5 } },
    });
    expect(completed).toMatchObject({ state: "mockup", whoseMove: "ours", briefMissing: [] });
  });

  it("names every bad field of the brief and leaves the job as it was", async () => {
    const own = await buildJob(world);
    const { errors } = await own.visitors.owner.refusal(changeJob, {
      params: of(own),
      body: {
        brief: { widthMm: -1, quantity: 0, words: "a\u0000b", wall: "x".repeat(401), about: "half \ud800 pair" },
        approverIds: ["nobody"],
      },
    });
    expect(errors?.map(({ pointer }) => pointer).sort()).toEqual([
      "/approverIds/0",
      "/brief/about",
      "/brief/quantity",
      "/brief/wall",
      "/brief/widthMm",
      "/brief/words",
    ]);
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({ brief: own.job.brief });
  });

  it("takes as approvers only present contacts of the job's own client", async () => {
    const own = await buildJob(world);
    const stranger = await buildContact({ client: await buildClient({ shop: world.owner.shop }) });
    const left = await buildContact({ client: world.approver.client });
    await own.visitors.owner.get(removeContact, { params: { ...own.params, contactId: left.contact.id } });
    for (const { contact } of [stranger, left]) {
      const problem = await own.visitors.owner.refusal(changeJob, {
        params: of(own),
        body: { title: "Not kept", approverIds: [contact.id] },
      });
      expect(problem.errors).toEqual([
        { pointer: "/approverIds", detail: "Only contacts of this job's client can approve." },
      ]);
    }
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({ title: own.job.title });
    const twice = await own.visitors.owner.get(changeJob, {
      params: of(own),
      body: { approverIds: [world.approver.contact.id, world.approver.contact.id] },
    });
    expect(twice.approvers).toEqual([{ contactId: world.approver.contact.id, name: world.approver.contact.name }]);
  });

  it("loses an approver who leaves the client", async () => {
    const going = await buildContact({ client: world.approver.client });
    const own = await buildJob(world, { approverIds: [going.contact.id] });
    expect(own.job.state).toBe("mockup");
    await own.visitors.owner.get(removeContact, { params: { ...own.params, contactId: going.contact.id } });
    const job = await own.visitors.owner.get(getJob, { params: of(own) });
    expect(job).toMatchObject({ approvers: [], briefMissing: ["who approves"] });
  });

  it("is the shop's alone", async () => {
    const own = await buildJob(world);
    expect((await own.visitors.approver.refusal(changeJob, { params: of(own), body: {} })).code).toBe("not_found");
    await buildRevision(app, own);
    expect((await own.visitors.approver.refusal(changeJob, { params: of(own), body: {} })).code).toBe("not_allowed");
    const stranger = await signInByMail(app, await buildContact());
    expect((await stranger.refusal(changeJob, { params: of(own), body: {} })).code).toBe("not_found");
  });
});

describe("the list of jobs", () => {
  const listed = async (rep: World["visitors"]["rep"], shop: string, query: Record<string, unknown>) => {
    const titles: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await rep.get(listJobs, {
        params: { shop },
        query: { limit: 2, ...query, ...(cursor ? { cursor } : {}) } as never,
      });
      expect(page.items.length).toBeLessThanOrEqual(2);
      titles.push(...page.items.map(({ title }) => title));
      cursor = page.next ?? undefined;
    } while (cursor);
    return titles;
  };
  let shop: string;
  let rep: World["visitors"]["rep"];
  let birch: string;
  beforeAll(async () => {
    const member = await buildMember({ role: "rep" });
    rep = await signInAs(app, member);
    shop = member.shop.slug;
    const open = async (clientId: string, title: string, dueOn: string | null, words = "") => {
      const { id } = await rep.get(openJob, { params: { shop }, body: { clientId, title, dueOn } });
      if (words) await rep.get(changeJob, { params: { shop, jobId: id }, body: { brief: { words } } });
      return id;
    };
    birch = (await buildClient({ shop: member.shop, name: "Birch & Co" })).id;
    const elm = (await buildClient({ shop: member.shop, name: "Elm_House" })).id;
    await open(birch, "One", "2030-05-01");
    await open(birch, "Two", null, "100% WOOL");
    await open(elm, "Three", "2030-05-01");
    await open(elm, "Four", "2029-12-31", "1000 WOOLS");
    await open(elm, "Five", "2030-05-01");
    await Job.update(
      { createdAt: new Date("2030-01-01T00:00:00.123Z") },
      { where: { title: ["One", "Two", "Three"] } },
    );
    await Job.update({ whoseMove: "nobody" }, { where: { title: "Four" } });
  });

  it("gives each job once, page by page, however many share a day", async () => {
    const due = await listed(rep, shop, {});
    expect(due.slice(0, 3).sort()).toEqual(["Five", "One", "Three"]);
    expect(due.slice(3)).toEqual(["Two", "Four"]);
    expect(await listed(rep, shop, { sort: "number" })).toEqual(["Five", "Four", "Three", "Two", "One"]);
    const newest = await listed(rep, shop, { sort: "newest" });
    expect([...newest].sort()).toEqual(["Five", "Four", "One", "Three", "Two"]);
    expect(newest.slice(0, 3).sort()).toEqual(["One", "Three", "Two"]);
  });

  it("counts each side whatever is filtered", async () => {
    const page = await rep.get(listJobs, { params: { shop }, query: { whoseMove: "nobody" } });
    expect(page.items.map(({ title }) => title)).toEqual(["Four"]);
    expect(page.counts).toEqual({ ours: 4, client: 0, nobody: 1 });
  });

  it.each([
    { query: { q: "100%" }, titles: ["Two"] },
    { query: { q: "  wool " }, titles: ["Four", "Two"] },
    { query: { q: "m_h" }, titles: ["Five", "Four", "Three"] },
    { query: { q: "_" }, titles: ["Five", "Four", "Three"] },
    { query: { q: "\\" }, titles: [] },
    { query: { q: "0003" }, titles: ["Three"] },
    { query: { q: "birch & co" }, titles: ["One", "Two"] },
    { query: { q: "'; drop table jobs; --" }, titles: [] },
    { query: { q: ":after0 ? $1" }, titles: [] },
    { query: { q: "   " }, titles: ["Five", "Four", "One", "Three", "Two"] },
    { query: { state: "approved" }, titles: [] },
    { query: { state: "brief", q: "o" }, titles: ["Five", "Four", "One", "Three", "Two"] },
  ])("finds $titles for $query", async ({ query, titles }) => {
    expect((await listed(rep, shop, query)).sort()).toEqual(titles);
  });

  it("filters by client, and names every bad filter", async () => {
    expect((await listed(rep, shop, { clientId: birch })).sort()).toEqual(["One", "Two"]);
    const { errors } = await rep.refusal(listJobs, {
      params: { shop },
      query: { limit: 101, sort: "secret", whoseMove: "theirs", page: "2" } as never,
    });
    expect(errors?.map(({ pointer }) => pointer).sort()).toEqual(["/limit", "/page", "/sort", "/whoseMove"]);
  });

  it("is the shop's own", async () => {
    const stranger = await signInAs(app, await buildMember());
    expect((await stranger.refusal(listJobs, { params: { shop } })).code).toBe("not_found");
    expect((await app.visitor().refusal(listJobs, { params: { shop } })).code).toBe("not_signed_in");
  });
});

describe("the log of a job", () => {
  it("is read newest first, page by page, by staff only", async () => {
    const own = await buildJob(world, { title: "Logged" });
    await own.visitors.maker.get(moveJob, { params: of(own), body: { to: "on hold", reason: "Waits for a permit" } });
    const first = await own.visitors.rep.get(listEvents, { params: of(own), query: { limit: 2 } });
    expect(first.items.map(({ kind }) => kind)).toEqual(["job moved", "job changed"]);
    expect(first.items[0]?.text).toBe("Moved the job from mockup to on hold: Waits for a permit");
    const second = await own.visitors.rep.get(listEvents, {
      params: of(own),
      query: { limit: 2, cursor: first.next ?? "" },
    });
    expect(second.items.map(({ kind }) => kind)).toEqual(["job opened"]);
    expect(second.next).toBeNull();
    expect((await own.visitors.approver.refusal(listEvents, { params: of(own) })).code).toBe("not_found");
    expect((await app.visitor().refusal(listEvents, { params: of(own) })).code).toBe("not_signed_in");
  });
});

describe("moving a job", () => {
  it("goes in order after approval, with a line in the log for each step", async () => {
    const own = await buildJob(world);
    const move = (to: string) => own.visitors.maker.ask(moveJob, { params: of(own), body: { to } as never });
    for (const to of ["in build", "handed over", "closed", "taken up again"]) expect((await move(to)).status).toBe(409);
    await approve(own, (await buildRevision(app, own)).id);
    for (const to of ["handed over", "closed"]) expect((await move(to)).status).toBe(409);
    for (const to of ["in build", "handed over", "closed"]) expect((await move(to)).status).toBe(200);
    for (const to of ["in build", "on hold", "cancelled", "taken up again"]) expect((await move(to)).status).toBe(409);
    const kinds = await logKinds(own.job.id);
    expect(kinds.filter((kind) => kind === "job moved")).toHaveLength(3);
    expect(await own.visitors.rep.get(getJob, { params: of(own) })).toMatchObject({
      state: "closed",
      whoseMove: "nobody",
    });
  });

  it("is held where it stands and taken up there again", async () => {
    const own = await buildJob(world);
    const revision = await buildRevision(app, own);
    const held = await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "on hold" } });
    expect(held).toMatchObject({ state: "on hold", whoseMove: "nobody", nextStep: "On hold" });
    expect(await Job.findByPk(own.job.id)).toMatchObject({ heldFrom: "out for proof" });
    const twice = await own.visitors.owner.refusal(moveJob, { params: of(own), body: { to: "on hold" } });
    expect(twice).toMatchObject({ code: "wrong_state", detail: "A job that is “on hold” can't become “on hold”." });
    const back = await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "taken up again" } });
    expect(back).toMatchObject({ state: "out for proof", whoseMove: "client", latest: { revisionId: revision.id } });
  });

  it("is cancelled for good", async () => {
    const own = await buildJob(world);
    await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "cancelled", reason: "No budget" } });
    for (const to of ["taken up again", "on hold", "in build"] as const) {
      const problem = await own.visitors.owner.refusal(moveJob, { params: of(own), body: { to } });
      expect(problem.code).toBe("wrong_state");
    }
    expect(await lastLogLine(own.job.id)).toMatch(/: Moved the job from mockup to cancelled: No budget$/);
  });

  it("is neither held nor cancelled while a revision is being drawn", async () => {
    const own = await buildJob(world);
    await buildRevision(app, own, { finished: false });
    for (const to of ["on hold", "cancelled"] as const) {
      const problem = await own.visitors.owner.refusal(moveJob, { params: of(own), body: { to } });
      expect(problem).toMatchObject({ code: "wrong_state", detail: "A is being drawn. Wait until it is out." });
    }
    await app.runJobs();
    await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "on hold" } });
  });

  it("is for owners and makers; reps look, contacts may not either", async () => {
    const own = await buildJob(world);
    const body = { to: "on hold" } as const;
    expect((await own.visitors.rep.refusal(moveJob, { params: of(own), body })).code).toBe("not_allowed");
    expect((await own.visitors.approver.refusal(moveJob, { params: of(own), body })).code).toBe("not_found");
    expect((await app.visitor().refusal(moveJob, { params: of(own), body })).code).toBe("not_signed_in");
    expect((await Job.findByPk(own.job.id))?.state).toBe("mockup");
  });
});

describe("a contact's address that changed", () => {
  it("leaves the approver named", async () => {
    const changing = await buildContact({ client: world.approver.client });
    const own = await buildJob(world, { approverIds: [changing.contact.id] });
    await own.visitors.owner.get(changeContact, {
      params: { ...own.params, contactId: changing.contact.id },
      body: { name: changing.contact.name, email: "moved@contacts.example" },
    });
    const { approvers } = await own.visitors.owner.get(getJob, { params: of(own) });
    expect(approvers.map(({ contactId }) => contactId)).toEqual([changing.contact.id]);
  });
});
