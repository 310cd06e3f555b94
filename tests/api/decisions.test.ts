import { afterAll, afterEach, beforeAll, describe, expect, it } from "vitest";
import { Certificate } from "#server/models/certificate.ts";
import { Decision } from "#server/models/decision.ts";
import { Job } from "#server/models/job.ts";
import { Note } from "#server/models/note.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Revision } from "#server/models/revision.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import { changeJob, getJob, moveJob, setConsent } from "#shared/contracts/jobs.ts";
import { addNote, type Note as NoteView, replyToNote } from "#shared/contracts/notes.ts";
import { approveRevision, askForRevision, getCertificate, getProof, getRevision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { breakSnapshot } from "../support/break-snapshot.ts";
import { buildCapStud, buildLayer, buildSign, disc, hole, plate, standoffHold } from "../support/build-sign.ts";
import { approvalOf, approve, revisionNow } from "../support/decide.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { lastLogLine, logKinds } from "../support/job-log.ts";
import { caughtMails } from "../support/mail.ts";
import { popplerText } from "../support/poppler.ts";
import { runSql } from "../support/run-sql.ts";
import { signInAs } from "../support/sign-in.ts";
import type { Visitor } from "../support/visitor.ts";

let app: TestApp;
let world: World;
let template: string;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app, { words: "HERON & WEIR\n\n  open daily " });
  template = await issueNext(world);
});
afterAll(() => app.stop());
afterEach(() => app.runJobs());

const at = ({ params }: World, revisionId: string) => ({ ...params, revisionId });
const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const issueNext = async (own: World, width = 90): Promise<string> =>
  (await buildRevision(app, own, { document: buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]) })).id;
const issued = () => buildIssued(app, world, template);
const say = (own: World, visitor: Visitor, revisionId: string, kind: NoteView["kind"], shopOnly = false) =>
  visitor.get(addNote, {
    params: at(own, revisionId),
    body: { text: "Wider", kind, anchor: { on: "whole" }, shopOnly },
  });
const refused = async (own: World, revisionId: string, overrides: Parameters<typeof approvalOf>[2]) =>
  own.visitors.approver.refusal(approveRevision, {
    params: at(own, revisionId),
    body: await approvalOf(own, revisionId, overrides),
  });
/** Nothing was decided: no row, no job, no mail, and the revision is still out. */
async function expectUndecided(own: World, revisionId: string) {
  expect(await Decision.count({ where: { revisionId } })).toBe(0);
  expect((await revisionNow(own, revisionId)).state).toBe("issued");
  expect(await OutgoingMail.count({ where: { jobId: own.job.id, kind: ["approved", "revision asked"] } })).toBe(0);
  expect((await app.queuedJobs()).filter(({ task }) => task === "make-certificate")).toEqual([]);
}

