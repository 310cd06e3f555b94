import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Artwork } from "#server/models/artwork.ts";
import {
  type Artwork as ArtworkView,
  artworkSchema,
  cancelTrace,
  getArtwork,
  getArtworkFile,
  getArtworkPieces,
  setTrueSize,
  traceArtwork,
} from "#shared/contracts/artworks.ts";
import { firstChoices, type TraceChoices } from "#shared/tracing/trace-choices.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildJob } from "../support/factories/job.ts";
import { artworksPath, buildArtwork, buildWorld, formWith, type World } from "../support/factories/work.ts";
import { jpegOf, paintedPicture, pngDensity, pngOf } from "../support/pictures.ts";

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

/** 400 by 200 px: a gold disc of 60 px radius and an ink square of 100 px on white. */
const logo = paintedPicture(400, 200, (x, y) => {
  if (Math.hypot(x - 100, y - 100) < 60) return "#C8992F";
  return x > 250 && x < 350 && y > 50 && y < 150 ? "#27314F" : "#FFFFFF";
});

async function bringIn(own: World, name: string, content: Uint8Array<ArrayBuffer>, type: string): Promise<ArtworkView> {
  const { text } = await own.visitors.maker.send("POST", artworksPath(own), { body: formWith(name, content, type) });
  const added = artworkSchema.parse(JSON.parse(text));
  await app.runJobs();
  return own.visitors.rep.get(getArtwork, { params: { ...own.params, artworkId: added.id } });
}
const choices = (changed: Partial<TraceChoices> = {}): TraceChoices => ({ ...firstChoices, ...changed });
const colours = ({ colours: all }: ArtworkView) => all.map(({ colour, pieces }) => [colour, pieces]);

describe("a picture brought in", () => {
  it("is traced as a PNG, with the size its density gives and the paper left out", async () => {
    const own = await buildJob(world);
    const png = pngOf(logo, [pngDensity(10_000)]);
    const ready = await bringIn(own, "logo.svg", png, "image/svg+xml");
    expect(ready).toMatchObject({ state: "ready", widthMm: 40, heightMm: 20, refusal: null });
    expect(colours(ready)).toEqual([
      ["#C8992F", 1],
      ["#27314F", 1],
    ]);
    expect(ready.warnings.map(({ code }) => code)).toEqual(["size.from-density", "picture.paper-dropped"]);
    expect(ready.trace).toMatchObject({
      record: { choices: firstChoices, widthPx: 400, heightPx: 200, tracedWidthPx: 400 },
      asked: null,
      failure: null,
    });
    expect(ready.can).toEqual({ change: false, remove: false, trace: false });
    const params = { ...own.params, artworkId: ready.id };
    const { headers } = await own.visitors.rep.ask(getArtworkFile, { params });
    expect(headers.get("content-type")).toBe("image/png");
    const { pieces } = await own.visitors.rep.get(getArtworkPieces, { params });
    // A disc of 6 mm radius and a square of 10 mm.
    expect(Math.abs((pieces[0]?.areaMm2 ?? 0) / 113.097 - 1)).toBeLessThan(0.005);
    expect(pieces[1]?.areaMm2).toBeCloseTo(100, 1);
  });

  it("is traced as a JPEG, with its colours near what they were", async () => {
    const own = await buildJob(world);
    const ready = await bringIn(own, "logo.jpg", await jpegOf(logo), "image/jpeg");
    expect(ready).toMatchObject({ state: "ready", widthMm: 300, heightMm: 150 });
    expect(ready.colours.map(({ pieces }) => pieces)).toEqual([1, 1]);
    expect(ready.warnings.map(({ code }) => code)).toContain("size.of-picture");
    expect(Math.abs((ready.colours[1]?.areaMm2 ?? 0) / 5625 - 1)).toBeLessThan(0.01);
  });
});

