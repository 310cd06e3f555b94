import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Note } from "#server/models/note.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Revision } from "#server/models/revision.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import { getJob } from "#shared/contracts/jobs.ts";
import {
  type Anchor,
  addNote,
  listNotes,
  type Note as NoteView,
  replyToNote,
  setNoteState,
} from "#shared/contracts/notes.ts";
import { getSheet, withdrawRevision } from "#shared/contracts/revisions.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { approve } from "../support/decide.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { lastLogLine } from "../support/job-log.ts";
import { caughtMails, sendGathered } from "../support/mail.ts";
import { popplerText } from "../support/poppler.ts";
import { signInByMail } from "../support/sign-in.ts";
import type { Visitor } from "../support/visitor.ts";

let app: TestApp;
let world: World;
let template: string;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  template = await issueNext(world, 90);
});
afterAll(() => app.stop());

type Said = { text?: string; kind?: NoteView["kind"]; anchor?: Anchor; shopOnly?: boolean };
const at = ({ params }: World, revisionId: string) => ({ ...params, revisionId });
const spot = (x: number, y: number): Anchor => ({ on: "spot", x, y, layerKey: null, pieceId: null });
const say = (own: World, visitor: Visitor, revisionId: string, said: Said = {}) =>
  visitor.get(addNote, {
    params: at(own, revisionId),
    body: { text: "Please widen", kind: "must change", anchor: { on: "whole" }, ...said },
  });
const reply = (own: World, visitor: Visitor, noteId: string, text = "Done") =>
  visitor.get(replyToNote, { params: { ...own.params, noteId }, body: { text } });
const move = (own: World, visitor: Visitor, noteId: string, state: "open" | "settled") =>
  visitor.ask(setNoteState, { params: { ...own.params, noteId }, body: { state } });
const notesOf = async (own: World, visitor: Visitor, revisionId: string) =>
  (await visitor.get(listNotes, { params: at(own, revisionId) })).items;

/** A job with revision A out: a board of 600 by 400 mm with one plate. */
const issued = () => buildIssued(app, world, template);
const issueNext = async (own: World, width: number): Promise<string> =>
  (await buildRevision(app, own, { document: buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]) })).id;

