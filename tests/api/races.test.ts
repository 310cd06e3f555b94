import { readdir } from "node:fs/promises";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Artwork } from "#server/models/artwork.ts";
import { Certificate } from "#server/models/certificate.ts";
import { Contact } from "#server/models/contact.ts";
import { Decision } from "#server/models/decision.ts";
import { Job } from "#server/models/job.ts";
import { Mockup } from "#server/models/mockup.ts";
import { Note } from "#server/models/note.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Revision } from "#server/models/revision.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import { artworkSchema, removeArtwork } from "#shared/contracts/artworks.ts";
import { openJob } from "#shared/contracts/jobs.ts";
import { getMockup, mockupSchema, saveMockup } from "#shared/contracts/mockups.ts";
import { addNote } from "#shared/contracts/notes.ts";
import { approveRevision, askForRevision, getSheet, issueRevision } from "#shared/contracts/revisions.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { approvalOf, revisionNow } from "../support/decide.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildJob } from "../support/factories/job.ts";
import { artworksPath, buildRevision, buildWorld, formWith, plainSvg, type World } from "../support/factories/work.ts";
import { holdJob } from "../support/hold-job.ts";
import { logKinds } from "../support/job-log.ts";
import type { Answer } from "../support/visitor.ts";

let app: TestApp;
let world: World;
let bothApprove: string[];
let template: string;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 10 });
  world = await buildWorld(app);
  const contacts = await Contact.findAll({ where: { clientId: world.approver.client.id } });
  bothApprove = contacts.map(({ id }) => id);
  template = (await buildRevision(app, world, { document: sign(90) })).id;
});
afterAll(() => app.stop());

const rounds = Array.from({ length: 10 }, (_, index) => index + 1);
const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const at = ({ params }: World, revisionId: string) => ({ ...params, revisionId });
const sign = (width: number): MockupDocument => buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]);
const codeOf = ({ status, text }: Answer): string =>
  status < 400 ? "done" : (JSON.parse(text) as { code: string }).code;
const issued = () => buildIssued(app, world, template, { approverIds: bothApprove });

describe("two people save one mockup", () => {
  it("and one of them is first, ten times over", async () => {
    const own = await buildJob(world);
    const { owner, maker } = own.visitors;
    for (const round of rounds) {
      const { version } = await owner.get(getMockup, { params: of(own) });
      expect(version).toBe(round - 1);
      const answers = await Promise.all(
        [owner, maker].map((visitor, index) =>
          visitor.ask(saveMockup, { params: of(own), body: { version, document: sign(100 * round + index) } }),
        ),
      );
      expect(answers.map(codeOf).sort()).toEqual(["done", "stale"]);
      const [won, lost] = [...answers].sort((a, b) => a.status - b.status);
      const kept = mockupSchema.parse(JSON.parse(won?.text ?? ""));
      const { extra } = JSON.parse(lost?.text ?? "") as { extra: { newer: unknown } };
      expect(mockupSchema.parse(extra.newer)).toEqual({ ...kept, can: expect.anything() });
      expect((await owner.get(getMockup, { params: of(own) })).document).toEqual(kept.document);
    }
    expect(await Mockup.count({ where: { jobId: own.job.id } })).toBe(1);
    expect((await logKinds(own.job.id)).filter((kind) => kind === "mockup begun")).toHaveLength(1);
  });
});

describe("two approvers at once", () => {
  it.each(rounds)("decide once, round %i", async (round) => {
    const { own, revisionId } = await issued();
    const body = await approvalOf(own, revisionId);
    const { approver, otherContact } = own.visitors;
    // In every other round one of them asks for a revision instead.
    const second =
      round % 2 === 0
        ? otherContact.ask(askForRevision, { params: at(own, revisionId), body: { summary: "Larger" } })
        : otherContact.ask(approveRevision, { params: at(own, revisionId), body });
    const answers = await Promise.all([approver.ask(approveRevision, { params: at(own, revisionId), body }), second]);
    expect(answers.map(codeOf).sort()).toEqual(["done", "wrong_state"]);
    const [decision, ...others] = await Decision.findAll({ where: { revisionId } });
    expect(others).toEqual([]);
    const { state } = await revisionNow(own, revisionId);
    expect(state).toBe(decision?.kind);
    await app.runJobs();
    expect(await Certificate.count({ where: { decisionId: decision?.id ?? "" } })).toBe(state === "approved" ? 1 : 0);
    expect(await OutgoingMail.count({ where: { jobId: own.job.id, kind: ["approved", "revision asked"] } })).toBe(3);
  });
});

describe("a double click on approve", () => {
  it.each(rounds)("approves once, round %i", async () => {
    const { own, revisionId } = await issued();
    const body = await approvalOf(own, revisionId);
    const click = () => own.visitors.approver.ask(approveRevision, { params: at(own, revisionId), body });
    const answers = await Promise.all([click(), click(), click()]);
    expect(answers.map(codeOf).sort()).toEqual(["done", "wrong_state", "wrong_state"]);
    expect(await Decision.count({ where: { revisionId } })).toBe(1);
    await app.runJobs();
    expect(await OutgoingMail.count({ where: { jobId: own.job.id, kind: "approved" } })).toBe(3);
    expect((await logKinds(own.job.id)).filter((kind) => kind === "certificate made")).toHaveLength(1);
  });
});

