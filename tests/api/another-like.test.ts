import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Artwork } from "#server/models/artwork.ts";
import { MockupStart } from "#server/models/mockup-start.ts";
import { openAnotherLike } from "#shared/contracts/another-like.ts";
import { listArtworks } from "#shared/contracts/artworks.ts";
import { getJob, listEvents, listJobs } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { firstChoices } from "#shared/tracing/trace-choices.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, plate } from "../support/build-sign.ts";
import { buildClient } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildArtwork, buildWorld, signFromArtwork, type World } from "../support/factories/work.ts";
import { signInAs } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
/** A job with artwork, a mockup of it on a plate, and a full brief. */
let own: World;
let document: MockupDocument;
let artworkId: string;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 4 });
  world = await buildWorld(app);
  own = await buildJob(world, {
    title: "Heron lobby",
    brief: {
      wall: "Plaster",
      about: "Sells boats",
      brandColours: "Blue",
      lighting: "Daylight",
      quantity: 2,
      viewingDistanceMm: 4321,
      words: "HERON & WEIR",
    },
  });
  artworkId = (await buildArtwork(app, own)).id;
  const fromArtwork = await signFromArtwork(own, artworkId);
  const base = buildLayer("C", [plate("base", 300, 200, [300, 200], { name: "Heron base" })], { thickness: 6 });
  document = { ...fromArtwork, layers: [base, ...fromArtwork.layers] };
  await own.visitors.owner.get(saveMockup, { params: of(own), body: { version: 0, document } });
}, 60_000);
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const at = (jobId: string) => ({ params: { ...world.params, jobId } });
const clientOf = ({ approver }: World) => approver.client.id;