describe("a note", () => {
  it("has its number in the job, its zone on the paper, its author and side, and reaches the other side by mail", async () => {
    const { own, revisionId } = await issued();
    const first = await say(own, own.visitors.approver, revisionId, {
      text: "  Is the plate\r\nstraight? ",
      kind: "question",
      anchor: { on: "spot", x: 200, y: 200, layerKey: "B", pieceId: "p1" },
    });
    expect(first).toMatchObject({
      number: 1,
      text: "Is the plate\nstraight?",
      kind: "question",
      state: "open",
      author: own.approver.contact.name,
      side: "client",
      shopOnly: false,
      fromLetter: "A",
      replies: [],
      can: { reply: true, settle: true, reopen: false },
    });
    const second = await say(own, own.visitors.maker, revisionId, { anchor: spot(600, 400) });
    expect(second).toMatchObject({ number: 2, side: "shop", can: { reply: true, settle: true } });
    expect((await say(own, own.visitors.otherContact, revisionId)).zone).toBeNull();
    expect(await lastLogLine(own.job.id)).toMatch(/: Left note 3 on revision A$/);

    // The sheet says which millimetres of the board lie in which zone; the note says the same.
    await sendGathered(app);
    const { zones } = await own.visitors.approver.get(getSheet, { params: at(own, revisionId) });
    const label = (fields: typeof zones.rows, mm: number) =>
      fields.find(({ fromMm, toMm }) => mm >= fromMm && mm < toMm)?.label;
    expect(first.zone).toBe(`${label(zones.rows, 200)}${label(zones.columns, 200)}`);
    expect(second.zone).toBe(`${label(zones.rows, 400)}${label(zones.columns, 600)}`);
    expect(first.zone).toMatch(/^[A-D][1-6]$/);
    expect(first.zone).not.toBe(second.zone);

    const mails = await OutgoingMail.findAll({ where: { jobId: own.job.id, kind: "notes gathered" } });
    const sentTo = (noteId: string) =>
      mails
        .filter(({ data, state }) => data.news?.some((news) => news.noteId === noteId) && state === "sent")
        .map(({ address }) => address)
        .sort();
    expect(sentTo(first.id)).toHaveLength(3);
    expect(sentTo(first.id)).toContain(own.owner.email);
    expect(sentTo(second.id)).toEqual([own.approver.email]);
    const job = await own.visitors.owner.get(getJob, { params: { ...own.params, jobId: own.job.id } });
    expect(job).toMatchObject({ openNotes: 3, whoseMove: "ours", nextStep: "2 notes open, answer them or issue B" });
  });

  it("names every bad field", async () => {
    const { own, revisionId } = await issued();
    const { code, errors } = await own.visitors.approver.refusal(addNote, {
      params: at(own, revisionId),
      body: {
        text: "x".repeat(10_000),
        kind: "angry",
        anchor: { on: "spot", x: "left", y: 20_000, layerKey: null, pieceId: null },
        state: "settled",
      } as never,
    });
    expect(code).toBe("validation_failed");
    expect(errors?.map(({ pointer }) => pointer).sort()).toEqual([
      "/anchor/x",
      "/anchor/y",
      "/kind",
      "/state",
      "/text",
    ]);
    expect(errors).toContainEqual({ pointer: "/text", detail: "At most 4000 characters." });
    for (const text of ["", " \n\t ", "bell \u0007", "zero \u0000", "half \udc00"]) {
      const problem = await own.visitors.approver.refusal(addNote, {
        params: at(own, revisionId),
        body: { text, kind: "question", anchor: { on: "whole" } },
      });
      expect(problem.errors?.map(({ pointer }) => pointer)).toEqual(["/text"]);
    }
    expect(await Note.count({ where: { revisionId } })).toBe(0);
  });

  it("keeps what was written, markup and all, as text", async () => {
    const { own, revisionId } = await issued();
    const text = `<script>alert("1")</script> & 'quotes' -- ; drop table notes; {{x}} \u202e 漢字\n\tnew line ${"é".repeat(3900)}`;
    expect((await say(own, own.visitors.approver, revisionId, { text })).text).toBe(text);
    await sendGathered(app);
    const mail = (await caughtMails(app)).find(({ subject }) => subject.includes(`(${own.job.number})`));
    expect(mail?.text).toContain('<script>alert("1")</script>');
    expect(mail?.html).not.toContain("<script>");
  });

  it.each([
    { anchor: spot(-700, 10), pointer: "/anchor" },
    { anchor: spot(10, 1001), pointer: "/anchor" },
    { anchor: { on: "spot", x: 1, y: 1, layerKey: "C", pieceId: null }, pointer: "/anchor" },
    { anchor: { on: "spot", x: 1, y: 1, layerKey: "B", pieceId: "p2" }, pointer: "/anchor" },
    { anchor: { on: "spot", x: 1, y: 1, layerKey: "A", pieceId: "p1" }, pointer: "/anchor" },
    { anchor: { on: "spot", x: 1, y: 1, layerKey: null, pieceId: "p\u0000" }, pointer: "/anchor" },
  ] satisfies { anchor: Anchor; pointer: string }[])("points nowhere at $anchor", async ({ anchor, pointer }) => {
    const { own, revisionId } = await sharedRevision();
    const problem = await own.visitors.approver.refusal(addNote, {
      params: at(own, revisionId),
      body: { text: "Here", kind: "question", anchor },
    });
    expect(problem.errors?.map((error) => error.pointer)).toEqual([pointer]);
  });

  it("may be pinned to the wood, to a layer, and a little beside the board", async () => {
    const { own, revisionId } = await sharedRevision();
    for (const anchor of [
      spot(-20, 410),
      { on: "spot", x: 5, y: 5, layerKey: "A", pieceId: null },
      { on: "spot", x: 200, y: 200, layerKey: "B", pieceId: null },
    ] satisfies Anchor[])
      expect((await say(own, own.visitors.approver, revisionId, { anchor })).anchor).toEqual(anchor);
  });

  it("is not for those without a session or of another client", async () => {
    const { own, revisionId } = await sharedRevision();
    const body = { text: "Mine", kind: "question", anchor: { on: "whole" } } as const;
    const given = { params: at(own, revisionId), body };
    expect((await app.visitor().refusal(addNote, given)).code).toBe("not_signed_in");
    const stranger = await signInByMail(
      app,
      await buildContact({ client: await buildClient({ shop: own.owner.shop }) }),
    );
    expect((await stranger.refusal(addNote, given)).code).toBe("not_found");
    expect((await stranger.refusal(listNotes, { params: given.params })).code).toBe("not_found");
  });

  it("carries the name that its author has at that client", async () => {
    const person = world.approver.person;
    await buildContact({ client: await buildClient({ shop: world.owner.shop }), person, name: "Known elsewhere as" });
    const { own, revisionId } = await issued();
    const note = await say(own, own.visitors.approver, revisionId);
    expect(note.author).toBe(world.approver.contact.name);
    expect((await reply(own, own.visitors.approver, note.id)).replies[0]?.author).toBe(world.approver.contact.name);
    const { reader } = await own.visitors.approver.get(getSheet, { params: at(own, revisionId) });
    expect(reader.name).toBe(world.approver.contact.name);
  });
});

