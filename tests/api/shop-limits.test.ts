import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { Job } from "#server/models/job.ts";
import { Revision } from "#server/models/revision.ts";
import { ShopLimits } from "#server/models/shop-limits.ts";
import { presentEvent } from "#server/presenters/event.ts";
import { changeLimits, getLimits, limitSetSchema } from "#shared/contracts/limits.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { issueRevision } from "#shared/contracts/revisions.ts";
import { defaultLimits, type Limits } from "#shared/dry-fit/limits.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildWorld, type World } from "../support/factories/work.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

const but = (changes: Partial<Limits>): Limits => ({ ...defaultLimits, ...changes });
const body = (version: number, changes: Partial<Limits> = {}) => ({ version, limits: but(changes) });
const logOf = (shopId: string) => Event.findAll({ where: { shopId, kind: "limits changed" }, order: ["id"] });

describe("the limits of a shop", () => {
  it("are the defaults until an owner sets others, and only what differs is kept", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    expect(await visitors.maker.get(getLimits, { params })).toEqual({
      version: 0,
      limits: defaultLimits,
      savedAt: null,
      savedBy: null,
      can: { change: false },
    });
    const saved = await visitors.owner.get(changeLimits, { params, body: body(0, { coverMm: 1.5, bedWidthMm: 1220 }) });
    expect(saved).toMatchObject({
      version: 1,
      limits: but({ coverMm: 1.5, bedWidthMm: 1220 }),
      savedBy: owner.person.name,
      can: { change: true },
    });
    expect(await visitors.rep.get(getLimits, { params })).toEqual({ ...saved, can: { change: false } });
    expect(await ShopLimits.findByPk(owner.shop.id)).toMatchObject({
      version: 1,
      own: { coverMm: 1.5, bedWidthMm: 1220 },
    });
    const back = await visitors.owner.get(changeLimits, { params, body: body(1, { coverMm: 1.5 }) });
    expect(back).toMatchObject({ version: 2, limits: but({ coverMm: 1.5 }) });
    expect(await ShopLimits.findByPk(owner.shop.id)).toMatchObject({ own: { coverMm: 1.5 } });
  });

  it("are one shop's and not another's", async () => {
    const [mine, other] = [await buildWorld(app), await buildWorld(app)];
    await mine.visitors.owner.get(changeLimits, { params: mine.params, body: body(0, { reachMm: 12 }) });
    expect((await other.visitors.owner.get(getLimits, { params: other.params })).limits.reachMm).toBe(10);
    const refusal = await other.visitors.owner.refusal(changeLimits, { params: mine.params, body: body(1) });
    expect(refusal.code).toBe("not_found");
  });

  it("stand in the log with what they were and became; saving them unchanged is nothing new", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    await visitors.owner.get(changeLimits, { params, body: body(0, { unsupportedStop: 0.25, placingErrorMm: 0.3 }) });
    const again = await visitors.owner.get(changeLimits, {
      params,
      body: body(1, { unsupportedStop: 0.25, placingErrorMm: 0.3 }),
    });
    expect(again.version).toBe(1);
    const [event, ...more] = await logOf(owner.shop.id);
    expect(more).toEqual([]);
    expect(event?.data).toEqual({
      changes: [
        { limit: "unsupportedStop", from: 0.3, to: 0.25 },
        { limit: "placingErrorMm", from: 0.5, to: 0.3 },
      ],
    });
    expect(event && presentEvent(event).text).toBe(
      "Changed limits of the dry fit: Area off its support, for a stop from 30 % to 25 %; Placing error of a hole, a side from 0.5 mm to 0.3 mm",
    );
  });

  it("are read by staff and set by an owner; a client knows nothing of them", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    for (const visitor of [visitors.maker, visitors.rep]) {
      const refusal = await visitor.refusal(changeLimits, { params, body: body(0, { coverMm: 3 }) });
      expect(refusal).toMatchObject({
        status: 403,
        code: "not_allowed",
        detail: "Only an owner sets the shop's limits.",
      });
    }
    expect((await visitors.approver.refusal(getLimits, { params })).code).toBe("not_found");
    expect((await visitors.approver.refusal(changeLimits, { params, body: body(0) })).code).toBe("not_found");
    expect(await ShopLimits.count({ where: { shopId: owner.shop.id } })).toBe(0);
  });

  it("are refused with every fault: out of bounds, unknown, left out, crossed", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    const refused = async (limits: Record<string, unknown>) => {
      const { status, text } = await visitors.owner.send("PUT", `/api/shops/${params.shop}/limits`, {
        body: { version: 0, limits },
      });
      expect(status).toBe(422);
      return (JSON.parse(text) as { errors: { pointer: string; detail: string }[] }).errors;
    };
    const outside = await refused({ ...defaultLimits, coverMm: -1, bedWidthMm: 0, unsupportedStop: 1.01 });
    expect(outside.map(({ pointer }) => pointer).toSorted()).toEqual([
      "/limits/bedWidthMm",
      "/limits/coverMm",
      "/limits/unsupportedStop",
    ]);
    expect(await refused({ ...defaultLimits, luck: 7 })).toEqual([
      { pointer: "/limits/luck", detail: "This field is not known." },
    ]);
    const { reachMm: _, ...rest } = defaultLimits;
    expect((await refused(rest)).map(({ pointer }) => pointer)).toEqual(["/limits/reachMm"]);
    expect(await refused({ ...defaultLimits, unsupportedCaution: 0.4 })).toEqual([
      {
        pointer: "/limits/unsupportedCaution",
        detail: "Not over 30 %, which is “Area off its support, for a stop”.",
      },
    ]);
    expect(await ShopLimits.count({ where: { shopId: owner.shop.id } })).toBe(0);
  });

  it("that somebody else set meanwhile are not overwritten; the newer set comes with the refusal", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    const theirs = await visitors.owner.get(changeLimits, { params, body: body(0, { coverMm: 2 }) });
    for (const version of [0, 2, 9]) {
      const problem = await visitors.owner.refusal(changeLimits, { params, body: body(version, { coverMm: 3 }) });
      expect(problem).toMatchObject({ status: 409, code: "stale" });
      expect(limitSetSchema.parse(problem.extra?.newer)).toEqual(theirs);
    }
    expect(await ShopLimits.findByPk(owner.shop.id)).toMatchObject({ version: 1, own: { coverMm: 2 } });
  });

  it("that were kept by an older version and are no longer taken fall back one by one", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    await visitors.owner.get(changeLimits, { params, body: body(0, { coverMm: 2 }) });
    await ShopLimits.update(
      { own: { coverMm: -4, placingErrorMm: 0.75, softness: 3 } },
      { where: { shopId: owner.shop.id } },
    );
    const { limits } = await visitors.owner.get(getLimits, { params });
    expect(limits).toEqual(but({ placingErrorMm: 0.75 }));
    await visitors.owner.get(changeLimits, { params, body: { version: 1, limits: { ...limits, reachMm: 11 } } });
    expect((await ShopLimits.findByPk(owner.shop.id))?.own).toEqual({ placingErrorMm: 0.75, reachMm: 11 });
  });
});

