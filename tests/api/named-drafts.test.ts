import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { newId } from "#server/db/new-id.ts";
import { NamedDraft } from "#server/models/named-draft.ts";
import { openJob } from "#shared/contracts/jobs.ts";
import { getMockup } from "#shared/contracts/mockups.ts";
import {
  getDraft,
  keepDraft,
  listDrafts,
  mostDraftBytes,
  mostDrafts,
  removeDraft,
  renameDraft,
} from "#shared/contracts/named-drafts.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import version1 from "../fixtures/documents/version-1.json" with { type: "json" };
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildClient } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildArtwork, buildWorld, signFromArtwork, type World } from "../support/factories/work.ts";
import { lastLogLine } from "../support/job-log.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 4 });
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const sign = (x: number): MockupDocument => buildSign([buildLayer("B", [plate("p", 80, 50, [x, 200])])]);
const keep = (own: World, name: string, document = sign(300)) =>
  own.visitors.maker.get(keepDraft, { params: of(own), body: { name, document } });

describe("drafts with a name", () => {
  it("are kept as they are on the desk, listed to all staff, newest first, and looked at with their document", async () => {
    const own = await buildJob(world);
    const first = await keep(own, "Narrow rings", sign(111));
    const second = await keep(own, "  Wide rings ", sign(222));
    expect(second).toMatchObject({ name: "Wide rings", can: { change: true } });
    const { items, next } = await own.visitors.rep.get(listDrafts, { params: of(own) });
    expect(items.map(({ name, can }) => [name, can.change])).toEqual([
      ["Wide rings", false],
      ["Narrow rings", false],
    ]);
    expect(next).toBeNull();
    const read = await own.visitors.rep.get(getDraft, { params: { ...of(own), draftId: first.id } });
    expect(read.document).toEqual(sign(111));
    expect(await lastLogLine(own.job.id)).toBe(`${second.keptBy}: Kept the mockup as the draft “Wide rings”`);
    // The mockup itself was never saved.
    expect((await own.visitors.maker.get(getMockup, { params: of(own) })).version).toBe(0);
  });

  it("come in pages", async () => {
    const own = await buildJob(world);
    for (const name of ["1", "2", "3"]) await keep(own, name);
    const page = await own.visitors.maker.get(listDrafts, { params: of(own), query: { limit: 2 } });
    expect(page.items.map(({ name }) => name)).toEqual(["3", "2"]);
    const rest = await own.visitors.maker.get(listDrafts, {
      params: of(own),
      query: { limit: 2, cursor: page.next ?? "" },
    });
    expect(rest).toMatchObject({ items: [{ name: "1" }], next: null });
  });

  it("are renamed and removed; a removed one is gone, its name free, its document no longer stored", async () => {
    const own = await buildJob(world);
    const draft = await keep(own, "Rings");
    const params = { ...of(own), draftId: draft.id };
    expect(await own.visitors.owner.get(renameDraft, { params, body: { name: "Planets" } })).toMatchObject({
      id: draft.id,
      name: "Planets",
      keptBy: draft.keptBy,
    });
    expect(await lastLogLine(own.job.id)).toMatch(/: Renamed the draft “Rings” to “Planets”$/);
    await own.visitors.maker.get(removeDraft, { params });
    expect(await own.visitors.maker.refusal(getDraft, { params })).toMatchObject({ code: "not_found" });
    expect(await own.visitors.maker.refusal(removeDraft, { params })).toMatchObject({ code: "not_found" });
    expect((await own.visitors.maker.get(listDrafts, { params: of(own) })).items).toEqual([]);
    expect(await NamedDraft.findByPk(draft.id)).toMatchObject({ name: "Planets", document: null });
    await keep(own, "Planets");
  });

  it("bear each name once in a job, whatever its capitals, and never the same in another's way", async () => {
    const own = await buildJob(world);
    const other = await buildJob(world);
    await keep(own, "Éclair");
    await keep(other, "Éclair");
    const second = await keep(own, "Second");
    const body = { name: "éCLAIR", document: sign(1) };
    const wanted = { code: "already_exists", detail: "A draft of this job has that name. Choose another one." };
    expect(await own.visitors.maker.refusal(keepDraft, { params: of(own), body })).toMatchObject(wanted);
    const renamed = { params: { ...of(own), draftId: second.id }, body: { name: "éclair" } };
    expect(await own.visitors.maker.refusal(renameDraft, renamed)).toMatchObject(wanted);
    expect(await own.visitors.maker.get(renameDraft, { ...renamed, body: { name: "SECOND" } })).toMatchObject({
      name: "SECOND",
    });
  });

  it("need a name and a mockup that is one, and say what is wrong with both", async () => {
    const broken = { ...sign(300), quantity: 0 };
    const answer = await world.visitors.maker.refusal(keepDraft, {
      params: of(world),
      body: { name: " ", document: broken },
    });
    expect(answer).toMatchObject({ status: 422, code: "validation_failed" });
    expect(answer.errors?.map(({ pointer }) => pointer)).toEqual(["/name", "/document/quantity"]);
    const nonsense = { ...sign(300), layers: Array.from({ length: 5000 }, () => 7) };
    const text = await world.visitors.maker.ask(keepDraft, {
      params: of(world),
      body: { name: "Nonsense", document: nonsense as unknown as MockupDocument },
    });
    expect(text.status).toBe(422);
    expect(text.text.length).toBeLessThan(20_000);
  });

  it("take no artwork of another client's", async () => {
    const own = await buildJob(world);
    const artwork = await buildArtwork(app, own);
    const document = await signFromArtwork(own, artwork.id);
    await keep(own, "With artwork", document);
    const params = { ...world.params, jobId: await otherClientsJob() };
    expect(await own.visitors.maker.refusal(keepDraft, { params, body: { name: "Taken", document } })).toMatchObject({
      code: "validation_failed",
    });
  });

  it("are not found by another job's or another shop's address", async () => {
    const own = await buildJob(world);
    const draft = await keep(own, "Ours");
    const elsewhere = await buildWorld(app);
    for (const params of [of(await buildJob(world)), of(elsewhere)]) {
      const given = { params: { ...params, draftId: draft.id } };
      for (const visitor of [own.visitors.owner, elsewhere.visitors.owner]) {
        expect(await visitor.refusal(getDraft, given)).toMatchObject({ code: "not_found" });
        expect(await visitor.refusal(removeDraft, given)).toMatchObject({ code: "not_found" });
        expect(await visitor.refusal(renameDraft, { ...given, body: { name: "Mine" } })).toMatchObject({
          code: "not_found",
        });
      }
    }
    expect((await NamedDraft.findByPk(draft.id))?.name).toBe("Ours");
  });

  it("are read in today's version when they were kept by an older Standproud", async () => {
    const own = await buildJob(world);
    const draft = await keep(own, "Old");
    await NamedDraft.update({ document: JSON.stringify(version1) }, { where: { id: draft.id } });
    const read = await own.visitors.rep.get(getDraft, { params: { ...of(own), draftId: draft.id } });
    expect(read.document.version).toBe(4);
  });

  it("are bounded in number and in what they hold, and say so", async () => {
    const own = await buildJob(world);
    const draft = await keep(own, "First");
    const row = await NamedDraft.findByPk(draft.id, { rejectOnEmpty: true });
    await NamedDraft.bulkCreate(
      Array.from({ length: mostDrafts - 1 }, (_, index) => ({ ...row.get(), id: newId(), name: `Draft ${index}` })),
    );
    const body = { name: "One more", document: sign(1) };
    expect(await own.visitors.maker.refusal(keepDraft, { params: of(own), body })).toMatchObject({
      code: "wrong_state",
      detail: "A job keeps 100 drafts, and this one has them. Remove one that nobody returns to.",
    });
    const large = await buildJob(world);
    const huge = await keep(large, "Huge");
    await NamedDraft.update({ document: " ".repeat(mostDraftBytes) }, { where: { id: huge.id } });
    expect(await large.visitors.maker.refusal(keepDraft, { params: of(large), body })).toMatchObject({
      code: "wrong_state",
      detail: "The drafts of this job fill the room they have. Remove one that nobody returns to.",
    });
  });
});

async function otherClientsJob() {
  const client = await buildClient({ shop: world.owner.shop });
  const job = await world.visitors.owner.get(openJob, {
    params: world.params,
    body: { clientId: client.id, title: "Another client’s" },
  });
  return job.id;
}
