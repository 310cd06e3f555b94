import { afterAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { checkDrawing, drawProof, freezeDrawing, stopDrawing } from "#server/drawing/draw.ts";
import type { FreezeInput } from "#server/drawing/drawing-worker.ts";
import { canonicalJson } from "#server/files/canonical-json.ts";
import { sha256Hex } from "#server/files/sha256.ts";
import { renderProof } from "#server/pdf/proof.ts";
import { buildSnapshot } from "#shared/drawing/build-snapshot.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { buildLayer, buildSign, plate } from "../../../support/build-sign.ts";
import { orreryTitleBlock } from "../../../support/orrery-books.ts";

afterAll(stopDrawing);

const inputOf = (width: number): FreezeInput => ({
  titleBlock: orreryTitleBlock,
  document: buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]),
  notes: [],
  words: "",
  limits: defaultLimits,
  dryFit: usualContext,
  setAsides: [],
  paper: "A3",
  artworkHashes: {},
  fontHashes: {},
});
const frozenHere = async (input: FreezeInput): Promise<string> =>
  canonicalJson(buildSnapshot({ ...input, kernel: await loadKernel() }));

describe("freezing in a thread of its own", () => {
  it("gives the very text that this thread would, and leaves this one free meanwhile", async () => {
    let turns = 0;
    let done = false;
    const turn = (): void => {
      turns += 1;
      if (!done) setTimeout(turn, 1);
    };
    turn();
    const { text, sha256, stops } = await freezeDrawing(inputOf(90)).finally(() => {
      done = true;
    });
    // Computed in this thread it would be none between the two lines.
    expect(turns).toBeGreaterThan(5);
    expect(text).toBe(await frozenHere(inputOf(90)));
    expect(sha256).toBe(sha256Hex(text));
    expect(stops).toEqual([]);
  });

  it("tells the stops of the dry fit", async () => {
    const { stops } = await freezeDrawing(inputOf(5000));
    expect(stops.map(({ severity }) => severity)).toContain("stop");
  });

  it("freezes what was set aside with its reason, is stopped by it no more, and draws it on no sheet", async () => {
    // A stop that concerns the client, so that the sheets would letter it.
    const asked = inputOf(5000);
    const outside = { ...asked, dryFit: { ...asked.dryFit, place: "outside" as const } };
    const { stops } = await freezeDrawing(outside);
    const reason = "The client wants it to hang over";
    const setAsides = stops.map((finding) => ({
      finding,
      reason,
      by: "p",
      name: "Ada Maker",
      at: "2026-12-01T09:00:00Z",
    }));
    const elsewhere = setAsides.map((one) => ({ ...one, finding: { ...one.finding, layerKey: "Z" } }));
    const frozen = await freezeDrawing({ ...outside, setAsides: [...elsewhere, ...setAsides] });
    expect(frozen.stops).toEqual([]);
    const snapshot = JSON.parse(frozen.text) as Snapshot;
    expect(snapshot.setAside).toEqual(JSON.parse(JSON.stringify(setAsides)));
    expect(snapshot.findings).toEqual(expect.arrayContaining([...stops]));
    const drawn = JSON.stringify(snapshot.drawing);
    expect(JSON.stringify((JSON.parse((await freezeDrawing(outside)).text) as Snapshot).drawing)).toContain("Stop:");
    for (const word of ["Stop:", reason, "Ada Maker"]) expect(drawn).not.toContain(word);
  });

  it("works the dry fit out alone, and finds what freezing finds", async () => {
    const { dryFit: context, document, limits } = inputOf(5000);
    const findings = await checkDrawing({ document, limits, context });
    expect(findings).toEqual((JSON.parse((await freezeDrawing(inputOf(5000))).text) as Snapshot).findings);
    expect(findings.length).toBeGreaterThan(0);
  });

  it("refuses in words what reaches farther than geometry can be computed", async () => {
    const placement = { x: 0, y: 0, turn: 13, scale: 1000, mirrored: false };
    const document = buildSign([buildLayer("B", [plate("p1", 9000, 9000, [0, 0], { placement })])]);
    await expect(freezeDrawing({ ...inputOf(90), document })).rejects.toMatchObject({ code: "wrong_state" });
  });

  it("is given up in words when it takes too long, and the next one is drawn", async () => {
    await expect(freezeDrawing(inputOf(91), { timeMs: 1 })).rejects.toMatchObject({ code: "too_large" });
    expect((await freezeDrawing(inputOf(92))).text).toContain('"p1"');
  });

  it("lets three wait and sends the fourth away", async () => {
    const asked = [93, 94, 95].map((width) => freezeDrawing(inputOf(width)));
    await expect(freezeDrawing(inputOf(96))).rejects.toMatchObject({ code: "too_many_requests" });
    const texts = (await Promise.all(asked)).map(({ text }) => text);
    expect(new Set(texts).size).toBe(3);
    expect((await freezeDrawing(inputOf(96))).text).toContain('"p1"');
  });

  it("lets two of one shop wait, so that another shop still finds a place", async () => {
    const asked = [93, 94].map((width) => freezeDrawing(inputOf(width), { shopId: "a" }));
    await expect(freezeDrawing(inputOf(95), { shopId: "a" })).rejects.toMatchObject({ code: "too_many_requests" });
    expect((await freezeDrawing(inputOf(96), { shopId: "b" })).text).toContain('"p1"');
    await Promise.all(asked);
    expect((await freezeDrawing(inputOf(95), { shopId: "a" })).text).toContain('"p1"');
  });
});

describe("drawing a proof in a thread of its own", () => {
  it("gives the very bytes that this thread would", async () => {
    const snapshot = buildSnapshot({ ...inputOf(90), kernel: await loadKernel() });
    const sha256 = "ab".repeat(32);
    expect(Buffer.from(await drawProof(snapshot, sha256)).equals(await renderProof(snapshot, sha256))).toBe(true);
  });

  it("fails for a snapshot that can't be drawn, and draws the next", async () => {
    const snapshot = buildSnapshot({ ...inputOf(90), kernel: await loadKernel() });
    const broken = { ...snapshot, titleBlock: { ...snapshot.titleBlock, date: "no day" } };
    await expect(drawProof(broken, "")).rejects.toThrow("The drawing broke");
    expect((await drawProof(snapshot, "")).subarray(0, 5)).toEqual(new Uint8Array(Buffer.from("%PDF-")));
  });
});
