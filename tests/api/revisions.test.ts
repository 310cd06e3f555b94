import { rename, rm, writeFile } from "node:fs/promises";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { sha256Hex } from "#server/files/sha256.ts";
import { Job } from "#server/models/job.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Revision } from "#server/models/revision.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import { renderProof } from "#server/pdf/proof.ts";
import { changeJob, getJob, moveJob } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import {
  getPicture,
  getProof,
  getRevision,
  getSheet,
  issueRevision,
  listRevisions,
  withdrawRevision,
} from "#shared/contracts/revisions.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { breakSnapshot } from "../support/break-snapshot.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { revisionNow } from "../support/decide.ts";
import { buildContact } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildArtwork, buildRevision, buildWorld, signFromArtwork, type World } from "../support/factories/work.ts";
import { lastLogLine, logKinds } from "../support/job-log.ts";
import { caughtMails } from "../support/mail.ts";
import { popplerText } from "../support/poppler.ts";
import { runSql } from "../support/run-sql.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const at = ({ params }: World, revisionId: string) => ({ ...params, revisionId });
/** A sign without artwork, quick to draw. */
const plainSign = (width = 90): MockupDocument => buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]);

async function save(own: World, document: MockupDocument): Promise<number> {
  const { version } = await own.visitors.owner.get(getMockup, { params: of(own) });
  return (await own.visitors.owner.get(saveMockup, { params: of(own), body: { version, document } })).version;
}
const issue = (own: World, mockupVersion: number, message = "") =>
  own.visitors.maker.get(issueRevision, { params: of(own), body: { mockupVersion, message } });
const proofOf = async (own: World, revisionId: string): Promise<Uint8Array> => {
  const { pdfFileId } = await Revision.findByPk(revisionId, { rejectOnEmpty: true });
  const file = await StoredFile.findByPk(pdfFileId ?? "", { rejectOnEmpty: true });
  expect((await own.visitors.rep.ask(getProof, { params: at(own, revisionId) })).status).toBe(200);
  return app.services.storage.read(file.storageKey);
};