describe("approving", () => {
  it("records who, what was read back and the hash of the very PDF; then makes the certificate beside it", async () => {
    const { own, revisionId } = await issued();
    const before = await revisionNow(own, revisionId);
    const proof = (await own.visitors.approver.ask(getProof, { params: at(own, revisionId) })).text;
    const decided = await approve(own, revisionId, { typedName: " Ada Quill " });
    expect(decided).toMatchObject({
      state: "approved",
      pdfSha256: before.pdfSha256,
      snapshotSha256: before.snapshotSha256,
      decision: { kind: "approved", by: own.approver.contact.name, typedName: "Ada Quill", hasCertificate: false },
      can: { note: false, decide: false, withdraw: false, download: true },
    });
    const row = await Decision.findOne({ where: { revisionId }, rejectOnEmpty: true });
    expect(row).toMatchObject({
      pdfSha256: before.pdfSha256,
      contactId: own.approver.contact.id,
      address: expect.stringMatching(/127\.0\.0\.1$/),
    });
    expect(JSON.parse(row.acknowledgements ?? "")).toEqual([
      "The words read exactly, letter by letter: “HERON & WEIR”.",
      "The words read exactly, letter by letter: “open daily”.",
      "The size is 600 × 400 mm and it stands 21 mm off the wall.",
      expect.stringMatching(/^The colours are Midnight on /),
      expect.stringMatching(/^The wood /),
      "Once it is cut and bonded a sign can't be changed. A later change is a new revision and may cost more.",
    ]);
    expect((await own.visitors.approver.refusal(getCertificate, { params: at(own, revisionId) })).code).toBe(
      "not_found",
    );
    expect((await app.queuedJobs()).map(({ task }) => task)).toEqual([
      "make-certificate",
      "send-mail",
      "send-mail",
      "send-mail",
    ]);
    await app.runJobs();
    const certificate = await own.visitors.approver.ask(getCertificate, { params: at(own, revisionId) });
    expect(certificate.status).toBe(200);
    expect(certificate.headers.get("content-disposition")).toContain(`${own.job.number}-A-certificate.pdf`);
    const [file] = await StoredFile.findAll({
      where: { id: (await Certificate.findOne({ where: { decisionId: row.id } }))?.fileId ?? "" },
    });
    const words = await popplerText(await app.services.storage.read(file?.storageKey ?? ""), "pdftotext");
    expect(words).toContain("Ada Quill");
    expect(words.replace(/\s/g, "")).toContain(before.pdfSha256);
    expect((await own.visitors.approver.ask(getProof, { params: at(own, revisionId) })).text).toBe(proof);
    expect(await revisionNow(own, revisionId)).toMatchObject({
      pdfSha256: before.pdfSha256,
      decision: { hasCertificate: true },
    });
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({
      state: "approved",
      whoseMove: "ours",
      nextStep: "A approved, free to build",
      approved: { letter: "A" },
    });
    const kinds = (await logKinds(own.job.id)).filter((kind) => kind !== "mail sent");
    expect(kinds.slice(-3)).toEqual(["revision opened", "revision approved", "certificate made"]);
    const mails = await OutgoingMail.findAll({ where: { jobId: own.job.id, kind: "approved" } });
    expect(mails.map(({ state }) => state)).toEqual(["sent", "sent", "sent"]);
    const told = (await caughtMails(app)).find(
      ({ to, subject }) => to === own.owner.email && /^Approved/.test(subject),
    );
    expect(told?.text).toMatch(
      new RegExp(`^${own.approver.contact.name} approved revision A of .*, signed “Ada Quill”\\.$`, "m"),
    );
  });

  it("makes the certificate once, however often its job runs", async () => {
    const { own, revisionId } = await issued();
    await approve(own, revisionId);
    await app.runJobs();
    const { id: decisionId } = await Decision.findOne({ where: { revisionId }, rejectOnEmpty: true });
    const files = await StoredFile.count();
    await runSql(app.database.appUrl, "select graphile_worker.add_job('make-certificate', $1::json)", [
      JSON.stringify({ decisionId }),
    ]);
    await app.runJobs();
    expect(await app.queuedJobs()).toEqual([]);
    expect(await Certificate.count({ where: { decisionId } })).toBe(1);
    expect(await StoredFile.count()).toBe(files);
    expect((await logKinds(own.job.id)).filter((kind) => kind === "certificate made")).toHaveLength(1);
  });

  it("is refused until everything read back is confirmed, each by name", async () => {
    const { own, revisionId } = await issued();
    const problem = await refused(own, revisionId, { acknowledgedIds: ["size", "terms"] });
    expect(problem).toMatchObject({ status: 422, code: "validation_failed" });
    expect(problem.errors).toEqual([
      {
        pointer: "/acknowledgedIds",
        detail: "Confirm this first: The words read exactly, letter by letter: “HERON & WEIR”.",
      },
      {
        pointer: "/acknowledgedIds",
        detail: "Confirm this first: The words read exactly, letter by letter: “open daily”.",
      },
      { pointer: "/acknowledgedIds", detail: expect.stringContaining("The colours are Midnight on") },
      { pointer: "/acknowledgedIds", detail: expect.stringContaining("The wood ") },
    ]);
    const all = await approvalOf(own, revisionId);
    const more = await refused(own, revisionId, { acknowledgedIds: [...all.acknowledgedIds, "hardware"] });
    expect(more.errors?.map(({ pointer }) => pointer)).toEqual(["/acknowledgedIds"]);
    await expectUndecided(own, revisionId);
  });

  it("asks for the hardware when there is some", async () => {
    const own = await buildJob(world);
    const holes = [hole("h1", 250, 200, { fixed: true }), hole("h2", 350, 200)];
    const document = buildSign([
      buildLayer("B", [disc("p1", 120, [300, 200])], { hold: standoffHold(holes, buildCapStud()), thickness: 3 }),
    ]);
    const { id } = await buildRevision(app, own, { document });
    const all = await approvalOf(own, id);
    expect(all.acknowledgedIds).toContain("hardware");
  });

  it("is refused for another PDF than the one that was issued", async () => {
    const { own, revisionId } = await issued();
    const problem = await refused(own, revisionId, { pdfSha256: "0".repeat(64) });
    expect(problem).toMatchObject({
      code: "wrong_state",
      detail: "The PDF you were shown is not the one that was issued. Open the sheet again.",
    });
    await expectUndecided(own, revisionId);
  });

  it("names every bad field", async () => {
    const { own, revisionId } = await issued();
    const problem = await own.visitors.approver.refusal(approveRevision, {
      params: at(own, revisionId),
      body: {
        typedName: "  ",
        acknowledgedIds: "all",
        pdfSha256: "abc",
        settledNoteIds: ["x"],
        approved: true,
      } as never,
    });
    expect(problem.errors?.map(({ pointer }) => pointer).sort()).toEqual([
      "/acknowledgedIds",
      "/approved",
      "/pdfSha256",
      "/settledNoteIds/0",
      "/typedName",
    ]);
    await expectUndecided(own, revisionId);
  });

  it("asks about each open note that must change, and settles those that are named", async () => {
    const { own, revisionId } = await issued();
    const { approver, maker, otherContact } = own.visitors;
    const mine = await say(own, approver, revisionId, "must change");
    const others = await say(own, otherContact, revisionId, "must change");
    await say(own, approver, revisionId, "question");
    await say(own, approver, revisionId, "fine as is");
    await say(own, maker, revisionId, "must change", true);
    const answered = await say(own, approver, revisionId, "must change");
    await maker.get(replyToNote, { params: { ...own.params, noteId: answered.id }, body: { text: "Done" } });
    const problem = await refused(own, revisionId, { settledNoteIds: [mine.id] });
    expect(problem).toMatchObject({
      code: "wrong_state",
      detail: "Note 2 says “must change” and is open. Settle it, or ask for a revision.",
      extra: { openNoteIds: [others.id] },
    });
    expect((await refused(own, revisionId, {})).extra).toEqual({ openNoteIds: [mine.id, others.id] });
    await app.runJobs();
    await expectUndecided(own, revisionId);
    expect((await Note.findByPk(mine.id))?.state).toBe("open");
    expect((await approve(own, revisionId, { settledNoteIds: [mine.id, others.id] })).state).toBe("approved");
    const notes = await Note.findAll({ where: { jobId: own.job.id }, order: ["number"] });
    expect(notes.map(({ state }) => state)).toEqual(["settled", "settled", "open", "open", "open", "answered"]);
  });

  it("is for the approvers named in the brief alone, as it stands now", async () => {
    const { own, revisionId } = await issued();
    const body = await approvalOf(own, revisionId);
    const given = { params: at(own, revisionId), body };
    const { owner, maker, rep, otherContact, approver } = own.visitors;
    for (const visitor of [owner, maker, rep, otherContact])
      expect(await visitor.refusal(approveRevision, given)).toMatchObject({
        code: "not_allowed",
        detail: "Only the approvers named in the brief decide on a revision.",
      });
    expect((await app.visitor().refusal(approveRevision, given)).code).toBe("not_signed_in");
    const stranger = await signInAs(app, await buildMember());
    expect((await stranger.refusal(approveRevision, given)).code).toBe("not_found");
    await owner.get(changeJob, { params: of(own), body: { approverIds: [] } });
    expect((await approver.refusal(approveRevision, given)).code).toBe("not_allowed");
    expect((await approver.get(getRevision, { params: at(own, revisionId) })).can.decide).toBe(false);
    await expectUndecided(own, revisionId);
  });

  it("happens once", async () => {
    const { own, revisionId } = await issued();
    await approve(own, revisionId);
    expect(await refused(own, revisionId, {})).toMatchObject({
      code: "wrong_state",
      detail: "Revision A is approved and takes no decision.",
      extra: { current: null },
    });
    const ask = await own.visitors.approver.refusal(askForRevision, {
      params: at(own, revisionId),
      body: { summary: "Wait" },
    });
    expect(ask.code).toBe("wrong_state");
    expect(await Decision.count({ where: { revisionId } })).toBe(1);
  });

  it("of what was superseded a moment ago is refused with the way to the one that is out", async () => {
    const { own, revisionId } = await issued();
    const stale = await approvalOf(own, revisionId);
    const bId = await issueNext(own, 95);
    for (const [endpoint, body] of [
      [approveRevision, stale],
      [askForRevision, { summary: "Wider" }],
    ] as const) {
      const problem = await own.visitors.approver.refusal(endpoint, { params: at(own, revisionId), body } as never);
      expect(problem).toMatchObject({
        code: "wrong_state",
        detail: "Revision A is superseded and takes no decision. Revision B is out now.",
        extra: { current: { revisionId: bId, letter: "B" } },
      });
    }
    expect(await Decision.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it("waits while the job is held", async () => {
    const { own, revisionId } = await issued();
    await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "on hold" } });
    expect(await refused(own, revisionId, {})).toMatchObject({
      code: "wrong_state",
      detail: "This job is on hold. Ask the shop.",
    });
    expect((await own.visitors.approver.get(getRevision, { params: at(own, revisionId) })).can.decide).toBe(false);
    await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "taken up again" } });
    expect((await approve(own, revisionId)).state).toBe("approved");
  });

  it("is refused once the job is handed over", async () => {
    const { own, revisionId: aId } = await issued();
    await approve(own, aId);
    await own.visitors.maker.get(moveJob, { params: of(own), body: { to: "in build" } });
    const bId = await issueNext(own, 95);
    await own.visitors.maker.get(moveJob, { params: of(own), body: { to: "handed over" } });
    expect(await refused(own, bId, {})).toMatchObject({
      code: "wrong_state",
      detail: "This job is handed over. Ask the shop.",
    });
    expect((await revisionNow(own, aId)).state).toBe("approved");
  });

  it("is refused when the frozen text is not what was hashed", async () => {
    const { own, revisionId } = await issued();
    const body = await approvalOf(own, revisionId);
    await breakSnapshot(app.database, revisionId);
    const problem = await own.visitors.approver.refusal(approveRevision, { params: at(own, revisionId), body });
    expect(problem.code).toBe("internal");
    expect(problem.detail).toBeUndefined();
    await expectUndecided(own, revisionId);
  });

  it("keeps A approved while B is out, and supersedes it when B is approved", async () => {
    const { own, revisionId: aId } = await issued();
    await approve(own, aId);
    const bId = await issueNext(own, 95);
    expect((await revisionNow(own, aId)).state).toBe("approved");
    expect(await own.visitors.approver.get(getJob, { params: of(own) })).toMatchObject({
      state: "out for proof",
      whoseMove: "client",
      nextStep: "Revision B waits for your decision",
      latest: { letter: "B" },
      approved: { letter: "A" },
    });
    await approve(own, bId);
    expect((await revisionNow(own, aId)).state).toBe("superseded");
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({
      state: "approved",
      approved: { revisionId: bId, letter: "B" },
    });
    expect((await revisionNow(own, aId)).decision).toMatchObject({ kind: "approved" });
  });

  it("of a change to a job in build leaves it in build, and tells the client to decide first", async () => {
    const { own, revisionId: aId } = await issued();
    await approve(own, aId);
    await own.visitors.maker.get(moveJob, { params: of(own), body: { to: "in build" } });
    const told = async () => (await own.visitors.approver.get(getJob, { params: of(own) })).nextStep;
    expect(await told()).toBe("Your sign is being built");
    const bId = await issueNext(own, 95);
    expect(await told()).toBe("Revision B waits for your decision");
    await approve(own, bId);
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({
      state: "in build",
      nextStep: "In build from B",
    });
  });

  it("shows the shop what the database keeps for good", async () => {
    const { own, revisionId } = await issued();
    await approve(own, revisionId);
    for (const sql of [
      "update decisions set typed_name = 'Someone else'",
      "delete from decisions",
      `update revisions set state = 'issued' where id = '${revisionId}'`,
      `update revisions set snapshot = '{}' where id = '${revisionId}'`,
    ])
      await expect(runSql(app.database.appUrl, sql), sql).rejects.toThrow();
    expect(await Revision.findByPk(revisionId)).toMatchObject({ state: "approved" });
  });
});