describe("tracing again", () => {
  it("keeps the pieces until it is done, then has new ones at the same true size", async () => {
    const own = await buildJob(world);
    const first = await bringIn(own, "logo.png", pngOf(logo), "image/png");
    const params = { ...own.params, artworkId: first.id };
    const { maker, rep } = own.visitors;
    await maker.get(setTrueSize, { params, body: { side: "width", lengthMm: 800 } });
    const asked = choices({ background: "kept", joined: [{ from: "#27314F", into: "#C8992F" }] });
    const under = await maker.get(traceArtwork, { params, body: asked });
    expect(under).toMatchObject({ state: "ready", trace: { asked }, can: { trace: true } });
    expect(colours(under)).toEqual(colours(first));
    expect(await app.queuedJobs()).toMatchObject([{ task: "import-artwork", payload: { artworkId: first.id } }]);
    await app.runJobs();
    const again = await rep.get(getArtwork, { params });
    expect(again).toMatchObject({ widthMm: 800, trace: { asked: null, failure: null, record: { choices: asked } } });
    expect(colours(again)).toEqual([
      ["#FFFFFF", 1],
      ["#C8992F", 2],
    ]);
  });

  it("goes back to the last good trace when the choices leave nothing, and says why", async () => {
    const own = await buildJob(world);
    const first = await bringIn(own, "logo.png", pngOf(logo), "image/png");
    const params = { ...own.params, artworkId: first.id };
    await own.visitors.maker.get(traceArtwork, { params, body: choices({ dropped: ["#27314F", "#C8992F"] }) });
    await app.runJobs();
    const kept = await own.visitors.rep.get(getArtwork, { params });
    expect(kept).toMatchObject({ state: "ready", trace: { asked: null, failure: { code: "picture.nothing-left" } } });
    expect(colours(kept)).toEqual(colours(first));
    expect(kept.trace?.record?.choices).toEqual(firstChoices);
    // Asking again takes the complaint away.
    const again = await own.visitors.maker.get(traceArtwork, { params, body: choices() });
    expect(again.trace?.failure).toBeNull();
    await app.runJobs();
  });

  it("changes nothing once it was given up, and only the newest asking counts", async () => {
    const own = await buildJob(world);
    const first = await bringIn(own, "logo.png", pngOf(logo), "image/png");
    const params = { ...own.params, artworkId: first.id };
    const { maker } = own.visitors;
    await maker.get(traceArtwork, { params, body: choices({ background: "kept" }) });
    expect((await maker.get(cancelTrace, { params })).trace?.asked).toBeNull();
    await app.runJobs();
    expect(colours(await maker.get(getArtwork, { params }))).toEqual(colours(first));
    await maker.get(traceArtwork, { params, body: choices({ background: "kept" }) });
    await maker.get(traceArtwork, { params, body: choices({ dropped: ["#C8992F"] }) });
    await app.runJobs();
    expect(colours(await maker.get(getArtwork, { params }))).toEqual([["#27314F", 1]]);
  });

  it("can mend a picture whose first trace left nothing", async () => {
    const own = await buildJob(world);
    const faint = paintedPicture(60, 60, (x, y) => (x % 20 < 3 && y % 20 < 3 ? "#27314F" : "#00000000"), 1);
    const refused = await bringIn(own, "dot.png", pngOf(faint), "image/png");
    expect(refused).toMatchObject({ state: "refused", refusal: { code: "picture.nothing-left" } });
    const params = { ...own.params, artworkId: refused.id };
    await own.visitors.maker.get(traceArtwork, { params, body: choices({ speckle: 0 }) });
    await app.runJobs();
    expect(await own.visitors.rep.get(getArtwork, { params })).toMatchObject({ state: "ready", refusal: null });
  });

  it("is refused for a drawing, for a picture not traced yet, and for choices that make no sense", async () => {
    const own = await buildJob(world);
    const { maker } = own.visitors;
    const drawing = await buildArtwork(app, own);
    const ofDrawing = { ...own.params, artworkId: drawing.id };
    expect((await maker.refusal(traceArtwork, { params: ofDrawing, body: choices() })).code).toBe("wrong_state");
    expect((await maker.get(getArtwork, { params: ofDrawing })).trace).toBeNull();
    const { text } = await maker.send("POST", artworksPath(own), { body: formWith("a.png", pngOf(logo), "image/png") });
    const params = { ...own.params, artworkId: artworkSchema.parse(JSON.parse(text)).id };
    expect((await maker.refusal(traceArtwork, { params, body: choices() })).code).toBe("wrong_state");
    await app.runJobs();
    const problem = await maker.refusal(traceArtwork, {
      params,
      body: { ...choices(), colours: 25, dropped: ["red"] },
    });
    expect(problem).toMatchObject({ status: 422, code: "validation_failed" });
    expect(problem.errors?.map(({ pointer }) => pointer)).toEqual(["/colours", "/dropped/0"]);
    expect((await Artwork.findByPk(params.artworkId, { rejectOnEmpty: true })).traceAsked).toBeNull();
  });

  it("is nothing another shop can ask for", async () => {
    const own = await buildJob(world);
    const first = await bringIn(own, "logo.png", pngOf(logo), "image/png");
    const other = await buildWorld(app);
    const params = { ...other.params, artworkId: first.id };
    const { owner } = other.visitors;
    expect(await owner.refusal(traceArtwork, { params, body: choices() })).toMatchObject({ status: 404 });
    expect(await owner.refusal(cancelTrace, { params })).toMatchObject({ status: 404 });
  });
});
