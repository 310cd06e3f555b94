import { readdir } from "node:fs/promises";
import { join } from "node:path";
import { Jimp } from "jimp";
import { afterAll, afterEach, beforeAll, describe, expect, it } from "vitest";
import { Revision } from "#server/models/revision.ts";
import { WallPhoto } from "#server/models/wall-photo.ts";
import { stopPhotos } from "#server/photos/prepare-photo.ts";
import { problemSchema } from "#shared/contracts/errors.ts";
import { saveMockup } from "#shared/contracts/mockups.ts";
import { keepDraft } from "#shared/contracts/named-drafts.ts";
import { issueRevision } from "#shared/contracts/revisions.ts";
import { getWallPhotoFile, listWallPhotos, removeWallPhoto } from "#shared/contracts/wall-photos.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildWallPhoto, shownOn, wallPhotosPath } from "../support/factories/wall-photo.ts";
import { buildWorld, formWith, type World } from "../support/factories/work.ts";
import { lastLogLine } from "../support/job-log.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";
import { cameraSerial, pngOf, twoHalves } from "../support/wall-pictures.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(async () => {
  await stopPhotos();
  await app.stop();
});
afterEach(async () => {
  // Whatever a test sends, nothing is left waiting. Bytes that are known already are removed after the answer.
  await expect.poll(() => readdir(app.services.storage.quarantineDir)).toEqual([]);
});

const kept = async (): Promise<string[]> =>
  (await readdir(join(app.services.storage.quarantineDir, "..", "kept"), { recursive: true })).filter((name) =>
    name.includes("/"),
  );
const fileOf = (own: World, photoId: string) => ({ params: { ...own.params, photoId } });
const listOf = async (own: World) => (await own.visitors.rep.get(listWallPhotos, { params: ofJob(own) })).items;
const ofJob = ({ params, job }: World) => ({ ...params, jobId: job.id });

function signOn(photo: MockupDocument["presentation"]["photo"]): MockupDocument {
  const sign = buildSign([buildLayer("B", [plate("p", 90, 40, [150, 200])])]);
  return { ...sign, presentation: { ...sign.presentation, photo } };
}
const save = (own: World, version: number, document: MockupDocument) =>
  own.visitors.maker.get(saveMockup, { params: ofJob(own), body: { version, document } });

describe("a photo of the wall", () => {
  it("is kept upright, without what the camera wrote, and shown to staff", async () => {
    const own = await buildJob(world);
    const photo = await buildWallPhoto(own);
    expect(photo).toMatchObject({ name: "lobby.jpg", widthPx: 480, heightPx: 640, can: { remove: true } });
    expect(await lastLogLine(own.job.id)).toMatch(/: Brought in the photo lobby.jpg of the wall$/);
    const { status, headers, bytes } = await bytesOf(own, photo.id);
    expect(status).toBe(200);
    expect(headers.get("content-type")).toBe("image/jpeg");
    expect(headers.get("content-disposition")).toMatch(/^inline/);
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("vary")?.split(/,\s*/)).toContain("Cookie");
    expect(bytes.includes(cameraSerial)).toBe(false);
    const { bitmap } = await Jimp.fromBuffer(bytes);
    expect([bitmap.width, bitmap.height]).toEqual([480, 640]);
    expect((await listOf(own)).map(({ id, can }) => [id, can.remove])).toEqual([[photo.id, false]]);
    expect(await listOf(await buildJob(world))).toEqual([]);
  });

  it("taken off the list goes on being shown by what shows it", async () => {
    const own = await buildJob(world);
    const photo = await buildWallPhoto(own);
    await save(own, 0, signOn(shownOn(photo)));
    await own.visitors.maker.get(removeWallPhoto, fileOf(own, photo.id));
    expect(await lastLogLine(own.job.id)).toMatch(/: Took the photo lobby.jpg of the wall off the job$/);
    expect(await listOf(own)).toEqual([]);
    expect((await own.visitors.maker.refusal(removeWallPhoto, fileOf(own, photo.id))).code).toBe("not_found");
    expect((await bytesOf(own, photo.id)).status).toBe(200);
    // As undo does.
    expect((await save(own, 1, signOn(shownOn(photo)))).version).toBe(2);
  });

  it("is frozen with a revision by its hash", async () => {
    const own = await buildJob(world);
    const photo = await buildWallPhoto(own);
    const { version } = await save(own, 0, signOn(shownOn(photo)));
    const body = { mockupVersion: version, message: "" };
    const { id } = await own.visitors.maker.get(issueRevision, { params: ofJob(own), body });
    const row = await Revision.findByPk(id, { rejectOnEmpty: true });
    expect((JSON.parse(row.snapshot ?? "") as Snapshot).photoHashes).toEqual({ [photo.id]: photo.sha256 });
    await app.runJobs();
  });

  it("is nobody else's: not the client's, not another shop's, not another client's mockup's", async () => {
    const own = await buildJob(world);
    const photo = await buildWallPhoto(own);
    const stranger = await signInAs(app, await buildMember());
    const elsewhere = await buildClient({ shop: own.owner.shop });
    const strangers = [
      own.visitors.approver,
      await signInByMail(app, await buildContact({ client: elsewhere })),
      stranger,
    ];
    for (const visitor of strangers)
      expect((await visitor.refusal(getWallPhotoFile, fileOf(own, photo.id))).code).toBe("not_found");
    const theirs = await buildWorld(app);
    const refused = await theirs.visitors.maker.refusal(saveMockup, {
      params: ofJob(theirs),
      body: { version: 0, document: signOn(shownOn(photo)) },
    });
    expect(refused).toMatchObject({
      code: "validation_failed",
      errors: [{ pointer: "/document/presentation/photo", detail: "The photo of the wall is not this client’s." }],
    });
    const draft = { name: "On their wall", document: signOn(shownOn(photo)) };
    expect((await theirs.visitors.maker.refusal(keepDraft, { params: ofJob(theirs), body: draft })).code).toBe(
      "validation_failed",
    );
    // Another job of the same client is another matter; a photo of another size is none of theirs.
    const second = await buildJob(world);
    expect((await save(second, 0, signOn(shownOn(photo)))).version).toBe(1);
    const resized = { version: 1, document: signOn({ ...shownOn(photo), widthPx: 481 }) };
    const wrong = await second.visitors.maker.refusal(saveMockup, { params: ofJob(second), body: resized });
    expect(wrong.code).toBe("validation_failed");
  });
});