describe("asking for a revision", () => {
  it("needs a summary, or an open note of the client's that says what should change", async () => {
    const { own, revisionId } = await issued();
    const { approver, maker } = own.visitors;
    const params = at(own, revisionId);
    await say(own, maker, revisionId, "must change");
    await say(own, approver, revisionId, "fine as is");
    for (const body of [{}, { summary: "  \n " }])
      expect((await approver.refusal(askForRevision, { params, body })).errors).toEqual([
        { pointer: "/summary", detail: "Say what should change, or leave a note at the spot first." },
      ]);
    await app.runJobs();
    await expectUndecided(own, revisionId);
    await say(own, approver, revisionId, "question");
    const asked = await approver.get(askForRevision, { params, body: {} });
    expect(asked).toMatchObject({
      state: "revision asked",
      decision: { kind: "revision asked", typedName: null, hasCertificate: false },
      can: { note: true, decide: false, withdraw: false },
    });
  });

  it("records the summary, logs it and tells the staff", async () => {
    const { own, revisionId } = await issued();
    const { approver, otherContact, owner } = own.visitors;
    const given = { params: at(own, revisionId), body: { summary: " Make the heron\r\nlarger " } };
    expect((await otherContact.refusal(askForRevision, given)).code).toBe("not_allowed");
    expect((await owner.refusal(askForRevision, given)).code).toBe("not_allowed");
    expect((await app.visitor().refusal(askForRevision, given)).code).toBe("not_signed_in");
    const asked = await approver.get(askForRevision, given);
    expect(asked.decision?.summary).toBe("Make the heron\nlarger");
    expect(await Decision.findOne({ where: { revisionId } })).toMatchObject({
      kind: "revision asked",
      pdfSha256: asked.pdfSha256,
      acknowledgements: null,
    });
    expect(await lastLogLine(own.job.id)).toMatch(/: Asked for a revision of A: Make the heron\nlarger$/);
    const mails = await OutgoingMail.findAll({ where: { jobId: own.job.id, kind: "revision asked" } });
    expect(mails.map(({ state }) => state)).toEqual(["queued", "queued", "queued"]);
    const queued = (await app.queuedJobs()).map(({ payload }) => payload.mailId);
    for (const { id } of mails) expect(queued).toContain(id);
    expect(await owner.get(getJob, { params: of(own) })).toMatchObject({
      state: "revision asked",
      whoseMove: "ours",
      nextStep: "Revision asked, change the mockup and issue B",
    });
    expect((await approver.refusal(askForRevision, given)).code).toBe("wrong_state");
    await app.runJobs();
    const bId = await issueNext(own, 95);
    expect((await revisionNow(own, revisionId)).state).toBe("superseded");
    expect((await approve(own, bId)).state).toBe("approved");
  });
});

describe("consent to the portfolio", () => {
  it("is given with the approval, or by itself, and taken back; only by the client", async () => {
    const { own, revisionId } = await issued();
    const { approver, otherContact, owner, rep } = own.visitors;
    const given = { params: of(own), body: { given: true } };
    expect((await approve(own, revisionId, { consentToPortfolio: true })).state).toBe("approved");
    const job = await approver.get(getJob, { params: of(own) });
    expect(job).toMatchObject({ consent: { given: true }, can: { giveConsent: true } });
    for (const visitor of [owner, rep]) expect((await visitor.refusal(setConsent, given)).code).toBe("not_allowed");
    const taken = await otherContact.get(setConsent, { params: of(own), body: { given: false } });
    expect(taken.consent).toEqual({ given: false, at: null });
    await otherContact.get(setConsent, { params: of(own), body: { given: false } });
    expect((await approver.get(setConsent, given)).consent.given).toBe(true);
    const kinds = (await logKinds(own.job.id)).filter((kind) => kind.startsWith("consent"));
    expect(kinds).toEqual(["consent given", "consent taken back", "consent given"]);
    expect(await Job.findByPk(own.job.id)).toMatchObject({ consentBy: own.approver.contact.id });
  });
});