let shared: Promise<{ own: World; revisionId: string }> | undefined;
/** One revision for tests that only add to it or are refused. */
const sharedRevision = () => {
  shared ??= issued();
  return shared;
};

describe("a note for the shop alone", () => {
  it("never reaches a client: not by list, sheet, mail, count, answer or PDF", async () => {
    const { own, revisionId } = await issued();
    const { approver, maker, rep, owner } = own.visitors;
    const secret = await say(own, rep, revisionId, { text: "They pay late, ask for half", shopOnly: true });
    expect(secret).toMatchObject({ number: 1, shopOnly: true });
    const open = await say(own, maker, revisionId, { text: "Is this wall plumb", kind: "question" });
    await sendGathered(app);
    expect((await notesOf(own, owner, revisionId)).map(({ number }) => number)).toEqual([1, 2]);
    expect((await notesOf(own, approver, revisionId)).map(({ number }) => number)).toEqual([2]);
    expect(JSON.stringify(await approver.get(getSheet, { params: at(own, revisionId) }))).not.toContain("pay late");
    const jobParams = { ...own.params, jobId: own.job.id };
    expect((await approver.get(getJob, { params: jobParams })).openNotes).toBe(1);
    expect((await owner.get(getJob, { params: jobParams })).openNotes).toBe(2);
    const hidden = { params: { ...own.params, noteId: secret.id } };
    expect((await approver.refusal(replyToNote, { ...hidden, body: { text: "?" } })).code).toBe("not_found");
    expect((await approver.refusal(setNoteState, { ...hidden, body: { state: "settled" } })).code).toBe("not_found");
    const mails = await OutgoingMail.findAll({ where: { jobId: own.job.id, kind: "notes gathered" } });
    expect(mails.map(({ data }) => data.news?.map(({ noteId }) => noteId))).toEqual([[open.id]]);
    expect((await caughtMails(app)).some(({ source }) => source.includes("pay late"))).toBe(false);

    // B carries the open notes on its drawing.
    const bId = await issueNext(own, 95);
    const row = await Revision.findByPk(bId, { rejectOnEmpty: true });
    const { notes } = JSON.parse(row.snapshot ?? "") as Snapshot;
    expect(notes.map(({ number, text, fromRevision }) => [number, text, fromRevision])).toEqual([
      [2, "Is this wall plumb", "A"],
    ]);
    const file = await StoredFile.findByPk(row.pdfFileId ?? "", { rejectOnEmpty: true });
    const printed = await popplerText(await app.services.storage.read(file.storageKey), "pdftotext");
    expect(printed).toContain("Is this wall plumb");
    expect(printed).not.toContain("pay late");
  });

  it("can't be left by a client", async () => {
    const { own, revisionId } = await sharedRevision();
    const before = await Note.count({ where: { revisionId } });
    const problem = await own.visitors.approver.refusal(addNote, {
      params: at(own, revisionId),
      body: { text: "Mine", kind: "question", anchor: { on: "whole" }, shopOnly: true },
    });
    expect(problem).toMatchObject({ code: "not_allowed", detail: "Notes for the shop alone are left by the shop." });
    expect(await Note.count({ where: { revisionId } })).toBe(before);
  });
});