describe("another like this", () => {
  it("for another client has format, stack and plates, and nothing of the first client's", async () => {
    const client = await buildClient({ shop: world.owner.shop });
    const { owner, maker } = own.visitors;
    const job = await maker.get(openAnotherLike, {
      params: of(own),
      body: { clientId: client.id, title: "Their sign", words: "OTHER WORDS", dueOn: "2031-05-06" },
    });
    expect(job).toMatchObject({
      title: "Their sign",
      dueOn: "2031-05-06",
      client: { id: client.id },
      approvers: [],
      latest: null,
      brief: {
        widthMm: 600,
        heightMm: 400,
        place: "inside",
        viewingDistanceMm: 4321,
        lighting: "Daylight",
        quantity: 2,
        wall: "",
        about: "",
        brandColours: "",
        words: "OTHER WORDS",
      },
    });
    expect(job.id).not.toBe(own.job.id);
    const mockup = await owner.get(getMockup, at(job.id));
    expect(mockup).toMatchObject({ version: 0, savedAt: null, savedBy: null });
    expect(mockup.document.layers.map(({ key, thickness, pieces }) => [key, thickness, pieces.length])).toEqual([
      ["C", 6, 1],
      ["B", 3, 0],
    ]);
    const text = JSON.stringify([job, mockup]);
    for (const theirs of [artworkId, "piece-0", '"base"', "Heron", "HERON", "Plaster", "Sells boats", own.job.title])
      expect(text.includes(theirs), theirs).toBe(false);
    expect((await owner.get(listArtworks, at(job.id))).items).toEqual([]);
    // It is there to be drawn on from here.
    const saved = await maker.get(saveMockup, { ...at(job.id), body: { version: 0, document: mockup.document } });
    expect(saved.version).toBe(1);
  });

  it("says in the new job's log, which the shop alone reads, where it comes from", async () => {
    const job = await own.visitors.owner.get(openAnotherLike, {
      params: of(own),
      body: { clientId: clientOf(own), title: "Once more" },
    });
    const { items } = await own.visitors.rep.get(listEvents, at(job.id));
    expect(items.map(({ text }) => text)).toEqual([
      `Took over format, stack and hardware of job ${own.job.number}`,
      "Opened the job Once more",
    ]);
    expect(await MockupStart.findByPk(job.id)).toMatchObject({ likeJobId: own.job.id });
    expect(await own.visitors.approver.refusal(listEvents, at(job.id))).toMatchObject({ code: "not_found" });
  });

  it("for the same client takes the artwork along when asked, as the new job's own, and the old one keeps its own", async () => {
    const { owner, maker } = own.visitors;
    const job = await maker.get(openAnotherLike, {
      params: of(own),
      body: { clientId: clientOf(own), title: "Second door", words: "WEIR", artwork: true },
    });
    expect(job.brief).toMatchObject({ about: "Sells boats", brandColours: "Blue", wall: "", words: "WEIR" });
    const { items } = await owner.get(listArtworks, at(job.id));
    expect(items.map(({ name, state }) => [name, state])).toEqual([["logo.svg", "ready"]]);
    expect(items[0]?.id).not.toBe(artworkId);
    const mockup = await owner.get(getMockup, at(job.id));
    const from = mockup.document.layers[1]?.pieces.map(({ source }) => "artworkId" in source && source.artworkId);
    expect(from).toEqual([items[0]?.id, items[0]?.id, items[0]?.id]);
    await maker.get(saveMockup, { ...at(job.id), body: { version: 0, document: mockup.document } });
    expect((await owner.get(listArtworks, { params: of(own) })).items.map(({ id }) => id)).toEqual([artworkId]);
    const rows = await Artwork.findAll({ where: { id: [artworkId, items[0]?.id ?? ""] }, attributes: ["fileId"] });
    expect(rows[0]?.fileId).toBe(rows[1]?.fileId);
  });

  it("takes a picture along as it is, not the tracing that is under way for the first job", async () => {
    const { owner } = own.visitors;
    await Artwork.update({ traceAsked: firstChoices }, { where: { id: artworkId } });
    const body = { clientId: clientOf(own), title: "Third door", artwork: true };
    const job = await owner.get(openAnotherLike, { params: of(own), body });
    const { items } = await owner.get(listArtworks, at(job.id));
    const rows = await Artwork.findAll({ where: { id: items.map(({ id }) => id) }, attributes: ["traceAsked"] });
    expect(rows.map(({ traceAsked }) => traceAsked)).toEqual([null]);
    await Artwork.update({ traceAsked: null }, { where: { id: artworkId } });
  });

  it("never takes artwork to another client, whatever was asked, and opens nothing then", async () => {
    const client = await buildClient({ shop: world.owner.shop });
    const answer = await own.visitors.owner.refusal(openAnotherLike, {
      params: of(own),
      body: { clientId: client.id, title: "Their sign", artwork: true },
    });
    expect(answer).toMatchObject({
      code: "validation_failed",
      errors: [{ pointer: "/artwork", detail: "Artwork stays with the client who gave it." }],
    });
    const jobs = await own.visitors.owner.get(listJobs, { params: world.params, query: { clientId: client.id } });
    expect(jobs.items).toEqual([]);
  });

  it("may be opened by a rep, who looks at what the mockup begins with and leaves drawing to a maker", async () => {
    const { rep, maker } = own.visitors;
    const job = await rep.get(openAnotherLike, {
      params: of(own),
      body: { clientId: clientOf(own), title: "Rep’s sign", words: "REP" },
    });
    const mockup = await rep.get(getMockup, at(job.id));
    expect(mockup).toMatchObject({ version: 0, can: { edit: false } });
    expect(mockup.document.layers).toHaveLength(2);
    const body = { version: 0, document: mockup.document };
    expect(await rep.refusal(saveMockup, { ...at(job.id), body })).toMatchObject({ code: "not_allowed" });
    expect(await maker.get(saveMockup, { ...at(job.id), body })).toMatchObject({ version: 1 });
  });

  it("of one that was itself opened like another, and of one without a mockup, begins with what is there", async () => {
    const { owner } = own.visitors;
    const body = { clientId: clientOf(own), title: "Again" };
    const first = await owner.get(openAnotherLike, { params: of(own), body });
    const second = await owner.get(openAnotherLike, { ...at(first.id), body });
    const { document: again } = await owner.get(getMockup, at(second.id));
    expect(again.layers.map(({ key, thickness }) => [key, thickness])).toEqual([
      ["C", 6],
      ["B", 3],
    ]);
    const bare = await buildJob(world, { brief: { widthMm: 777 } });
    const third = await owner.get(openAnotherLike, { params: of(bare), body });
    const { document: plain } = await owner.get(getMockup, at(third.id));
    expect([plain.board.width, plain.layers]).toEqual([777, []]);
  });

  it("is of and for this shop's only, and says every field that is wrong", async () => {
    const stranger = await signInAs(app, await buildMember());
    const elsewhere = await buildWorld(app);
    const body = { clientId: clientOf(own), title: "Taken" };
    expect(await stranger.refusal(openAnotherLike, { params: of(own), body })).toMatchObject({ code: "not_found" });
    // The job of one shop at the address of another, and another shop's client.
    const { owner } = elsewhere.visitors;
    const params = { ...elsewhere.params, jobId: own.job.id };
    expect(
      await owner.refusal(openAnotherLike, { params, body: { ...body, clientId: clientOf(elsewhere) } }),
    ).toMatchObject({ code: "not_found" });
    expect(await owner.refusal(openAnotherLike, { params: of(elsewhere), body })).toMatchObject({ code: "not_found" });
    const wrong = await own.visitors.owner.refusal(openAnotherLike, {
      params: of(own),
      body: { clientId: clientOf(own), title: " ", words: "x".repeat(1001) },
    });
    expect(wrong.errors?.map(({ pointer }) => pointer)).toEqual(["/title", "/words"]);
  });

  it("changes nothing of the job it is like", async () => {
    const before = await own.visitors.owner.get(getJob, { params: of(own) });
    await own.visitors.owner.get(openAnotherLike, { params: of(own), body: { clientId: clientOf(own), title: "New" } });
    expect(await own.visitors.owner.get(getJob, { params: of(own) })).toEqual(before);
    expect((await own.visitors.owner.get(getMockup, { params: of(own) })).document).toEqual(document);
  });
});
