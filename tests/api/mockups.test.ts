import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Mockup } from "#server/models/mockup.ts";
import { removeArtwork } from "#shared/contracts/artworks.ts";
import { changeJob, openJob } from "#shared/contracts/jobs.ts";
import { getMockup, mockupSchema, saveMockup } from "#shared/contracts/mockups.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildClient } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildArtwork, buildWorld, signFromArtwork, type World } from "../support/factories/work.ts";
import { logKinds } from "../support/job-log.ts";
import { signInAs } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const of = ({ params, job }: World) => ({ ...params, jobId: job.id });
const twoPlates = () =>
  buildSign([buildLayer("B", [plate("p1", 90, 40, [200, 200]), plate("p2", 60, 60, [400, 200])])]);

describe("a mockup", () => {
  it("is an empty board of the brief's size until it is saved", async () => {
    const own = await buildJob(world, { brief: { widthMm: 912.5, heightMm: 305, quantity: 3 } });
    const mockup = await own.visitors.rep.get(getMockup, { params: of(own) });
    expect(mockup).toMatchObject({ version: 0, savedAt: null, savedBy: null, can: { edit: false, issue: false } });
    expect(mockup.document).toMatchObject({
      board: { width: 912.5, height: 305 },
      quantity: 3,
      layers: [],
      presentation: { viewingDistance: 4000 },
    });
    expect((await own.visitors.maker.get(getMockup, { params: of(own) })).can).toEqual({ edit: true, issue: true });
    expect(await Mockup.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it("opens for the largest and the smallest brief there may be", async () => {
    const largest = { widthMm: 10_000, heightMm: 10_000, viewingDistanceMm: 200_000, quantity: 1000 };
    const smallest = { widthMm: 20, heightMm: 20, viewingDistanceMm: 0.001, quantity: 1 };
    for (const brief of [largest, smallest]) {
      const own = await buildJob(world, { brief });
      const { document } = await own.visitors.maker.get(getMockup, { params: of(own) });
      expect(document.board.width).toBe(brief.widthMm);
      const body = { version: 0, document };
      expect((await own.visitors.maker.get(saveMockup, { params: of(own), body })).version).toBe(1);
    }
  });

  it("is saved as version 1, 2, and so on, and its start stands in the log once", async () => {
    const own = await buildJob(world);
    const document = twoPlates();
    const first = await own.visitors.maker.get(saveMockup, { params: of(own), body: { version: 0, document } });
    expect(first).toMatchObject({ version: 1, document, can: { edit: true, issue: true } });
    expect(first.savedBy).toMatch(/^Person \d+$/);
    const wider = { ...document, board: { ...document.board, width: 700 } };
    const second = await own.visitors.owner.get(saveMockup, { params: of(own), body: { version: 1, document: wider } });
    expect(second).toMatchObject({ version: 2, document: { board: { width: 700 } } });
    expect(second.savedBy).not.toBe(first.savedBy);
    expect(await own.visitors.rep.get(getMockup, { params: of(own) })).toEqual({
      ...second,
      can: { edit: false, issue: false },
    });
    expect(await logKinds(own.job.id)).toEqual(["job opened", "job changed", "mockup begun"]);
  });

  it("that was saved by someone else meanwhile is refused, and the newer one comes with the refusal", async () => {
    const own = await buildJob(world);
    const mine = twoPlates();
    const theirs = { ...mine, board: { ...mine.board, height: 444 } };
    await own.visitors.owner.get(saveMockup, { params: of(own), body: { version: 0, document: theirs } });
    for (const version of [0, 2, 17]) {
      const problem = await own.visitors.maker.refusal(saveMockup, {
        params: of(own),
        body: { version, document: mine },
      });
      expect(problem).toMatchObject({
        status: 409,
        code: "stale",
        detail: "Someone saved a newer version while you were drawing. Keep theirs or yours.",
      });
      const newer = mockupSchema.parse(problem.extra?.newer);
      expect(newer).toMatchObject({ version: 1, document: theirs });
    }
    expect(await Mockup.findOne({ where: { jobId: own.job.id } })).toMatchObject({ version: 1 });
    const kept = await own.visitors.maker.get(saveMockup, { params: of(own), body: { version: 1, document: mine } });
    expect(kept.version).toBe(2);
  });

  it("draws only from artwork of its job's client, from any job of theirs and from what was taken off since", async () => {
    const own = await buildJob(world);
    const sister = await buildJob(world);
    const artwork = await buildArtwork(app, own);
    const document = await signFromArtwork(own, artwork.id);
    const body = { version: 0, document };
    const stranger = await buildClient({ shop: own.owner.shop });
    const foreign = await own.visitors.maker.get(openJob, {
      params: own.params,
      body: { clientId: stranger.id, title: "Another's sign", dueOn: null },
    });
    const refused = await own.visitors.maker.refusal(saveMockup, {
      params: { ...own.params, jobId: foreign.id },
      body,
    });
    expect(refused).toMatchObject({
      code: "validation_failed",
      errors: [{ pointer: "/document/layers", detail: "A piece comes from artwork that is not this client’s." }],
    });
    expect(await Mockup.count({ where: { jobId: foreign.id } })).toBe(0);
    expect((await own.visitors.maker.get(saveMockup, { params: of(sister), body })).document).toEqual(document);
    await own.visitors.maker.get(removeArtwork, { params: { ...own.params, artworkId: artwork.id } });
    expect((await own.visitors.maker.get(saveMockup, { params: of(own), body })).document).toEqual(document);
  });

  it("names each fault of a document by its place", async () => {
    const own = await buildJob(world);
    const sign = twoPlates();
    const [layer] = sign.layers;
    const [piece] = layer?.pieces ?? [];
    if (!layer || !piece) throw new Error("The sign has a piece.");
    const bad = {
      ...sign,
      version: 2,
      board: { ...sign.board, width: 10_001 },
      layers: [
        { ...layer, thickness: -3, pieces: [piece, { ...piece, placement: { ...piece.placement, scale: 0 } }] },
        { ...layer, key: "a1", colour: "#fff" },
      ],
    };
    const { code, errors } = await own.visitors.maker.refusal(saveMockup, {
      params: of(own),
      body: { version: -1, document: bad as never },
    });
    expect(code).toBe("validation_failed");
    expect(errors?.map(({ pointer }) => pointer).sort()).toEqual([
      "/document/board/width",
      "/document/layers/0/pieces/1/placement/scale",
      "/document/layers/0/thickness",
      "/document/layers/1/colour",
      "/document/layers/1/key",
      "/document/version",
      "/version",
    ]);
    const twice = await own.visitors.maker.refusal(saveMockup, {
      params: of(own),
      body: { version: 0, document: { ...sign, layers: [layer, { ...layer, name: "Again" }] } },
    });
    expect(twice.errors).toEqual([
      { pointer: "/document/layers/1/key", detail: "Key B is used twice." },
      { pointer: "/document/layers/1", detail: "The id p1 is used twice." },
      { pointer: "/document/layers/1", detail: "The id p2 is used twice." },
    ]);
    expect(await Mockup.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it.each([
    { number: "NaN", code: "malformed_request", pointers: undefined },
    { number: "1e999", code: "validation_failed", pointers: ["/document/board/width"] },
    { number: "-1e999", code: "validation_failed", pointers: ["/document/board/width"] },
    { number: "1e308", code: "validation_failed", pointers: ["/document/board/width"] },
    { number: "null", code: "validation_failed", pointers: ["/document/board/width"] },
    { number: '"600"', code: "validation_failed", pointers: ["/document/board/width"] },
  ])("has no board $number mm wide", async ({ number, code, pointers }) => {
    const own = await buildJob(world);
    const text = JSON.stringify({ version: 0, document: twoPlates() }).replace('"width":600', `"width":${number}`);
    const { status, text: answer } = await own.visitors.maker.send(
      "PUT",
      `/api/shops/${own.params.shop}/jobs/${own.job.id}/mockup`,
      { body: text, headers: { "Content-Type": "application/json" } },
    );
    const problem = JSON.parse(answer) as { code: string; errors?: { pointer: string }[] };
    expect(problem.code).toBe(code);
    expect(problem.errors?.map(({ pointer }) => pointer)).toEqual(pointers);
    expect(status).toBe(code === "malformed_request" ? 400 : 422);
  });

  it("of more than 8 MB is refused", async () => {
    const own = await buildJob(world);
    const { status, text } = await own.visitors.maker.send(
      "PUT",
      `/api/shops/${own.params.shop}/jobs/${own.job.id}/mockup`,
      {
        body: JSON.stringify({ version: 0, document: twoPlates(), x: "x".repeat(8_400_000) }),
        headers: { "Content-Type": "application/json" },
      },
    );
    expect(JSON.parse(text)).toMatchObject({ code: "too_large" });
    expect(status).toBe(413);
  });

  it("is drawn by owners and makers, looked at by reps, and hidden from everybody else", async () => {
    const own = await buildJob(world);
    const given = { params: of(own), body: { version: 0, document: twoPlates() } };
    expect((await own.visitors.rep.refusal(saveMockup, given)).code).toBe("not_allowed");
    expect((await own.visitors.approver.refusal(saveMockup, given)).code).toBe("not_found");
    expect((await own.visitors.approver.refusal(getMockup, { params: of(own) })).code).toBe("not_found");
    const stranger = await signInAs(app, await buildMember());
    expect((await stranger.refusal(saveMockup, given)).code).toBe("not_found");
    expect((await app.visitor().refusal(saveMockup, given)).code).toBe("not_signed_in");
    expect(await Mockup.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it("keeps its own size when the brief changes later", async () => {
    const own = await buildJob(world);
    await own.visitors.maker.get(saveMockup, { params: of(own), body: { version: 0, document: twoPlates() } });
    await own.visitors.owner.get(changeJob, { params: of(own), body: { brief: { widthMm: 999 } } });
    expect((await own.visitors.maker.get(getMockup, { params: of(own) })).document.board.width).toBe(600);
  });
});