describe("answers", () => {
  it("make an open note answered when the shop gives them, and open it again when the client does", async () => {
    const { own, revisionId } = await issued();
    const { approver, maker, otherContact } = own.visitors;
    const note = await say(own, approver, revisionId);
    expect((await reply(own, approver, note.id, "I mean the left one")).state).toBe("open");
    const answered = await reply(own, maker, note.id, "Widened by 5 mm");
    expect(answered).toMatchObject({ state: "answered", can: { reply: true, settle: false, reopen: true } });
    expect(answered.replies.map(({ text, side }) => [text, side])).toEqual([
      ["I mean the left one", "client"],
      ["Widened by 5 mm", "shop"],
    ]);
    expect(await lastLogLine(own.job.id)).toMatch(/: Answered note 1$/);
    expect((await reply(own, maker, note.id, "See the section")).state).toBe("answered");
    expect((await reply(own, otherContact, note.id, "Still too thin")).state).toBe("open");
    expect(await lastLogLine(own.job.id)).toMatch(/: Opened note 1 again$/);
    const empty = await maker.refusal(replyToNote, {
      params: { ...own.params, noteId: note.id },
      body: { text: " ", state: "settled" } as never,
    });
    expect(empty.errors?.map(({ pointer }) => pointer).sort()).toEqual(["/state", "/text"]);
  });

  it("leave a settled note settled", async () => {
    const { own, revisionId } = await issued();
    const note = await say(own, own.visitors.approver, revisionId);
    await move(own, own.visitors.approver, note.id, "settled");
    expect((await reply(own, own.visitors.maker, note.id)).state).toBe("settled");
    expect((await reply(own, own.visitors.approver, note.id)).state).toBe("settled");
  });
});

describe("settling", () => {
  it("is its author's, and opening again either side's", async () => {
    const { own, revisionId } = await issued();
    const { approver, otherContact, maker, owner } = own.visitors;
    const note = await say(own, approver, revisionId);
    for (const visitor of [otherContact, maker, owner])
      expect((await move(own, visitor, note.id, "settled")).status).toBe(403);
    expect((await move(own, approver, note.id, "open")).status).toBe(200);
    expect((await move(own, approver, note.id, "settled")).status).toBe(200);
    expect(await lastLogLine(own.job.id)).toMatch(/: Settled note 1$/);
    expect((await move(own, maker, note.id, "open")).status).toBe(200);
    expect(await lastLogLine(own.job.id)).toMatch(/: Opened note 1 again$/);
    const ofShop = await say(own, maker, revisionId);
    expect((await move(own, owner, ofShop.id, "settled")).status).toBe(403);
    expect((await move(own, maker, ofShop.id, "settled")).status).toBe(200);
    const odd = await maker.refusal(setNoteState, {
      params: { ...own.params, noteId: note.id },
      body: { state: "answered" } as never,
    });
    expect(odd.errors?.map(({ pointer }) => pointer)).toEqual(["/state"]);
  });
});