describe("issuing", () => {
  it("freezes the draft, is `preparing` until the PDF stands, and only then mails the approvers", async () => {
    const own = await buildJob(world, { title: "Heron over the door" });
    const artwork = await buildArtwork(app, own);
    const version = await save(own, await signFromArtwork(own, artwork.id));
    const preparing = await issue(own, version, "  Please look at the disc. ");
    expect(preparing).toMatchObject({
      letter: "A",
      state: "preparing",
      message: "Please look at the disc.",
      issuedAt: null,
      pdfSha256: null,
      failure: null,
      can: { note: false, decide: false, withdraw: false, download: false },
    });
    expect(await app.queuedJobs()).toMatchObject([{ task: "render-proof", payload: { revisionId: preparing.id } }]);
    expect(await OutgoingMail.count({ where: { jobId: own.job.id } })).toBe(0);
    expect((await own.visitors.rep.refusal(getProof, { params: at(own, preparing.id) })).code).toBe("not_found");

    const row = await Revision.findByPk(preparing.id, { rejectOnEmpty: true });
    expect(sha256Hex(row.snapshot ?? "")).toBe(preparing.snapshotSha256);
    const snapshot = JSON.parse(row.snapshot ?? "") as Snapshot;
    expect(snapshot.titleBlock).toMatchObject({ revision: "A", title: "Heron over the door", number: own.job.number });
    expect(snapshot.artworkHashes).toEqual({ [artwork.id]: artwork.sha256 });
    expect(snapshot.words).toBe("HERON & WEIR");

    await app.runJobs();
    const issued = await revisionNow(own, preparing.id);
    expect(issued).toMatchObject({
      state: "issued",
      snapshotSha256: preparing.snapshotSha256,
      can: { note: true, decide: false, withdraw: true, download: true },
    });
    const mails = await OutgoingMail.findAll({ where: { jobId: own.job.id } });
    expect(mails.map(({ kind, address, state }) => [kind, address, state])).toEqual([
      ["proof issued", own.approver.email, "sent"],
    ]);
    const mail = (await caughtMails(app)).find(({ text }) => text.includes("Heron over the door"));
    expect(mail).toMatchObject({ to: own.approver.email });
    expect(mail?.text).toContain("Please look at the disc.");
    expect(await logKinds(own.job.id)).toEqual([
      "job opened",
      "job changed",
      "artwork added",
      "artwork ready",
      "mockup begun",
      "revision preparing",
      "revision issued",
      "mail sent",
    ]);
    expect((await own.visitors.approver.get(getRevision, { params: at(own, issued.id) })).can).toEqual({
      note: true,
      decide: true,
      withdraw: false,
      download: true,
    });
  });

  it("makes a PDF that names the snapshot's hash, the same bytes from the same snapshot", async () => {
    const own = await buildJob(world);
    const { id, snapshotSha256, pdfSha256, pdfByteSize } = await buildRevision(app, own, { document: plainSign() });
    const pdf = await proofOf(own, id);
    expect(sha256Hex(pdf)).toBe(pdfSha256);
    expect(pdf.byteLength).toBe(pdfByteSize);
    const row = await Revision.findByPk(id, { rejectOnEmpty: true });
    const again = await renderProof(JSON.parse(row.snapshot ?? "") as Snapshot, row.snapshotSha256 ?? "");
    expect(sha256Hex(again)).toBe(pdfSha256);
    // poppler reads both: the document's information and the words on the sheet.
    const information = await popplerText(pdf, "pdfinfo");
    expect(information).toContain(`sha256:${snapshotSha256}`);
    expect(information).toContain(`${own.job.number}, revision A: Lobby sign`);
    expect(await popplerText(pdf, "pdftotext")).toContain(own.job.number);

    const { headers } = await own.visitors.approver.ask(getProof, { params: at(own, id) });
    expect(headers.get("content-type")).toBe("application/pdf");
    expect(headers.get("content-disposition")).toBe(`inline; filename*=UTF-8''${own.job.number}-A.pdf`);
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    const picture = await own.visitors.approver.ask(getPicture, { params: at(own, id) });
    expect(picture.headers.get("content-type")).toBe("image/svg+xml");
    expect(picture.headers.get("cache-control")).toBe("private, max-age=3600");
    expect(picture.headers.get("vary")?.split(/,\s*/)).toContain("Cookie");
    expect(picture.text).toMatch(/^<svg /);
  });

  it("refuses a draft that was saved again since, with the newer one", async () => {
    const own = await buildJob(world);
    await save(own, plainSign(80));
    await save(own, plainSign(85));
    const problem = await own.visitors.maker.refusal(issueRevision, { params: of(own), body: { mockupVersion: 1 } });
    expect(problem).toMatchObject({ code: "stale", extra: { newer: { version: 2 } } });
    expect(await Revision.count({ where: { jobId: own.job.id } })).toBe(0);
    expect(await app.queuedJobs()).toEqual([]);
  });

  it("needs a mockup, and one with pieces", async () => {
    const own = await buildJob(world);
    const body = { mockupVersion: 1 };
    expect(await own.visitors.maker.refusal(issueRevision, { params: of(own), body })).toMatchObject({
      code: "wrong_state",
      detail: "There is no mockup yet. Draw it first.",
    });
    await save(own, buildSign([buildLayer("B", [])]));
    expect(await own.visitors.maker.refusal(issueRevision, { params: of(own), body })).toMatchObject({
      code: "wrong_state",
      detail: "The mockup has no pieces yet. Bring in artwork first.",
    });
  });

  it("refuses what the dry fit stops, with what it found", async () => {
    const own = await buildJob(world);
    // A bonded piece that lies half off the board.
    const version = await save(own, buildSign([buildLayer("B", [plate("off", 100, 50, [0, 200])])]));
    const problem = await own.visitors.maker.refusal(issueRevision, {
      params: of(own),
      body: { mockupVersion: version },
    });
    expect(problem).toMatchObject({ status: 409, code: "dry_fit_stops" });
    const findings = problem.extra?.findings as { severity: string; rule: number; pieceIds: string[] }[];
    expect(findings.every(({ severity }) => severity === "stop")).toBe(true);
    expect(findings.flatMap(({ pieceIds }) => pieceIds)).toContain("off");
    expect(await Revision.count({ where: { jobId: own.job.id } })).toBe(0);
    expect(await Job.findByPk(own.job.id)).toMatchObject({ state: "mockup" });
  });

  it("waits for the one that is being drawn, and for a job that is held", async () => {
    const own = await buildJob(world);
    const version = await save(own, plainSign());
    await issue(own, version);
    const given = { params: of(own), body: { mockupVersion: version } };
    expect(await own.visitors.owner.refusal(issueRevision, given)).toMatchObject({
      code: "wrong_state",
      detail: "A is still being drawn. Wait for it.",
    });
    await app.runJobs();
    await own.visitors.owner.get(moveJob, { params: of(own), body: { to: "on hold" } });
    expect(await own.visitors.owner.refusal(issueRevision, given)).toMatchObject({
      code: "wrong_state",
      detail: "A job that is “on hold” takes no new revision.",
    });
    expect(await Revision.count({ where: { jobId: own.job.id } })).toBe(1);
  });

  it("names every bad field, and is for owners and makers", async () => {
    const own = await buildJob(world);
    const { errors } = await own.visitors.maker.refusal(issueRevision, {
      params: of(own),
      body: { mockupVersion: 0, message: "a\u0001b", letter: "Q" } as never,
    });
    expect(errors?.map(({ pointer }) => pointer).sort()).toEqual(["/letter", "/message", "/mockupVersion"]);
    const given = { params: of(own), body: { mockupVersion: 1 } };
    expect((await own.visitors.rep.refusal(issueRevision, given)).code).toBe("not_allowed");
    expect((await own.visitors.approver.refusal(issueRevision, given)).code).toBe("not_found");
    expect((await app.visitor().refusal(issueRevision, given)).code).toBe("not_signed_in");
  });

  it("takes text that no font of ours holds and names of the longest kind", async () => {
    const own = await buildJob(world, { title: "T".repeat(160), brief: { words: `${"W".repeat(400)}\n漢字 🪶` } });
    const revision = await buildRevision(app, own, { document: plainSign() });
    expect(revision).toMatchObject({ state: "issued", failure: null });
  });
});

