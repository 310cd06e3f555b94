import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { ShopSaws } from "#server/models/shop-saws.ts";
import { presentEvent } from "#server/presenters/event.ts";
import { changeSaws, getSaws, sawSetSchema } from "#shared/contracts/saws.ts";
import { type ShopSaws as Saws, usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildWorld } from "../support/factories/work.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

const body = (version: number, changes: Partial<Saws> = {}) => ({ version, saws: { ...usualSaws, ...changes } });

describe("how a shop cuts", () => {
  it("is the usual way until a maker states another, and only what differs is kept", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    expect(await visitors.rep.get(getSaws, { params })).toEqual({
      version: 0,
      saws: usualSaws,
      savedAt: null,
      savedBy: null,
      can: { change: false },
    });
    const saved = await visitors.maker.get(changeSaws, {
      params,
      body: body(0, { sawKerfMm: 2.2, rejectShare: 0.15 }),
    });
    expect(saved).toMatchObject({ version: 1, saws: { sawKerfMm: 2.2, rejectShare: 0.15 }, can: { change: true } });
    expect(await ShopSaws.findByPk(owner.shop.id)).toMatchObject({ own: { sawKerfMm: 2.2, rejectShare: 0.15 } });
    const again = await visitors.owner.get(changeSaws, {
      params,
      body: body(1, { sawKerfMm: 2.2, rejectShare: 0.15 }),
    });
    expect(again.version).toBe(1);
    const [event, ...more] = await Event.findAll({ where: { shopId: owner.shop.id, kind: "saws changed" } });
    expect(more).toEqual([]);
    expect(event && presentEvent(event).text).toBe(
      "Changed how the shop cuts: Kerf of the saw from 3 mm to 2.2 mm; Share lost to knots from 10 % to 15 %",
    );
  });

  it("is changed by owners and makers; a rep may look, a client knows nothing of it", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    expect(await visitors.rep.refusal(changeSaws, { params, body: body(0, { sawKerfMm: 4 }) })).toMatchObject({
      status: 403,
      detail: "Owners and makers say how the shop cuts.",
    });
    expect((await visitors.approver.refusal(getSaws, { params })).code).toBe("not_found");
    expect((await visitors.approver.refusal(changeSaws, { params, body: body(0) })).code).toBe("not_found");
    const other = await buildWorld(app);
    expect((await other.visitors.owner.refusal(getSaws, { params })).code).toBe("not_found");
    expect(await ShopSaws.count({ where: { shopId: owner.shop.id } })).toBe(0);
  });

  it("is refused with every fault", async () => {
    const { params, visitors } = await buildWorld(app);
    const { sawKerfMm: _, ...rest } = usualSaws;
    const { status, text } = await visitors.maker.send("PUT", `/api/shops/${params.shop}/saws`, {
      body: { version: 0, saws: { ...rest, rejectShare: 0.95, barLengthMm: 0, luck: 7 } },
    });
    expect(status).toBe(422);
    const { errors } = JSON.parse(text) as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer).toSorted()).toEqual([
      "/saws/barLengthMm",
      "/saws/luck",
      "/saws/rejectShare",
      "/saws/sawKerfMm",
    ]);
  });

  it("that somebody else changed meanwhile is not overwritten; the newer set comes with the refusal", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    const theirs = await visitors.owner.get(changeSaws, { params, body: body(0, { squaringMm: 12 }) });
    const problem = await visitors.maker.refusal(changeSaws, { params, body: body(0, { squaringMm: 20 }) });
    expect(problem).toMatchObject({ status: 409, code: "stale" });
    expect(sawSetSchema.parse(problem.extra?.newer)).toEqual(theirs);
    expect(await ShopSaws.findByPk(owner.shop.id)).toMatchObject({ version: 1, own: { squaringMm: 12 } });
  });
});
