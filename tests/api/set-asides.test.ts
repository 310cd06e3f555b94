import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Revision } from "#server/models/revision.ts";
import { SetAside } from "#server/models/set-aside.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import { getJob, listEvents, setConsent } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { listNotes } from "#shared/contracts/notes.ts";
import { makeShareLink, openShareLink } from "#shared/contracts/portfolio.ts";
import {
  approveRevision,
  compareRevisions,
  getPicture,
  getRevision,
  getSheet,
  issueRevision,
  listRevisions,
} from "#shared/contracts/revisions.ts";
import { listSetAsides, setAsideFinding, takeBackSetAside } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { type BoundFinding, boundFinding } from "#shared/dry-fit/set-aside.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { approvalOf } from "../support/decide.ts";
import { dryFitOf } from "../support/dry-fit.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import { lastLogLine, logKinds } from "../support/job-log.ts";
import { popplerText } from "../support/poppler.ts";
import type { Answer } from "../support/visitor.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 8 });
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const codeOf = ({ status, text }: Answer): string =>
  status < 400 ? "done" : (JSON.parse(text) as { code: string }).code;

/** A bonded plate of 100 mm whose middle is so many mm from the board's left edge: at 0 half of it hangs over. */
const hanging = (x: number): MockupDocument => buildSign([buildLayer("B", [plate("off", 100, 50, [x, 200])])]);
const isOff = ({ rule, pieceIds }: BoundFinding): boolean => rule === 1 && pieceIds.includes("off");

async function save(own: World, document: MockupDocument): Promise<number> {
  const { version } = await own.visitors.owner.get(getMockup, { params: of(own) });
  return (await own.visitors.owner.get(saveMockup, { params: of(own), body: { version, document } })).version;
}

/** What the screen would show of a sign: the same code on the same figures. */
const found = async (document: MockupDocument): Promise<Finding[]> =>
  dryFitOf(document, { context: { words: world.job.brief.words } });
async function offFinding(document: MockupDocument): Promise<BoundFinding> {
  const finding = (await found(document)).find(isOff);
  if (!finding) throw new Error("The plate hangs over nowhere.");
  return boundFinding(finding);
}

/** A job whose saved draft has the plate hanging over, and what setting that aside takes. */
async function hangingJob(x = 0) {
  const own = await buildJob(world);
  const mockupVersion = await save(own, hanging(x));
  const finding = await offFinding(hanging(x));
  const body = { mockupVersion, finding, reason: "The left edge stands on a shelf" };
  return { own, given: { params: of(own), body } };
}

/** Everything else that would stop it, so that only the plate decides. */
async function setOthersAside(own: World, document: MockupDocument, mockupVersion: number): Promise<void> {
  const stops = (await found(document)).filter((finding) => finding.severity === "stop" && !isOff(finding));
  for (const finding of stops) {
    const body = { mockupVersion, finding: boundFinding(finding), reason: "Not what this test is about" };
    await own.visitors.owner.get(setAsideFinding, { params: of(own), body });
  }
}