describe("a file that is no photo", () => {
  const jpegHead = Uint8Array.from([0xff, 0xd8, 0xff, 0xc0, 0, 17, 8, 0x27, 0x10, 0x27, 0x10, 3, 1, 0x22, 0, 2, 0x11]);
  const bombPng = (): Uint8Array<ArrayBuffer> => {
    const head = Buffer.alloc(33);
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13]).copy(head);
    head.write("IHDR", 12, "latin1");
    head.writeUInt32BE(20_000, 16);
    head.writeUInt32BE(20_000, 20);
    return Uint8Array.from(head);
  };
  it.each([
    {
      name: "an SVG called JPEG",
      bytes: new TextEncoder().encode("<svg/>"),
      status: 415,
      says: "This is no JPEG or PNG.",
    },
    { name: "a PDF", bytes: new TextEncoder().encode("%PDF-1.7\n"), status: 415, says: "This is no JPEG or PNG." },
    { name: "a JPEG of 100 million pixels", bytes: jpegHead, status: 413, says: "The photo has 100 million pixels." },
    { name: "a PNG of 400 million pixels", bytes: bombPng(), status: 413, says: "The photo has 400 million pixels." },
    {
      name: "a JPEG that ends at once",
      bytes: Uint8Array.from([0xff, 0xd8, 0xff, 0xe0]),
      status: 415,
      says: "The photo is not complete.",
    },
  ])("is refused in words: $name", async ({ bytes, status: wanted, says }) => {
    const own = await buildJob(world);
    const before = await kept();
    const { status, text } = await own.visitors.maker.send("POST", wallPhotosPath(own), {
      body: formWith("wall.jpg", Uint8Array.from(bytes), "image/jpeg"),
    });
    expect(status).toBe(wanted);
    expect(problemSchema.parse(JSON.parse(text)).detail).toContain(says);
    expect(await WallPhoto.count({ where: { jobId: own.job.id } })).toBe(0);
    expect(await kept()).toEqual(before);
  });

  it("is refused when it breaks off in its pixels, and the next one is taken", async () => {
    const own = await buildJob(world);
    const png = await pngOf(twoHalves(300, 200));
    const { status } = await own.visitors.maker.send("POST", wallPhotosPath(own), {
      body: formWith("wall.png", png.slice(0, png.length - 60), "image/png"),
    });
    expect(status).toBe(415);
    expect((await buildWallPhoto(own)).widthPx).toBe(480);
  });

  it("is not even taken from the rep, who draws nothing", async () => {
    const { status, text } = await world.visitors.rep.send("POST", wallPhotosPath(world), {
      body: formWith("wall.png", await pngOf(twoHalves(30, 20)), "image/png"),
    });
    expect(status).toBe(403);
    expect(problemSchema.parse(JSON.parse(text)).detail).toBe("Photos are brought in by owners and makers.");
  });
});

/** The file as bytes, which a visitor's answer has only as text. */
async function bytesOf(own: World, photoId: string) {
  const cookie = [...own.visitors.rep.cookies].map(([name, value]) => `${name}=${value}`).join("; ");
  const answer = await fetch(`${app.baseUrl}/api/shops/${own.params.shop}/wall-photos/${photoId}/file`, {
    headers: { Cookie: cookie },
  });
  return { status: answer.status, headers: answer.headers, bytes: Buffer.from(await answer.arrayBuffer()) };
}