describe("notes of earlier revisions", () => {
  it("are carried over until settled, answered on the one that is out, and closed on the old one", async () => {
    const { own, revisionId: aId } = await issued();
    const { approver, maker } = own.visitors;
    const open = await say(own, approver, aId, { text: "Stays open" });
    const settled = await say(own, approver, aId, { text: "Was settled" });
    await move(own, approver, settled.id, "settled");
    const bId = await issueNext(own, 95);
    const onB = await say(own, approver, bId, { text: "New on B" });
    expect(onB.number).toBe(3);
    expect((await notesOf(own, approver, bId)).map(({ number, fromLetter }) => [number, fromLetter])).toEqual([
      [1, "A"],
      [3, "B"],
    ]);
    expect((await notesOf(own, approver, aId)).map(({ number }) => number)).toEqual([1, 2]);
    expect((await reply(own, maker, open.id)).state).toBe("answered");
    expect((await move(own, approver, open.id, "settled")).status).toBe(200);
    const onBNow = await notesOf(own, approver, bId);
    expect(onBNow.map(({ number, state, can }) => [number, state, can.reopen])).toEqual([
      [1, "settled", true],
      [3, "open", false],
    ]);
    const cId = await issueNext(own, 100);
    expect((await notesOf(own, approver, cId)).map(({ number }) => number)).toEqual([3]);
    const problem = await approver.refusal(addNote, {
      params: at(own, aId),
      body: { text: "Late", kind: "question", anchor: { on: "whole" } },
    });
    expect(problem).toMatchObject({ code: "wrong_state", detail: "Revision A is superseded and takes no more notes." });
  });

  it("are reached from the next revision when their own was withdrawn", async () => {
    const { own, revisionId: aId } = await issued();
    const { approver, owner, maker } = own.visitors;
    const note = await say(own, approver, aId);
    await owner.get(withdrawRevision, { params: at(own, aId), body: { reason: "Wrong file" } });
    expect((await approver.refusal(listNotes, { params: at(own, aId) })).code).toBe("not_found");
    const given = { params: { ...own.params, noteId: note.id }, body: { text: "Too late" } };
    expect((await maker.refusal(replyToNote, given)).code).toBe("wrong_state");
    const bId = await issueNext(own, 95);
    expect((await notesOf(own, approver, bId)).map(({ number }) => number)).toEqual([1]);
    expect((await reply(own, approver, note.id, "As I said")).state).toBe("open");
    expect((await move(own, approver, note.id, "settled")).status).toBe(200);
  });

  it("are closed once the revision is approved", async () => {
    const { own, revisionId } = await issued();
    const { approver, maker } = own.visitors;
    const note = await say(own, maker, revisionId, { kind: "question" });
    await approve(own, revisionId);
    const given = { params: { ...own.params, noteId: note.id } };
    expect(await approver.refusal(replyToNote, { ...given, body: { text: "Late" } })).toMatchObject({
      code: "wrong_state",
      detail: "Revision A is approved: its notes are closed.",
    });
    expect((await approver.refusal(setNoteState, { ...given, body: { state: "settled" } })).code).toBe("wrong_state");
    const [shown] = await notesOf(own, approver, revisionId);
    expect(shown?.can).toEqual({ reply: false, settle: false, reopen: false });
  });
});

describe("the list of notes", () => {
  it("is read page by page in the order of their numbers, replies and all", async () => {
    const { own, revisionId } = await issued();
    for (let count = 0; count < 5; count += 1)
      await say(own, own.visitors.approver, revisionId, { text: `No. ${count}` });
    const [first] = await notesOf(own, own.visitors.approver, revisionId);
    for (const text of ["one", "two", "three"]) await reply(own, own.visitors.maker, first?.id ?? "", text);
    const seen: number[] = [];
    let cursor: string | undefined;
    do {
      const page = await own.visitors.approver.get(listNotes, {
        params: at(own, revisionId),
        query: { limit: 2, ...(cursor ? { cursor } : {}) },
      });
      expect(page.items.length).toBeLessThanOrEqual(2);
      if (!cursor) expect(page.items[0]?.replies.map(({ text }) => text)).toEqual(["one", "two", "three"]);
      seen.push(...page.items.map(({ number }) => number));
      cursor = page.next ?? undefined;
    } while (cursor && seen.length < 9);
    expect(seen).toEqual([1, 2, 3, 4, 5]);
  });
});
