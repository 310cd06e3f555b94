import { once } from "node:events";
import { readdir, readlink } from "node:fs/promises";
import { connect } from "node:net";
import { join } from "node:path";
import { afterAll, afterEach, beforeAll, describe, expect, it } from "vitest";
import { sha256Hex } from "#server/files/sha256.ts";
import { Artwork } from "#server/models/artwork.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import {
  artworkSchema,
  getArtwork,
  getArtworkFile,
  getArtworkPieces,
  listArtworks,
  removeArtwork,
  setTrueSize,
} from "#shared/contracts/artworks.ts";
import { problemSchema } from "#shared/contracts/errors.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildMember } from "../support/factories/member.ts";
import { artworksPath, buildArtwork, buildWorld, formWith, plainSvg, type World } from "../support/factories/work.ts";
import { lastLogLine, logKinds } from "../support/job-log.ts";
import { rawPng } from "../support/pictures.ts";
import { runSql } from "../support/run-sql.ts";
import { pdfOf } from "../support/seeded-pdf.ts";
import { signInAs } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

const quarantined = (): Promise<string[]> => readdir(app.services.storage.quarantineDir);
const kept = async (): Promise<string[]> =>
  (await readdir(join(app.services.storage.quarantineDir, "..", "kept"), { recursive: true })).filter((name) =>
    name.includes("/"),
  );
afterEach(async () => {
  // Whatever a test sends, nothing is left waiting.
  expect(await quarantined()).toEqual([]);
});

