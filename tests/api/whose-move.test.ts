import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { changeJob, getJob, listJobs, moveJob, openJob } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { addNote, replyToNote } from "#shared/contracts/notes.ts";
import { askForRevision, getSheet, issueRevision, withdrawRevision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { breakSnapshot } from "../support/break-snapshot.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { approve } from "../support/decide.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildWorld, type World } from "../support/factories/work.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const at = ({ params }: World, revisionId: string) => ({ ...params, revisionId });

/** The job's row on the Bench of the shop and on the client's own list, checked against the job's page. */
async function rows(own: World) {
  const rowFor = async (who: "maker" | "approver") => {
    const visitor = own.visitors[who];
    const { items, counts } = await visitor.get(listJobs, { params: own.params, query: { limit: 100 } });
    const row = items.find(({ id }) => id === own.job.id);
    if (!row) return null;
    const page = await visitor.get(getJob, { params: of(own) });
    const { id, number, title, client, dueOn, ...shown } = row;
    expect(page, "the page says what the list says").toMatchObject(row);
    // The filter and the counts tell the same move.
    const filtered = await visitor.get(listJobs, {
      params: own.params,
      query: { limit: 100, whoseMove: row.whoseMove },
    });
    expect(filtered.items.map((item) => item.id)).toContain(own.job.id);
    expect(filtered.items.every(({ whoseMove }) => whoseMove === row.whoseMove)).toBe(true);
    expect(counts[row.whoseMove]).toBe(filtered.items.length);
    return shown;
  };
  return { shop: await rowFor("maker"), client: await rowFor("approver") };
}
type Row = { state: string; whoseMove: string; nextStep: string; latest?: unknown };
async function expectRows(own: World, expected: { shop: Row; client: Row | null }) {
  const { shop, client } = await rows(own);
  expect(shop).toMatchObject(expected.shop);
  if (expected.client === null) expect(client).toBeNull();
  else expect(client).toMatchObject({ ...expected.client, lastEvent: null });
  // What is on the shop's table is nowhere in what the client reads.
  expect(JSON.stringify(client)).not.toMatch(/preparing|withdrawn|draft|failed/);
}

async function issue(own: World, width: number): Promise<string> {
  const { maker } = own.visitors;
  const { version } = await maker.get(getMockup, { params: of(own) });
  const document = buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]);
  const saved = await maker.get(saveMockup, { params: of(own), body: { version, document } });
  return (await maker.get(issueRevision, { params: of(own), body: { mockupVersion: saved.version } })).id;
}

