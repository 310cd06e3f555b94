import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Note } from "#server/models/note.ts";
import { Reply } from "#server/models/reply.ts";
import { addNote, editNote, editReply, listNotes, replyToNote } from "#shared/contracts/notes.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { approve } from "../support/decide.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { lastLogLine } from "../support/job-log.ts";
import { runSql } from "../support/run-sql.ts";

let app: TestApp;
let world: World;
let template: string;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  const document = buildSign([buildLayer("B", [plate("p1", 90, 40, [200, 200])])]);
  template = (await buildRevision(app, world, { document })).id;
});
afterAll(() => app.stop());

async function withNote() {
  const { own, revisionId } = await buildIssued(app, world, template);
  const note = await own.visitors.approver.get(addNote, {
    params: { ...own.params, revisionId },
    body: { text: "Widen the disk", kind: "question", anchor: { on: "whole" } },
  });
  const params = { ...own.params, noteId: note.id };
  return { own, revisionId, note, params };
}

const putRight = { text: "Widen the disc", kind: "must change" } as const;

describe("an author puts right what they wrote", () => {
  it("within five minutes, and it says so to everyone", async () => {
    const { own, revisionId, note, params } = await withNote();
    expect(Date.parse(note.editableUntil ?? "") - Date.parse(note.at)).toBe(300_000);
    expect(note.editedAt).toBeNull();
    const edited = await own.visitors.approver.get(editNote, { params, body: putRight });
    expect(edited).toMatchObject({ ...putRight, number: note.number, at: note.at });
    expect(Date.parse(edited.editedAt ?? "")).toBeGreaterThanOrEqual(Date.parse(note.at));
    const [seen] = (await own.visitors.maker.get(listNotes, { params: { ...own.params, revisionId } })).items;
    expect(seen).toMatchObject({ text: "Widen the disc", editedAt: edited.editedAt, editableUntil: null });
    expect(await lastLogLine(own.job.id)).toMatch(/Put note 1 right/);
  });

  it("in a reply too", async () => {
    const { own, params } = await withNote();
    const [reply] = (await own.visitors.maker.get(replyToNote, { params, body: { text: "By 10 cm" } })).replies;
    const body = { text: "By 10 mm" };
    const edited = await own.visitors.maker.get(editReply, { params: { ...params, replyId: reply?.id ?? "" }, body });
    expect(edited.replies).toMatchObject([{ text: "By 10 mm", author: reply?.author }]);
    expect(edited.replies[0]?.editedAt).not.toBeNull();
  });

  it("and nothing is marked when nothing changed", async () => {
    const { own, note, params } = await withNote();
    const body = { text: note.text, kind: note.kind };
    expect((await own.visitors.approver.get(editNote, { params, body })).editedAt).toBeNull();
  });
});

describe("it stays as it is", () => {
  it("after five minutes, by a clock that went forward too", async () => {
    const { own, revisionId, note, params } = await withNote();
    await runSql(
      app.database.ownerUrl,
      "update notes set created_at = created_at - interval '5 minutes' where id = $1",
      [note.id],
    );
    expect(await own.visitors.approver.refusal(editNote, { params, body: putRight })).toMatchObject({
      code: "wrong_state",
      detail: expect.stringMatching(/five minutes/),
    });
    const [seen] = (await own.visitors.approver.get(listNotes, { params: { ...own.params, revisionId } })).items;
    expect(seen?.editableUntil).toBeNull();
    expect(await Note.findByPk(note.id)).toMatchObject({ text: "Widen the disk", editedAt: null });
  });

  it("for everyone but its author, be they of the same side", async () => {
    const { own, params } = await withNote();
    for (const who of ["owner", "maker", "otherContact"] as const)
      expect(await own.visitors[who].refusal(editNote, { params, body: putRight })).toMatchObject({
        code: "not_allowed",
      });
  });

  it("once the revision is approved", async () => {
    const { own, revisionId, note, params } = await withNote();
    await approve(own, revisionId, { settledNoteIds: [note.id] });
    expect(await own.visitors.approver.refusal(editNote, { params, body: putRight })).toMatchObject({
      code: "wrong_state",
    });
  });

  it("when nothing is written, or a reply of another note is named", async () => {
    const { own, params } = await withNote();
    const other = await withNote();
    const [reply] = (await own.visitors.approver.get(replyToNote, { params, body: { text: "And?" } })).replies;
    expect(await own.visitors.approver.refusal(editNote, { params, body: { ...putRight, text: " " } })).toMatchObject({
      code: "validation_failed",
    });
    const foreign = { params: { ...other.params, replyId: reply?.id ?? "" }, body: { text: "No" } };
    expect(await own.visitors.approver.refusal(editReply, foreign)).toMatchObject({ code: "not_found" });
    expect(await Reply.findByPk(reply?.id)).toMatchObject({ text: "And?" });
  });
});