/** Kept files that this process, the application among it, holds open. */
const openedFiles = async (): Promise<string[]> => {
  const links = await Promise.all(
    (await readdir("/proc/self/fd")).map((fd) => readlink(`/proc/self/fd/${fd}`).catch(() => "")),
  );
  return links.filter((path) => path.includes("/kept/"));
};
const svgOf = (content: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="100mm" height="50mm" viewBox="0 0 100 50">${content}</svg>`;
let drawn = 0;
/** A drawing whose bytes nobody sent before. */
const freshSvg = () => {
  drawn += 1;
  return plainSvg().replace("<svg ", `<svg id="d${drawn}" `);
};

async function bringIn(own: World, form: FormData, visitor = own.visitors.maker) {
  const { status, text } = await visitor.send("POST", artworksPath(own), { body: form });
  return { status, text };
}
async function refusedUpload(own: World, form: FormData, visitor = own.visitors.maker) {
  const { status, text } = await bringIn(own, form, visitor);
  return { ...problemSchema.parse(JSON.parse(text)), status };
}
const bytes = (...values: number[]) => Uint8Array.from(values);

describe("bringing in artwork", () => {
  it("keeps the file as it came, then turns it into pieces", async () => {
    const own = await buildJob(world);
    const svg = freshSvg();
    const { status, text } = await bringIn(own, formWith("Heron logo.svg", svg));
    expect(status).toBe(202);
    const added = artworkSchema.parse(JSON.parse(text));
    expect(added).toMatchObject({
      name: "Heron logo.svg",
      state: "importing",
      sha256: sha256Hex(svg),
      byteSize: svg.length,
      widthMm: null,
      colours: [],
      can: { change: false, remove: true },
    });
    expect(await app.queuedJobs()).toMatchObject([{ task: "import-artwork", payload: { artworkId: added.id } }]);
    const params = { ...own.params, artworkId: added.id };
    expect((await own.visitors.maker.refusal(getArtworkPieces, { params })).code).toBe("wrong_state");
    expect(
      (await own.visitors.maker.refusal(setTrueSize, { params, body: { side: "width", lengthMm: 50 } })).code,
    ).toBe("wrong_state");
    await app.runJobs();
    const ready = await own.visitors.rep.get(getArtwork, { params });
    expect(ready).toMatchObject({ state: "ready", widthMm: 200, heightMm: 100, warnings: [], refusal: null });
    expect(ready.colours.map(({ colour, pieces }) => [colour, pieces])).toEqual([
      ["#27314F", 2],
      ["#C8992F", 1],
    ]);
    // Two squares of 60 and 50 mm, a disc of 15 mm radius.
    expect(ready.colours[0]?.areaMm2).toBeCloseTo(6100, 3);
    expect(ready.colours[1]?.areaMm2).toBeCloseTo(706.858, 0);
    expect(await logKinds(own.job.id)).toEqual(["job opened", "job changed", "artwork added", "artwork ready"]);
    expect(await lastLogLine(own.job.id)).toBe("Standproud: Heron logo.svg became 3 pieces");
  });

  it("takes a PDF whatever it is called, in its true size, and gives it back as one", async () => {
    const own = await buildJob(world);
    // 144 by 72 points, and on it a square of 36.
    const pdf = await pdfOf("0.8 0.1 0.1 rg\n10 10 36 36 re\nf", { size: [144, 72] });
    const added = artworkSchema.parse(
      JSON.parse((await bringIn(own, formWith("logo.svg", Uint8Array.from(pdf)))).text),
    );
    await app.runJobs();
    const params = { ...own.params, artworkId: added.id };
    const ready = await own.visitors.maker.get(getArtwork, { params });
    expect(ready).toMatchObject({ state: "ready", warnings: [], colours: [{ colour: "#CC1A1A", pieces: 1 }] });
    expect(ready.widthMm).toBeCloseTo(50.8, 6);
    expect(ready.heightMm).toBeCloseTo(25.4, 6);
    expect(ready.colours[0]?.areaMm2).toBeCloseTo(161.29, 2);
    const { headers } = await own.visitors.maker.ask(getArtworkFile, { params });
    expect(headers.get("content-type")).toBe("application/pdf");
    expect(headers.get("content-security-policy")).toBe("sandbox; default-src 'none'");
    expect(headers.get("content-disposition")).toMatch(/^attachment;/);
  });

  it("gives the original back as an attachment that no browser runs", async () => {
    const own = await buildJob(world);
    const svg = svgOf('<rect width="9" height="9"/><script>alert(1)</script>');
    const added = artworkSchema.parse(JSON.parse((await bringIn(own, formWith("it's (1)*.svg", svg))).text));
    const { status, headers, text } = await own.visitors.rep.ask(getArtworkFile, {
      params: { ...own.params, artworkId: added.id },
    });
    expect(status).toBe(200);
    expect(text).toBe(svg);
    expect(headers.get("content-type")).toBe("image/svg+xml");
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("content-security-policy")).toBe("sandbox; default-src 'none'");
    expect(headers.get("cache-control")).toBe("no-store");
    // RFC 8187: these signs are no attr-char and must be written as bytes.
    expect(headers.get("content-disposition")).toBe("attachment; filename*=UTF-8''it%27s%20%281%29%2A.svg");
    await app.runJobs();
  });

  it("lets a reader leave in the middle of the file, and lets go of it", async () => {
    const own = await buildJob(world);
    const big = svgOf(`<!--${"x".repeat(9_000_000)}--><path d="M0 0h9v9z"/>`);
    const added = artworkSchema.parse(JSON.parse((await bringIn(own, formWith("big.svg", big))).text));
    const { hostname, port } = new URL(app.baseUrl);
    const cookie = [...own.visitors.rep.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
    const socket = connect(Number(port), hostname);
    socket.write(
      `GET /api/shops/${own.params.shop}/artworks/${added.id}/file HTTP/1.1\r\nHost: ${hostname}:${port}\r\nCookie: ${cookie}\r\n\r\n`,
    );
    await once(socket, "data");
    socket.pause();
    await expect.poll(openedFiles, { timeout: 10_000 }).toHaveLength(1);
    socket.destroy();
    await expect.poll(openedFiles, { timeout: 10_000 }).toEqual([]);
    expect(app.logged.filter((line) => line.includes("A request failed"))).toEqual([]);
    await app.runJobs();
  });

  it("says why the importer took a file off, and keeps the file", async () => {
    const own = await buildJob(world);
    const cut = freshSvg().slice(0, -20);
    const added = artworkSchema.parse(JSON.parse((await bringIn(own, formWith("cut.svg", cut))).text));
    await app.runJobs();
    const params = { ...own.params, artworkId: added.id };
    expect(await own.visitors.rep.get(getArtwork, { params })).toMatchObject({
      state: "refused",
      refusal: {
        code: "svg.broken",
        text: "The file is not complete, well-formed SVG. It may be cut off: export it again and try once more.",
      },
      can: { change: false },
    });
    expect((await own.visitors.rep.refusal(getArtworkPieces, { params })).code).toBe("wrong_state");
    expect(await lastLogLine(own.job.id)).toMatch(/^Standproud: cut.svg could not be taken: The file is not complete/);
    expect((await own.visitors.rep.ask(getArtworkFile, { params })).text).toBe(cut);
  });

  it("gives up on a file that the disk has lost, instead of importing it for ever", async () => {
    const own = await buildJob(world);
    const added = artworkSchema.parse(JSON.parse((await bringIn(own, formWith("lost.svg", freshSvg()))).text));
    const file = await StoredFile.findOne({ where: { sha256: added.sha256 }, rejectOnEmpty: true });
    await app.services.storage.remove(file.storageKey);
    await app.runJobs();
    const params = { ...own.params, artworkId: added.id };
    expect((await own.visitors.rep.get(getArtwork, { params })).state).toBe("importing");
    expect((await app.queuedJobs()).map(({ task, lastError }) => [task, lastError !== null])).toEqual([
      ["import-artwork", true],
    ]);
    // The last of its eight tries.
    await runSql(app.database.ownerUrl, "update graphile_worker._private_jobs set attempts = 7, run_at = now()");
    await app.runJobs();
    expect(await own.visitors.rep.get(getArtwork, { params })).toMatchObject({
      state: "refused",
      refusal: { code: "import.failed" },
    });
    expect(await app.queuedJobs()).toEqual([]);
  });
});

describe("an upload that can't be taken", () => {
  it.each([
    { name: "an empty file", file: "empty.svg", content: bytes(), says: "The file is empty." },
    {
      name: "a PNG of 20,000 by 20,000 pixels called SVG",
      file: "logo.svg",
      content: rawPng({ width: 20_000, height: 20_000, depth: 8, colourType: 0, bytesPerPixel: 1, rows: bytes(0) }),
      says: "The picture has more than 40 million pixels.",
    },
    {
      name: "a program",
      file: "logo.svg",
      content: bytes(0x7f, 0x45, 0x4c, 0x46, 2, 1, 1),
      says: "This is neither a drawing in SVG or PDF nor a picture in PNG or JPEG.",
    },
  ])("is refused in words: $name", async ({ file, content, says }) => {
    const own = await buildJob(world);
    const before = await kept();
    const problem = await refusedUpload(own, formWith(file, content));
    expect(problem).toMatchObject({ status: 415, code: "unsupported_type" });
    expect(problem.detail).toContain(says);
    expect(await Artwork.count({ where: { jobId: own.job.id } })).toBe(0);
    expect(await kept()).toEqual(before);
  });

  it("is refused when it is over 10 MB, and nothing of it stays", async () => {
    const own = await buildJob(world);
    const problem = await refusedUpload(own, formWith("big.svg", svgOf(" ".repeat(10_000_001))));
    expect(problem).toMatchObject({ status: 413, code: "too_large" });
    expect(problem.detail).toBe("Files up to 10 MB can be taken.");
    expect(await Artwork.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it("is refused when it is not exactly one file in its field", async () => {
    const own = await buildJob(world);
    const two = formWith("one.svg", freshSvg());
    two.append("file", new Blob([freshSvg()]), "two.svg");
    const wrong = new FormData();
    wrong.append("logo", new Blob([freshSvg()]), "one.svg");
    const beside = formWith("one.svg", freshSvg());
    beside.append("name", "beside");
    const text = new FormData();
    text.append("file", freshSvg());
    const none = new FormData();
    for (const form of [two, wrong, beside, text, none]) {
      expect(await refusedUpload(own, form)).toMatchObject({ status: 400, code: "malformed_request" });
      expect(await quarantined()).toEqual([]);
    }
    const json = await own.visitors.maker.send("POST", artworksPath(own), { body: { file: "x" } });
    expect(json.status).toBe(400);
    expect(await Artwork.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it("is refused when its form is broken: no boundary, no end, no name", async () => {
    const own = await buildJob(world);
    const send = (body: string, type: string) =>
      own.visitors.maker.send("POST", artworksPath(own), { body, headers: { "Content-Type": type } });
    const head = '--x\r\nContent-Disposition: form-data; name="file"; filename="a.svg"\r\n\r\n';
    for (const [body, type] of [
      [`${head}${freshSvg()}`, "multipart/form-data; boundary=x"],
      [`${head}${freshSvg()}\r\n--x--\r\n`, "multipart/form-data"],
      ["--x", "multipart/form-data; boundary=x"],
      [`${head.replace("a.svg", "a\u0000.svg")}${freshSvg()}\r\n--x--\r\n`, "multipart/form-data; boundary=x"],
      [`${head.replace("a.svg", "/")}${freshSvg()}\r\n--x--\r\n`, "multipart/form-data; boundary=x"],
    ] as const) {
      const { status, text } = await send(body, type);
      expect(problemSchema.parse(JSON.parse(text)).code).toBe("malformed_request");
      expect(status).toBe(400);
      expect(await quarantined()).toEqual([]);
    }
    expect(await Artwork.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it("leaves nothing when the connection is cut in the middle", async () => {
    const own = await buildJob(world);
    const { hostname, port } = new URL(app.baseUrl);
    const socket = connect(Number(port), hostname);
    const cookie = [...own.visitors.maker.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
    socket.write(
      [
        `POST ${artworksPath(own)} HTTP/1.1`,
        `Host: ${hostname}:${port}`,
        `Cookie: ${cookie}`,
        "X-Standproud: 1",
        "Content-Type: multipart/form-data; boundary=x",
        "Content-Length: 1000000",
        "",
        '--x\r\nContent-Disposition: form-data; name="file"; filename="a.svg"\r\n\r\n<svg xmlns="http://www.w3.org/2000/svg">',
      ].join("\r\n"),
    );
    await expect.poll(quarantined, { timeout: 10_000 }).toHaveLength(1);
    socket.destroy();
    await expect.poll(quarantined, { timeout: 10_000 }).toEqual([]);
    expect(await Artwork.count({ where: { jobId: own.job.id } })).toBe(0);
  });

  it.each([
    { sent: 'filename="../../etc/passwd.svg"', name: "passwd.svg" },
    { sent: String.raw`filename="..\\..\\windows\\logo.svg"`, name: "logo.svg" },
    { sent: "filename*=utf-8''a%00b%07%E2%80%AEgvs.svg", name: "abgvs.svg" },
    { sent: "filename*=utf-8''..%2F..%2Fhidden%0D%0A.svg", name: "hidden.svg" },
    { sent: "filename*=utf-8''%20%00", name: "artwork" },
    { sent: `filename="${"n".repeat(300)}.svg"`, name: `${"n".repeat(116)}.svg` },
    { sent: 'filename="Schönes Zeichen Ω.svg"', name: "Schönes Zeichen Ω.svg" },
    { sent: 'filename="<img src=x onerror=alert(1)>.svg"', name: "<img src=x onerror=alert(1)>.svg" },
    { sent: `filename="${"🪶".repeat(200)}x.svg"`, name: `${"🪶".repeat(115)}x.svg` },
  ])("shows only the last part of a name like $sent", async ({ sent, name }) => {
    const own = await buildJob(world);
    const body = `--x\r\nContent-Disposition: form-data; name="file"; ${sent}\r\n\r\n${freshSvg()}\r\n--x--\r\n`;
    const { status, text } = await own.visitors.maker.send("POST", artworksPath(own), {
      body,
      headers: { "Content-Type": "multipart/form-data; boundary=x" },
    });
    expect(text).toContain('"state":"importing"');
    expect(status).toBe(202);
    const [row] = await Artwork.findAll({ where: { jobId: own.job.id }, include: ["file"] });
    expect(row?.name).toBe(name);
    expect(row?.file?.storageKey).toMatch(/^[0-9a-f-]{36}\/[0-9a-f-]{36}$/);
    await app.runJobs();
  });
});

describe("the same bytes", () => {
  it("are kept once within a shop, and never shared with another", async () => {
    const svg = freshSvg();
    const own = await buildJob(world);
    const again = await buildJob(world);
    const other = await buildWorld(app);
    const first = await buildArtwork(app, own, svg);
    const second = await buildArtwork(app, again, svg);
    const before = await kept();
    const third = await buildArtwork(app, other, svg);
    expect(new Set([first.id, second.id, third.id]).size).toBe(3);
    const files = await StoredFile.findAll({ where: { sha256: sha256Hex(svg) } });
    expect(files.map(({ shopId }) => shopId).sort()).toEqual([world.owner.shop.id, other.owner.shop.id].sort());
    expect((await kept()).length).toBe(before.length + 1);
    expect((await Artwork.findByPk(first.id))?.fileId).toBe((await Artwork.findByPk(second.id))?.fileId);
    const foreign = { ...other.params, artworkId: first.id };
    for (const endpoint of [getArtwork, getArtworkFile, getArtworkPieces, removeArtwork])
      expect((await other.visitors.owner.refusal(endpoint, { params: foreign })).code).toBe("not_found");
  });
});

describe("the true size", () => {
  it("follows one dimension; pieces, areas and the other side follow it", async () => {
    const own = await buildJob(world);
    const { id } = await buildArtwork(app, own, freshSvg());
    const params = { ...own.params, artworkId: id };
    const half = await own.visitors.maker.get(setTrueSize, { params, body: { side: "height", lengthMm: 50 } });
    expect(half).toMatchObject({ widthMm: 100, heightMm: 50 });
    expect(half.colours[0]?.areaMm2).toBeCloseTo(1525, 3);
    const { pieces } = await own.visitors.rep.get(getArtworkPieces, { params });
    expect(pieces[0]?.box).toEqual({ x: 0, y: 0, width: 30, height: 30 });
    const back = await own.visitors.maker.get(setTrueSize, { params, body: { side: "width", lengthMm: 200 } });
    expect(back).toMatchObject({ widthMm: 200, heightMm: 100 });
  });

  it("is refused when it is absurd, and stays as it was", async () => {
    const own = await buildJob(world);
    const tall = await buildArtwork(
      app,
      own,
      '<svg xmlns="http://www.w3.org/2000/svg" width="2mm" height="50mm" viewBox="0 0 2 50"><path d="M0 0h2v50h-2z"/></svg>',
    );
    const params = { ...own.params, artworkId: tall.id };
    for (const body of [
      { side: "width", lengthMm: 0 },
      { side: "width", lengthMm: -5 },
      { side: "width", lengthMm: 10_001 },
      { side: "width", lengthMm: 9_000 },
      { side: "width", lengthMm: 5e-324 },
      { side: "height", lengthMm: 0.5 },
      { side: "height", lengthMm: "50" },
    ] as const) {
      const problem = await own.visitors.maker.refusal(setTrueSize, { params, body: body as never });
      expect(problem, JSON.stringify(body)).toMatchObject({
        code: "validation_failed",
        errors: [{ pointer: "/lengthMm" }],
      });
    }
    const both = await own.visitors.maker.refusal(setTrueSize, {
      params,
      body: { side: "depth", lengthMm: null, scale: 2 } as never,
    });
    expect(both.errors?.map(({ pointer }) => pointer).sort()).toEqual(["/lengthMm", "/scale", "/side"]);
    expect((await Artwork.findByPk(tall.id))?.scale).toBe(1);
  });
});

describe("the list of artwork", () => {
  it("is read page by page, newest first, also when two came in the same moment", async () => {
    const own = await buildJob(world);
    const jobId = own.job.id;
    const ids: string[] = [];
    for (let count = 0; count < 3; count += 1) ids.push((await buildArtwork(app, own, freshSvg())).id);
    await Artwork.update({ addedAt: new Date("2030-01-01T00:00:00.500Z") }, { where: { jobId } });
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await own.visitors.rep.get(listArtworks, {
        params: { ...own.params, jobId },
        query: { limit: 1, ...(cursor ? { cursor } : {}) },
      });
      seen.push(...page.items.map(({ id }) => id));
      cursor = page.next ?? undefined;
    } while (cursor && seen.length < 9);
    expect(seen).toEqual([...ids].sort().reverse());
  });

  it("loses what is taken off, once, and the file stays", async () => {
    const own = await buildJob(world);
    const { id, name } = await buildArtwork(app, own, freshSvg());
    const params = { ...own.params, artworkId: id };
    await own.visitors.maker.get(removeArtwork, { params });
    expect((await own.visitors.maker.refusal(removeArtwork, { params })).code).toBe("not_found");
    const { items } = await own.visitors.rep.get(listArtworks, { params: { ...own.params, jobId: own.job.id } });
    expect(items).toEqual([]);
    expect(await lastLogLine(own.job.id)).toMatch(new RegExp(`: Took the artwork ${name} off the job$`));
    const row = await Artwork.findByPk(id, { include: ["file"], rejectOnEmpty: true });
    expect(sha256Hex(await app.services.storage.read(row.file?.storageKey ?? ""))).toBe(row.file?.sha256);
  });
});

describe("artwork", () => {
  it("is changed by owners and makers, looked at by reps, and no business of anybody else", async () => {
    const own = await buildJob(world);
    const { id } = await buildArtwork(app, own, freshSvg());
    const params = { ...own.params, artworkId: id };
    const jobParams = { ...own.params, jobId: own.job.id };
    const { rep, approver } = own.visitors;
    expect(await refusedUpload(own, formWith("a.svg", freshSvg()), rep)).toMatchObject({ code: "not_allowed" });
    expect((await rep.refusal(removeArtwork, { params })).code).toBe("not_allowed");
    expect((await rep.refusal(setTrueSize, { params, body: { side: "width", lengthMm: 50 } })).code).toBe(
      "not_allowed",
    );
    expect((await rep.get(getArtwork, { params })).can).toEqual({ change: false, remove: false, trace: false });
    const stranger = await signInAs(app, await buildMember());
    for (const visitor of [approver, stranger]) {
      expect((await visitor.refusal(getArtwork, { params })).code).toBe("not_found");
      expect((await visitor.refusal(listArtworks, { params: jobParams })).code).toBe("not_found");
      expect(await refusedUpload(own, formWith("a.svg", freshSvg()), visitor)).toMatchObject({ code: "not_found" });
    }
    expect((await app.visitor().refusal(getArtworkFile, { params })).code).toBe("not_signed_in");
    expect(await refusedUpload(own, formWith("a.svg", freshSvg()), app.visitor())).toMatchObject({
      code: "not_signed_in",
    });
    expect(await Artwork.count({ where: { jobId: own.job.id } })).toBe(1);
  });
});
