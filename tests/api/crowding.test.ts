import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { changeJob } from "#shared/contracts/jobs.ts";
import { listStock } from "#shared/contracts/stock.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
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