describe("setting a finding aside", () => {
  it("keeps it with the reason and who gave it, lists it to all staff, and writes it into the log", async () => {
    const { own, given } = await hangingJob();
    const made = await own.visitors.maker.get(setAsideFinding, given);
    expect(made).toMatchObject({
      finding: { rule: 1, severity: "stop", pieceIds: ["off"], value: 50, limit: 30, unit: "%" },
      reason: "The left edge stands on a shelf",
      can: { takeBack: true },
    });
    expect(made.by).toMatch(/^Person \d+$/);
    const listed = await own.visitors.rep.get(listSetAsides, { params: of(own) });
    expect(listed).toEqual({ items: [{ ...made, can: { takeBack: false } }], next: null });
    expect(await lastLogLine(own.job.id)).toBe(
      `${made.by}: Set aside the stop “Unsupported”: The left edge stands on a shelf`,
    );
    const row = await SetAside.findByPk(made.id);
    expect(row).toMatchObject({ rule: 1, severity: "stop", setAsideRole: "maker", takenBackAt: null });
  });

  it("is refused for what the dry fit does not find, whatever the request says it found", async () => {
    const { own, given } = await hangingJob();
    for (const forged of [{ value: 49.9 }, { severity: "caution" as const }, { pieceIds: ["on"] }, { limit: 40 }]) {
      const body = { ...given.body, finding: { ...given.body.finding, ...forged } };
      expect(await own.visitors.maker.refusal(setAsideFinding, { ...given, body })).toMatchObject({
        code: "wrong_state",
        detail: "The dry fit of the saved mockup does not find this any more. Look at what it finds now.",
      });
    }
    expect(await SetAside.count({ where: { jobId: own.job.id } })).toBe(0);
    // Words that came along are not believed: the row has those that were found here.
    const finding = { ...given.body.finding, title: "Harmless", text: "Nothing to see." };
    const made = await own.visitors.maker.get(setAsideFinding, { ...given, body: { ...given.body, finding } });
    expect(made.finding).toEqual(given.body.finding);
  });

  it("keeps words that were pasted with what no record can hold", async () => {
    const own = await buildJob(world);
    const sign = hanging(0);
    const layers = sign.layers.map((layer) => ({ ...layer, name: "Outer\u0000ring \ud800" }));
    const mockupVersion = await save(own, { ...sign, layers });
    const finding = await offFinding(sign);
    const body = { mockupVersion, finding, reason: "The left edge stands on a shelf" };
    const made = await own.visitors.maker.get(setAsideFinding, { params: of(own), body });
    expect(made.finding.text).toContain("Outer ring");
  });

  it("is refused when the mockup was saved again since, with the newer one", async () => {
    const { own, given } = await hangingJob();
    await save(own, hanging(300));
    const problem = await own.visitors.maker.refusal(setAsideFinding, given);
    expect(problem).toMatchObject({ code: "stale", extra: { newer: { version: given.body.mockupVersion + 1 } } });
    expect(await SetAside.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it.each([
    { what: "no reason", reason: "" },
    { what: "a blank one", reason: "  \n\t " },
    { what: "two letters", reason: " ok " },
    { what: "two signs of four units", reason: "🙂🙂" },
    { what: "more than 500 characters", reason: "x".repeat(501) },
  ])("is refused with $what", async ({ reason }) => {
    const { own, given } = await hangingJob();
    const problem = await own.visitors.owner.refusal(setAsideFinding, { ...given, body: { ...given.body, reason } });
    expect(problem).toMatchObject({ code: "validation_failed", errors: [{ pointer: "/reason" }] });
  });

  it("by two at once makes one row and one line in the log, five times over", async () => {
    for (let round = 0; round < 5; round += 1) {
      const { own, given } = await hangingJob();
      const answers = await Promise.all(
        [own.visitors.owner, own.visitors.maker].map((visitor) => visitor.ask(setAsideFinding, given)),
      );
      expect(answers.map(codeOf).sort()).toEqual(["already_exists", "done"]);
      expect(await SetAside.count({ where: { jobId: own.job.id } })).toBe(1);
      expect((await logKinds(own.job.id)).filter((kind) => kind === "finding set aside")).toHaveLength(1);
    }
  });
});

describe("who may set aside", () => {
  it("a rep looks on, and only an owner gets as far as the dry fit with a safety stop", async () => {
    const { own, given } = await hangingJob();
    const { owner, maker, rep, approver } = own.visitors;
    expect((await rep.refusal(setAsideFinding, given)).code).toBe("not_allowed");
    expect((await approver.refusal(setAsideFinding, given)).code).toBe("not_found");
    for (const rule of [10, 12, 36, 38]) {
      const body = { ...given.body, finding: { ...given.body.finding, rule } };
      expect(await maker.refusal(setAsideFinding, { ...given, body })).toMatchObject({
        code: "not_allowed",
        detail: "A stop about safety is set aside by an owner only.",
      });
      expect((await owner.refusal(setAsideFinding, { ...given, body })).code).toBe("wrong_state");
    }
  });

  it("the stop of a sign that hangs outside is an owner's to set aside, and a maker issues it then", async () => {
    const own = await buildJob(world, { brief: { place: "outside" } });
    const document = hanging(300);
    const mockupVersion = await save(own, document);
    const findings = await dryFitOf(document, { context: { place: "outside", words: own.job.brief.words } });
    const [outside] = findings.filter(({ rule }) => rule === 38).map(boundFinding);
    if (!outside) throw new Error("Nobody is asked about a sign outside.");
    await setOthersAside(own, document, mockupVersion);
    const issue = { params: of(own), body: { mockupVersion } };
    expect(await own.visitors.maker.refusal(issueRevision, issue)).toMatchObject({
      code: "dry_fit_stops",
      extra: { findings: [{ rule: 38, text: outside.text }] },
    });
    const body = { mockupVersion, finding: outside, reason: "Ada Beam, licensed, has seen the wall" };
    expect((await own.visitors.maker.refusal(setAsideFinding, { params: of(own), body })).code).toBe("not_allowed");
    // What is not a stop in the request is not found: it can't be smuggled past.
    const milder = { ...body, finding: { ...outside, severity: "caution" as const } };
    expect((await own.visitors.maker.refusal(setAsideFinding, { params: of(own), body: milder })).code).toBe(
      "wrong_state",
    );
    const { id } = await own.visitors.owner.get(setAsideFinding, { params: of(own), body });
    expect(await SetAside.findByPk(id)).toMatchObject({ rule: 38, severity: "stop", setAsideRole: "owner" });
    expect((await own.visitors.maker.get(issueRevision, issue)).state).toBe("preparing");
  });

  it("what is set aside on a job is no affair of its client, nor of another job", async () => {
    const { own, given } = await hangingJob();
    const { id } = await own.visitors.maker.get(setAsideFinding, given);
    const other = await buildJob(world);
    const elsewhere = { params: { ...of(other), setAsideId: id } };
    expect((await own.visitors.owner.refusal(takeBackSetAside, elsewhere)).code).toBe("not_found");
    const here = { params: { ...of(own), setAsideId: id } };
    expect((await own.visitors.approver.refusal(listSetAsides, { params: of(own) })).code).toBe("not_found");
    expect((await own.visitors.approver.refusal(takeBackSetAside, here)).code).toBe("not_found");
    expect((await own.visitors.rep.refusal(takeBackSetAside, here)).code).toBe("not_allowed");
    expect((await own.visitors.owner.get(listSetAsides, { params: of(other) })).items).toEqual([]);
  });
});

describe("the list of what is set aside", () => {
  it("comes in pages, newest first, without what was taken back", async () => {
    const own = await buildJob(world);
    const document = buildSign([
      buildLayer(
        "B",
        [100, 200, 300].map((y, index) => plate(`off${index}`, 100, 50, [0, y])),
      ),
    ]);
    const mockupVersion = await save(own, document);
    const off = (await found(document)).filter(({ rule }) => rule === 1);
    expect(off).toHaveLength(3);
    const ids: string[] = [];
    for (const finding of off) {
      const body = { mockupVersion, finding: boundFinding(finding), reason: "As meant" };
      ids.unshift((await own.visitors.maker.get(setAsideFinding, { params: of(own), body })).id);
    }
    const page = async (cursor?: string) =>
      own.visitors.rep.get(listSetAsides, { params: of(own), query: { limit: 2, ...(cursor ? { cursor } : {}) } });
    const first = await page();
    const second = await page(first.next ?? "");
    expect([...first.items, ...second.items].map(({ id }) => id)).toEqual(ids);
    expect([first.items.length, second.next]).toEqual([2, null]);
    await own.visitors.maker.get(takeBackSetAside, { params: { ...of(own), setAsideId: ids[1] ?? "" } });
    expect((await page()).items.map(({ id }) => id)).toEqual([ids[0], ids[2]]);
  });
});

describe("issuing", () => {
  it("is stopped by what is not set aside, passes what is, and freezes it with its reason", async () => {
    const { own, given } = await hangingJob();
    const { mockupVersion } = given.body;
    await setOthersAside(own, hanging(0), mockupVersion);
    const issue = { params: of(own), body: { mockupVersion } };
    const problem = await own.visitors.maker.refusal(issueRevision, issue);
    expect(problem).toMatchObject({ code: "dry_fit_stops", extra: { findings: [{ rule: 1, pieceIds: ["off"] }] } });
    expect(problem.detail).toBe(`One stop keeps this from being issued: ${given.body.finding.text}`);
    const { by, at } = await own.visitors.maker.get(setAsideFinding, given);
    const revision = await own.visitors.maker.get(issueRevision, issue);
    const { snapshot } = await Revision.findByPk(revision.id, { rejectOnEmpty: true });
    const frozen = JSON.parse(snapshot ?? "") as Snapshot;
    const ours = frozen.setAside?.filter(({ finding }) => isOff(finding));
    const { setAsideBy } = await SetAside.findOne({
      where: { jobId: own.job.id, setAsideName: by },
      rejectOnEmpty: true,
    });
    expect(ours).toEqual([{ finding: given.body.finding, reason: given.body.reason, by: setAsideBy, name: by, at }]);
    expect(frozen.findings.some(isOff)).toBe(true);
  });

  it("is stopped again when the value has changed, and not when it is what it was", async () => {
    const { own, given } = await hangingJob();
    await setOthersAside(own, hanging(0), given.body.mockupVersion);
    await own.visitors.maker.get(setAsideFinding, given);
    const moved = await save(own, hanging(2));
    const problem = await own.visitors.maker.refusal(issueRevision, {
      params: of(own),
      body: { mockupVersion: moved },
    });
    expect(problem).toMatchObject({ code: "dry_fit_stops", extra: { findings: [{ rule: 1, value: 48 }] } });
    const back = await save(own, hanging(0));
    const revision = await own.visitors.maker.get(issueRevision, { params: of(own), body: { mockupVersion: back } });
    expect(revision.state).toBe("preparing");
  });

  it("is stopped again when the set-aside was taken back, which is logged once", async () => {
    const { own, given } = await hangingJob();
    const { id } = await own.visitors.owner.get(setAsideFinding, given);
    const params = { ...of(own), setAsideId: id };
    await own.visitors.maker.get(takeBackSetAside, { params });
    await own.visitors.owner.get(takeBackSetAside, { params });
    expect(await lastLogLine(own.job.id)).toMatch(
      /^Person \d+: Took back the setting aside of the stop “Unsupported”$/,
    );
    expect((await logKinds(own.job.id)).filter((kind) => kind === "set-aside taken back")).toHaveLength(1);
    const body = { mockupVersion: given.body.mockupVersion };
    const problem = await own.visitors.maker.refusal(issueRevision, { params: of(own), body });
    expect(problem.code).toBe("dry_fit_stops");
    expect((await own.visitors.maker.get(setAsideFinding, given)).id).not.toBe(id);
  });
});

describe("what a client or a guest can reach", () => {
  it("says nothing of what was set aside: no page, no picture, no PDF, no portfolio link", async () => {
    const { own, given } = await hangingJob();
    const { owner, maker, rep, approver } = own.visitors;
    const { params, body } = given;
    await setOthersAside(own, hanging(0), body.mockupVersion);
    const { by } = await maker.get(setAsideFinding, given);
    const { id } = await owner.get(issueRevision, { params, body: { mockupVersion: body.mockupVersion } });
    await app.runJobs();
    const at = { ...own.params, revisionId: id };
    await approver.get(approveRevision, { params: at, body: await approvalOf(own, id) });
    await approver.get(setConsent, { params, body: { given: true } });
    await app.runJobs();
    const { url } = await rep.get(makeShareLink, {
      params: own.params,
      body: { label: "Past work", jobIds: [own.job.id] },
    });
    const token = url.split("/").at(-1) ?? "";
    const answers = [
      await approver.ask(getJob, { params }),
      await approver.ask(listRevisions, { params }),
      await approver.ask(getRevision, { params: at }),
      await approver.ask(getSheet, { params: at }),
      await approver.ask(getPicture, { params: at }),
      await approver.ask(listNotes, { params: at }),
      await approver.ask(compareRevisions, { params, query: { before: id, after: id } }),
      await app.visitor().ask(openShareLink, { params: { token } }),
    ];
    expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 200));
    const { pdfFileId } = await Revision.findByPk(id, { rejectOnEmpty: true });
    const { storageKey } = await StoredFile.findByPk(pdfFileId ?? "", { rejectOnEmpty: true });
    const pdf = await popplerText(await app.services.storage.read(storageKey), "pdftotext");
    expect(pdf).toContain(own.job.number);
    // Lines are broken on paper; what is sought has no spaces left.
    const texts = [...answers.map(({ text }) => text), pdf].map((text) => text.replace(/\s+/g, ""));
    for (const text of texts) {
      for (const word of [body.reason, given.body.finding.text, "setAside", "set aside"])
        expect(text).not.toContain(word.replace(/\s+/g, ""));
    }
    // The search would find it where it does stand.
    const log = await rep.ask(listEvents, { params });
    expect(log.text).toContain(`${body.reason}`);
    expect(by).not.toBe("");
  });
});