describe("B goes out while A is being approved", () => {
  it.each(rounds)("and whoever comes first decides whether A is approved or superseded, round %i", async (round) => {
    const { own, revisionId: a } = await issued();
    const body = await approvalOf(own, a);
    const b = (await buildRevision(app, own, { document: sign(95), finished: false })).id;
    // Both are under way and wait for the job, then one goes right after the other.
    const hold = await holdJob(app.database, own.job.id);
    const approve = () => own.visitors.approver.ask(approveRevision, { params: at(own, a), body });
    const isApprovedFirst = round % 2 === 0;
    const early = isApprovedFirst ? approve() : app.runJobs();
    await hold.waiters(1);
    const late = isApprovedFirst ? app.runJobs() : approve();
    await hold.waiters(2);
    await hold.release();
    const approval = (await Promise.all([early, late])).find((answer) => answer !== undefined);
    if (!approval) throw new Error("The approval was not answered.");
    await app.runJobs();
    const wasApproved = codeOf(approval) === "done";
    expect(wasApproved).toBe(isApprovedFirst);
    if (!wasApproved)
      expect(JSON.parse(approval.text)).toMatchObject({
        code: "wrong_state",
        extra: { current: { revisionId: b, letter: "B" } },
      });
    expect((await revisionNow(own, a)).state).toBe(wasApproved ? "approved" : "superseded");
    expect((await revisionNow(own, b)).state).toBe("issued");
    expect(await Decision.count({ where: { jobId: own.job.id } })).toBe(wasApproved ? 1 : 0);
    expect(await Job.findByPk(own.job.id)).toMatchObject({ state: "out for proof", whoseMove: "client" });
  });
});

describe("many at once", () => {
  it("issue one revision", async () => {
    const own = await buildJob(world);
    const { owner, maker } = own.visitors;
    await owner.get(saveMockup, { params: of(own), body: { version: 0, document: sign(90) } });
    const answers = await Promise.all(
      [owner, maker, owner, maker].map((visitor) =>
        visitor.ask(issueRevision, { params: of(own), body: { mockupVersion: 1 } }),
      ),
    );
    expect(answers.map(codeOf).sort()).toEqual(["done", "wrong_state", "wrong_state", "wrong_state"]);
    expect(await Revision.count({ where: { jobId: own.job.id } })).toBe(1);
    await app.runJobs();
    expect(await OutgoingMail.count({ where: { jobId: own.job.id } })).toBe(1);
  });

  it("number notes and jobs without a gap or a double", async () => {
    const { own, revisionId } = await issued();
    const visitors = Object.values(own.visitors);
    await Promise.all(
      [...visitors, ...visitors].map((visitor) =>
        visitor.get(addNote, {
          params: at(own, revisionId),
          body: { text: "Here", kind: "question", anchor: { on: "whole" } },
        }),
      ),
    );
    const notes = await Note.findAll({ where: { jobId: own.job.id }, order: ["number"] });
    expect(notes.map(({ number }) => number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
    const jobs = await Promise.all(
      rounds.map(() =>
        own.visitors.rep.get(openJob, {
          params: own.params,
          body: { clientId: own.approver.client.id, title: "Many" },
        }),
      ),
    );
    expect(new Set(jobs.map(({ number }) => number)).size).toBe(10);
    await app.runJobs();
  });

  it("bring the same new file to two jobs, and it is kept once", async () => {
    for (const round of rounds) {
      const svg = plainSvg().replace("<svg ", `<svg id="race${round}" `);
      const jobs = [await buildJob(world), await buildJob(world), await buildJob(world)];
      const answers = await Promise.all(
        jobs.map((own) => own.visitors.maker.send("POST", artworksPath(own), { body: formWith("logo.svg", svg) })),
      );
      expect(answers.map(({ status }) => status)).toEqual([202, 202, 202]);
      const [first] = answers.map(({ text }) => artworkSchema.parse(JSON.parse(text)));
      expect(await StoredFile.count({ where: { sha256: first?.sha256 ?? "" } })).toBe(1);
    }
    const folder = join(app.services.storage.quarantineDir, "..", "kept", world.owner.shop.id);
    expect((await readdir(folder)).length).toBe(await StoredFile.count({ where: { shopId: world.owner.shop.id } }));
    await app.runJobs();
    expect(await Artwork.count({ where: { state: "importing" } })).toBe(0);
  });

  it("take one artwork off once", async () => {
    const own = await buildJob(world);
    const { text } = await own.visitors.owner.send("POST", artworksPath(own), {
      body: formWith("logo.svg", plainSvg("#101010")),
    });
    const params = { ...own.params, artworkId: artworkSchema.parse(JSON.parse(text)).id };
    const { owner, maker } = own.visitors;
    const answers = await Promise.all([owner, maker, owner].map((visitor) => visitor.ask(removeArtwork, { params })));
    expect(answers.map(codeOf).sort()).toEqual(["done", "not_found", "not_found"]);
    expect((await logKinds(own.job.id)).filter((kind) => kind === "artwork removed")).toHaveLength(1);
    await app.runJobs();
  });

  it("read a sheet for the first time, and it is written down once a reader", async () => {
    const { own, revisionId } = await issued();
    const { approver, otherContact } = own.visitors;
    await Promise.all(
      [approver, otherContact, approver, approver].map((visitor) =>
        visitor.get(getSheet, { params: at(own, revisionId) }),
      ),
    );
    expect((await logKinds(own.job.id)).filter((kind) => kind === "revision opened")).toHaveLength(2);
  });
});