describe("a PDF that can't be drawn", () => {
  it("returns the revision to draft, says so, mails nobody, and the letter is used again", async () => {
    const own = await buildJob(world);
    const version = await save(own, plainSign());
    const { id } = await issue(own, version, "First try");
    await breakSnapshot(app.database, id);
    await app.runJobs();
    const failed = await revisionNow(own, id);
    expect(failed).toMatchObject({
      state: "draft",
      letter: "A",
      issuedAt: null,
      failure: "The drawing could not be made into a PDF. Nothing went out; issue it again or ask for help.",
      can: { download: false, note: false, withdraw: false },
    });
    expect(await OutgoingMail.count({ where: { jobId: own.job.id } })).toBe(0);
    expect(await app.queuedJobs()).toEqual([]);
    expect(await lastLogLine(own.job.id)).toBe(`Standproud: The PDF of revision A failed: ${failed.failure}`);
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({
      whoseMove: "ours",
      nextStep: "The PDF of A failed, issue it again",
    });
    expect((await own.visitors.approver.refusal(getRevision, { params: at(own, id) })).code).toBe("not_found");
    expect(app.logged.some((line) => line.includes("The PDF of a revision could not be drawn"))).toBe(true);

    const again = await issue(own, version, "Second try");
    expect(again).toMatchObject({ id, letter: "A", state: "preparing", message: "Second try", failure: null });
    await app.runJobs();
    expect(await revisionNow(own, id)).toMatchObject({ state: "issued", message: "Second try" });
    expect(await Revision.count({ where: { jobId: own.job.id } })).toBe(1);
    expect(await OutgoingMail.count({ where: { jobId: own.job.id, kind: "proof issued" } })).toBe(1);
  });

  it("leaves what was out before as it was", async () => {
    const own = await buildJob(world);
    const a = await buildRevision(app, own, { document: plainSign() });
    const b = await issue(own, await save(own, plainSign(95)));
    await breakSnapshot(app.database, b.id);
    await app.runJobs();
    expect((await revisionNow(own, a.id)).state).toBe("issued");
    expect(await own.visitors.approver.get(getJob, { params: of(own) })).toMatchObject({
      state: "out for proof",
      whoseMove: "client",
      nextStep: "Revision A waits for your decision",
    });
  });

  it("that can't be kept is tried again, and the last time the revision returns to draft", async () => {
    const own = await buildJob(world);
    const { id } = await issue(own, await save(own, plainSign()));
    const { storage } = app.services;
    const shopFolder = `${storage.quarantineDir}/../kept/${own.owner.shop.id}`;
    // A file where the shop's folder should be: nothing can be kept under it, whoever the server runs as.
    await rename(shopFolder, `${shopFolder}-aside`);
    await writeFile(shopFolder, "");
    try {
      await app.runJobs();
      expect((await revisionNow(own, id)).state).toBe("preparing");
      expect((await app.queuedJobs()).map(({ task }) => task)).toEqual(["render-proof"]);
      await runSql(app.database.ownerUrl, "update graphile_worker._private_jobs set attempts = 7, run_at = now()");
      await app.runJobs();
    } finally {
      await rm(shopFolder);
      await rename(`${shopFolder}-aside`, shopFolder);
    }
    expect(await revisionNow(own, id)).toMatchObject({
      state: "draft",
      failure: "The PDF could not be kept on the server's disk. Nothing went out; issue it again or ask for help.",
    });
    expect(await app.queuedJobs()).toEqual([]);
    expect(await OutgoingMail.count({ where: { jobId: own.job.id } })).toBe(0);
  });
});

