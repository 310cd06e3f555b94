import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { artworkSchema } from "#shared/contracts/artworks.ts";
import { changeJob } from "#shared/contracts/jobs.ts";
import { listStock } from "#shared/contracts/stock.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { artworksPath, buildWorld, formWith, plainSvg, type World } from "../support/factories/work.ts";
import { holdJob } from "../support/hold-job.ts";

let app: TestApp;
let world: World;
let others: World;
beforeAll(async () => {
  // Two more connections than one shop may take.
  app = await startTestApp({ poolMax: 6 });
  world = await buildWorld(app);
  others = await buildWorld(app);
});
afterAll(() => app.stop());

describe("a shop that asks for much at once", () => {
  it("leaves the other shops their connections, and is told in words when it waits too long", async () => {
    const hold = await holdJob(app.database, world.job.id);
    const params = { ...world.params, jobId: world.job.id };
    const answers = Array.from({ length: 12 }, (_, index) =>
      world.visitors.owner.ask(changeJob, { params, body: { title: `Lobby sign ${index}` } }),
    );
    await hold.waiters(4);
    const read = await others.visitors.owner.get(listStock, { params: others.params });
    expect(read.items.length).toBeGreaterThan(0);
    const early = await Promise.race(answers);
    expect(early.status).toBe(429);
    expect(JSON.parse(early.text)).toMatchObject({
      code: "too_many_requests",
      detail: "This is being worked on right now, and that takes long. Try again in a minute; nothing is lost.",
    });
    await hold.release();
    const statuses = (await Promise.all(answers)).map(({ status }) => status);
    expect(new Set(statuses)).toEqual(new Set([200, 429]));
  }, 60_000);
});

describe("a shop that brings in much at once", () => {
  it("keeps no other shop waiting for all of it", async () => {
    const bring = async (own: World, name: string): Promise<string> => {
      const body = formWith(name, plainSvg());
      const { text } = await own.visitors.maker.send("POST", artworksPath(own), { body });
      return artworkSchema.parse(JSON.parse(text)).id;
    };
    const many: string[] = [];
    for (const name of ["1.svg", "2.svg", "3.svg", "4.svg"]) many.push(await bring(world, name));
    const one = await bring(others, "logo.svg");
    await app.runJobs();
    const lines = app.logged.map((line) => JSON.parse(line) as { task?: string; payload?: { artworkId?: string } });
    const done = lines.filter(({ task }) => task === "import-artwork").map(({ payload }) => payload?.artworkId);
    expect(done).toEqual([many[0], one, ...many.slice(1)]);
  });
});

describe("a mockup of nothing but faults", () => {
  const put = (document: unknown) =>
    world.visitors.owner.send("PUT", `/api/shops/${world.params.shop}/jobs/${world.job.id}/mockup`, {
      body: { version: 0, document },
    });

  it.each([
    { what: "segments", path: Array.from({ length: 20 }, () => ({ start: {}, segments: Array(25_000).fill(0) })) },
    { what: "rings", path: Array(500_000).fill(0) },
    { what: "pieces", path: 0, times: 2000 },
  ])("is refused in words when those are its $what", async ({ path, times = 1 }) => {
    const { status, text } = await put({ layers: [{ pieces: Array(times).fill({ path }) }] });
    expect(status).toBe(422);
    expect(JSON.parse(text)).toMatchObject({
      code: "validation_failed",
      errors: [{ pointer: "/document", detail: "This is no mockup: its pieces can't be read." }],
    });
  });
});