describe("whose move it is", () => {
  it("is followed through a job from its brief to its end, by the shop and by the client", async () => {
    const { visitors, params, approver } = world;
    const opened = await visitors.rep.get(openJob, {
      params,
      body: { clientId: approver.client.id, title: "Followed" },
    });
    const own = { ...world, job: opened };
    await expectRows(own, {
      shop: { state: "brief", whoseMove: "ours", nextStep: "Brief has gaps, fill it in" },
      client: null,
    });

    await visitors.rep.get(changeJob, {
      params: of(own),
      body: { brief: world.job.brief, dueOn: "2030-01-01", approverIds: [approver.contact.id] },
    });
    const complete = { state: "mockup", whoseMove: "ours", nextStep: "Brief is complete, start the mockup" };
    await expectRows(own, { shop: complete, client: null });

    const a = await issue(own, 90);
    const beingDrawn = (letter: string) => `${letter} is being prepared, the client gets it when its PDF stands`;
    await expectRows(own, {
      shop: {
        state: "mockup",
        whoseMove: "ours",
        nextStep: beingDrawn("A"),
        latest: { letter: "A", state: "preparing" },
      },
      client: null,
    });

    await app.runJobs();
    const decide = (letter: string) => ({
      state: "out for proof",
      whoseMove: "client",
      nextStep: `Revision ${letter} waits for your decision`,
    });
    await expectRows(own, {
      shop: { state: "out for proof", whoseMove: "client", nextStep: "A is out, not opened yet" },
      client: { ...decide("A"), latest: { letter: "A", state: "issued" } },
    });

    await visitors.approver.get(getSheet, { params: at(own, a) });
    await expectRows(own, {
      shop: { state: "out for proof", whoseMove: "client", nextStep: "A is out, opened, no decision yet" },
      client: decide("A"),
    });

    const say = (kind: "must change" | "question" | "fine as is", visitor = visitors.approver, shopOnly = false) =>
      visitor.get(addNote, {
        params: at(own, a),
        body: { text: "Here", kind, anchor: { on: "whole" }, shopOnly },
      });
    await say("fine as is");
    await say("must change", visitors.maker, true);
    await say("question", visitors.maker);
    await expectRows(own, {
      shop: { state: "out for proof", whoseMove: "client", nextStep: "A is out, opened, no decision yet" },
      client: decide("A"),
    });
    const note = await say("question");
    await expectRows(own, {
      shop: { state: "out for proof", whoseMove: "ours", nextStep: "1 note open, answer it or issue B" },
      client: { state: "out for proof", whoseMove: "ours", nextStep: "The shop is answering your notes" },
    });
    await visitors.maker.get(replyToNote, { params: { ...params, noteId: note.id }, body: { text: "So it is" } });
    await expectRows(own, {
      shop: { state: "out for proof", whoseMove: "client", nextStep: "A is out, opened, no decision yet" },
      client: decide("A"),
    });

    // B is drawn while A can still be decided on: the client is not told of it.
    const b = await issue(own, 95);
    await expectRows(own, {
      shop: { state: "out for proof", whoseMove: "ours", nextStep: beingDrawn("B"), latest: { letter: "B" } },
      client: { ...decide("A"), latest: { letter: "A", state: "issued" } },
    });
    await breakSnapshot(app.database, b);
    await app.runJobs();
    await expectRows(own, {
      shop: {
        state: "out for proof",
        whoseMove: "ours",
        nextStep: "The PDF of B failed, issue it again",
        latest: { letter: "B", state: "draft" },
      },
      client: { ...decide("A"), latest: { letter: "A", state: "issued" } },
    });

    expect(await issue(own, 95)).toBe(b);
    await app.runJobs();
    await visitors.approver.get(askForRevision, { params: at(own, b), body: { summary: "Larger" } });
    const asked = "The shop is working on the revision you asked for";
    await expectRows(own, {
      shop: {
        state: "revision asked",
        whoseMove: "ours",
        nextStep: "Revision asked, change the mockup and issue C",
        latest: { letter: "B", state: "revision asked" },
      },
      client: { state: "revision asked", whoseMove: "ours", nextStep: asked },
    });

    const c = await issue(own, 100);
    await expectRows(own, {
      shop: { state: "revision asked", whoseMove: "ours", nextStep: beingDrawn("C") },
      client: { state: "revision asked", whoseMove: "ours", nextStep: asked, latest: { letter: "B" } },
    });
    await app.runJobs();
    await visitors.owner.get(withdrawRevision, { params: at(own, c), body: { reason: "Wrong" } });
    await expectRows(own, {
      shop: {
        state: "mockup",
        whoseMove: "ours",
        nextStep: "C was withdrawn, issue D",
        latest: { letter: "C", state: "withdrawn" },
      },
      client: {
        state: "mockup",
        whoseMove: "ours",
        nextStep: "The shop is working on the next proof",
        latest: { letter: "B", state: "superseded" },
      },
    });

    const d = await issue(own, 105);
    await app.runJobs();
    await approve(own, d);
    await expectRows(own, {
      shop: { state: "approved", whoseMove: "ours", nextStep: "D approved, free to build" },
      client: { state: "approved", whoseMove: "ours", nextStep: "You approved revision D, the build is next" },
    });

    const move = (to: "in build" | "handed over" | "closed" | "on hold" | "taken up again") =>
      visitors.maker.get(moveJob, { params: of(own), body: { to } });
    await move("on hold");
    await expectRows(own, {
      shop: { state: "on hold", whoseMove: "nobody", nextStep: "On hold" },
      client: { state: "on hold", whoseMove: "nobody", nextStep: "This job is on hold" },
    });
    await move("taken up again");
    await move("in build");
    await expectRows(own, {
      shop: { state: "in build", whoseMove: "ours", nextStep: "In build from D" },
      client: { state: "in build", whoseMove: "ours", nextStep: "Your sign is being built" },
    });
    await move("handed over");
    await expectRows(own, {
      shop: {
        state: "handed over",
        whoseMove: "nobody",
        nextStep: "Handed over, close it when nothing is left to do",
      },
      client: { state: "handed over", whoseMove: "nobody", nextStep: "Your sign has been handed over" },
    });
    await move("closed");
    await expectRows(own, {
      shop: { state: "closed", whoseMove: "nobody", nextStep: "Closed" },
      client: { state: "closed", whoseMove: "nobody", nextStep: "Your sign has been handed over" },
    });
  }, 120_000);

  it("is nobody's once the job is cancelled", async () => {
    const own = await buildJob(world);
    await issue(own, 90);
    await app.runJobs();
    await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "cancelled" } });
    await expectRows(own, {
      shop: { state: "cancelled", whoseMove: "nobody", nextStep: "Cancelled" },
      client: { state: "cancelled", whoseMove: "nobody", nextStep: "This job was cancelled" },
    });
  });
});

describe("the client's own list", () => {
  it("puts the client's moves first, page by page", async () => {
    const first = await buildJob(world, { title: "Ours", dueOn: "2029-01-01" });
    const second = await buildJob(world, { title: "Theirs", dueOn: "2030-01-01" });
    for (const own of [first, second]) {
      const id = await issue(own, 90);
      await app.runJobs();
      if (own === first)
        await own.visitors.approver.get(askForRevision, { params: at(own, id), body: { summary: "Larger" } });
    }
    // Drawn at this moment, so that the shop counts the job as its own move and the client does not.
    await issue(second, 95);
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await world.visitors.approver.get(listJobs, {
        params: world.params,
        query: { limit: 1, ...(cursor ? { cursor } : {}) },
      });
      seen.push(...page.items.map(({ title }) => title));
      cursor = page.next ?? undefined;
    } while (cursor && seen.length < 20);
    expect(seen.filter((title) => title === "Ours" || title === "Theirs")).toEqual(["Theirs", "Ours"]);
    expect(new Set(seen).size).toBe(seen.length - seen.filter((title) => title === "Lobby sign").length + 1);
    await app.runJobs();
  });
});