describe("the row of revisions", () => {
  it("goes on to B when A was issued, and B supersedes A once its PDF stands", async () => {
    const own = await buildJob(world);
    const a = await buildRevision(app, own, { document: plainSign() });
    const b = await issue(own, await save(own, plainSign(95)));
    expect(b.letter).toBe("B");
    expect((await revisionNow(own, a.id)).state).toBe("issued");
    await app.runJobs();
    expect(await revisionNow(own, a.id)).toMatchObject({
      state: "superseded",
      current: { revisionId: b.id, letter: "B" },
      can: { note: false, decide: false, withdraw: false, download: true },
    });
    expect((await revisionNow(own, b.id)).state).toBe("issued");
    // The client still reads the superseded sheet.
    const sheet = await own.visitors.approver.get(getSheet, { params: at(own, a.id) });
    expect(sheet.others).toEqual([{ revisionId: b.id, letter: "B", state: "issued" }]);
    const page = await own.visitors.approver.get(listRevisions, { params: of(own), query: { limit: 1 } });
    expect(page.items.map(({ letter }) => letter)).toEqual(["B"]);
    const rest = await own.visitors.approver.get(listRevisions, {
      params: of(own),
      query: { limit: 1, cursor: page.next ?? "" },
    });
    expect([rest.items.map(({ letter }) => letter), rest.next]).toEqual([["A"], null]);
  });

  it("goes on after Y with AA", async () => {
    const own = await buildJob(world);
    const version = await save(own, plainSign());
    const { id } = await issue(own, version);
    await app.runJobs();
    // As if it were the last of the one-letter row, without issuing each.
    const sql = `do $$ begin
      alter table revisions disable trigger revisions_guarded;
      update revisions set letter = 'Y' where id = '${id}';
      alter table revisions enable trigger revisions_guarded;
    end $$`;
    await runSql(app.database.ownerUrl, sql);
    expect((await issue(own, version)).letter).toBe("AA");
    await app.runJobs();
    const { items } = await own.visitors.rep.get(listRevisions, { params: of(own) });
    expect(items.map(({ letter, state }) => [letter, state])).toEqual([
      ["AA", "issued"],
      ["Y", "superseded"],
    ]);
  });

  it("hides what is on the shop's table from its client", async () => {
    const own = await buildJob(world);
    const a = await buildRevision(app, own, { document: plainSign() });
    const b = await issue(own, await save(own, plainSign(95)));
    const { approver, otherContact } = own.visitors;
    for (const visitor of [approver, otherContact]) {
      for (const endpoint of [getRevision, getSheet, getProof, getPicture])
        expect((await visitor.refusal(endpoint, { params: at(own, b.id) })).code).toBe("not_found");
      const { items } = await visitor.get(listRevisions, { params: of(own) });
      expect(items.map(({ letter }) => letter)).toEqual(["A"]);
      expect((await visitor.get(getRevision, { params: at(own, a.id) })).current).toBeNull();
      expect((await visitor.get(getSheet, { params: at(own, a.id) })).others).toEqual([]);
    }
    await app.runJobs();
    await own.visitors.owner.get(withdrawRevision, { params: at(own, b.id), body: { reason: "Wrong colour" } });
    for (const endpoint of [getRevision, getSheet, getProof, getPicture])
      expect((await approver.refusal(endpoint, { params: at(own, b.id) })).code).toBe("not_found");
    const job = await approver.get(getJob, { params: of(own) });
    expect(job).toMatchObject({ state: "mockup", latest: { letter: "A", state: "superseded" }, approved: null });
    expect(job.nextStep).toBe("The shop is working on the next proof");
    expect(JSON.stringify(job)).not.toMatch(/withdrawn|Wrong colour/);
  });
});