describe("issuing", () => {
  /** A bar of 100 mm on a plate whose edge it overhangs by 20. */
  const overhanging = () =>
    buildSign([
      buildLayer("B", [plate("under", 200, 100, [200, 200])]),
      buildLayer("C", [plate("over", 100, 40, [270, 200])]),
    ]);

  async function tryToIssue(world: World) {
    const own = await buildJob(world);
    const params = { ...own.params, jobId: own.job.id };
    const { version } = await own.visitors.maker.get(getMockup, { params });
    const saved = await own.visitors.maker.get(saveMockup, { params, body: { version, document: overhanging() } });
    const answer = await own.visitors.maker.ask(issueRevision, { params, body: { mockupVersion: saved.version } });
    return { answer, jobId: own.job.id };
  }

  it("refuses by the shop's own limits, and lets pass what they let pass", async () => {
    const world = await buildWorld(app);
    // The bar reaches from 220 to 320 and its plate ends at 300: a fifth of it hangs over, under the default of 30 %.
    const before = await tryToIssue(world);
    expect(before.answer.status).toBe(202);
    await world.visitors.owner.get(changeLimits, { params: world.params, body: body(0, { unsupportedStop: 0.15 }) });
    const stricter = await tryToIssue(world);
    expect(stricter.answer.status).toBe(409);
    expect(JSON.parse(stricter.answer.text)).toMatchObject({
      code: "dry_fit_stops",
      extra: { findings: [{ rule: 1, pieceIds: ["over"], value: 20, limit: 15 }] },
    });
    expect(await Revision.count({ where: { jobId: stricter.jobId } })).toBe(0);
    expect(await Job.findByPk(stricter.jobId)).toMatchObject({ state: "mockup" });
    await world.visitors.owner.get(changeLimits, { params: world.params, body: body(1, { unsupportedStop: 0.2 }) });
    const after = await tryToIssue(world);
    expect(after.answer.status).toBe(202);
  });
});