describe("the sheet", () => {
  it("names its reader, comes from the frozen drawing, and a contact's first look is written down once", async () => {
    const own = await buildJob(world);
    const { id } = await buildRevision(app, own, { document: plainSign() });
    await own.visitors.owner.get(changeJob, { params: of(own), body: { title: "Renamed", brief: { words: "NEW" } } });
    await save(own, plainSign(300));
    const params = at(own, id);
    const sheet = await own.visitors.approver.get(getSheet, { params });
    expect(sheet.reader).toEqual({ name: own.approver.contact.name, side: "client", approver: true });
    expect(sheet.job).toMatchObject({ title: "Lobby sign", number: own.job.number, unit: "mm" });
    expect(sheet.words).toBe("HERON & WEIR");
    expect(sheet.making).toBeNull();
    expect(sheet.board).toEqual({ widthMm: 600, heightMm: 400 });
    expect(sheet.pieces).toEqual([{ id: "p1", name: "Layer B", layerKey: "B", x: 200, y: 200 }]);
    expect(sheet.zones.columns.map(({ label }) => label)).toEqual(["1", "2", "3", "4", "5", "6"]);
    expect(sheet.acknowledgements[0]).toEqual({
      id: "words-1",
      text: "The words read exactly, letter by letter: “HERON & WEIR”.",
    });
    await own.visitors.approver.get(getSheet, { params });
    expect((await own.visitors.otherContact.get(getSheet, { params })).reader.approver).toBe(false);
    expect(await own.visitors.rep.get(getSheet, { params })).toMatchObject({
      reader: { side: "shop", approver: false },
      making: expect.stringMatching(/^Hanging: .*upright/),
    });
    const kinds = await logKinds(own.job.id);
    expect(kinds.filter((kind) => kind === "revision opened")).toHaveLength(2);
    expect((await own.visitors.owner.get(getJob, { params: of(own) })).nextStep).toBe(
      "A is out, opened, no decision yet",
    );
  });

  it("is not drawn from a frozen text that was tampered with", async () => {
    const own = await buildJob(world);
    const { id } = await buildRevision(app, own, { document: plainSign() });
    await breakSnapshot(app.database, id);
    expect((await own.visitors.rep.refusal(getSheet, { params: at(own, id) })).code).toBe("internal");
    expect(app.logged.some((line) => line.includes(`revision ${id} does not match its hash`))).toBe(true);
  });
});

describe("withdrawing", () => {
  it("takes an issued revision back, with its reason, before it is decided on", async () => {
    const own = await buildJob(world);
    const { id } = await issue(own, await save(own, plainSign()));
    const { approver, maker, rep } = own.visitors;
    const given = { params: at(own, id), body: { reason: "Wrong size" } };
    expect(await maker.refusal(withdrawRevision, given)).toMatchObject({
      code: "wrong_state",
      detail: "Revision A is preparing and can't be withdrawn.",
    });
    await app.runJobs();
    expect((await rep.refusal(withdrawRevision, given)).code).toBe("not_allowed");
    expect((await approver.refusal(withdrawRevision, given)).code).toBe("not_allowed");
    expect((await app.visitor().refusal(withdrawRevision, given)).code).toBe("not_signed_in");
    const empty = await maker.refusal(withdrawRevision, { params: given.params, body: { reason: " \n" } });
    expect(empty.errors).toEqual([{ pointer: "/reason", detail: "Say why it is withdrawn." }]);
    expect(await maker.get(withdrawRevision, given)).toMatchObject({ state: "withdrawn", current: null });
    expect((await maker.refusal(withdrawRevision, given)).code).toBe("wrong_state");
    expect(await lastLogLine(own.job.id)).toMatch(/: Withdrew revision A: Wrong size$/);
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toMatchObject({
      state: "mockup",
      whoseMove: "ours",
      nextStep: "A was withdrawn, issue B",
    });
    expect((await issue(own, 1)).letter).toBe("B");
    await app.runJobs();
  });

  it("changes nothing back: what it superseded stays superseded", async () => {
    const own = await buildJob(world);
    const a = await buildRevision(app, own, { document: plainSign() });
    const b = await buildRevision(app, own, { document: plainSign(95) });
    await own.visitors.owner.get(withdrawRevision, { params: at(own, b.id), body: { reason: "Too wide" } });
    expect((await revisionNow(own, a.id)).state).toBe("superseded");
  });
});

describe("a proof", () => {
  it("reaches each approver by a link of their own, and nobody else", async () => {
    const second = await buildContact({ client: world.approver.client });
    const own = await buildJob(world, { approverIds: [world.approver.contact.id, second.contact.id] });
    await buildRevision(app, own, { document: plainSign() });
    const mails = await OutgoingMail.findAll({ where: { jobId: own.job.id, kind: "proof issued" } });
    expect(mails.map(({ address }) => address).sort()).toEqual([world.approver.email, second.email].sort());
  });
});
