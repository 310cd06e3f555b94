import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { compareRevisions, withdrawRevision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildJob } from "../support/factories/job.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { signInByMail } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
let a: string;
let b: string;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  a = await issue(world, 90);
  b = await issue(world, 95);
});
afterAll(() => app.stop());

const issue = async (own: World, width: number, finished = true): Promise<string> =>
  (
    await buildRevision(app, own, {
      document: buildSign([buildLayer("B", [plate("p1", width, 40, [200, 200])])]),
      finished,
    })
  ).id;
const of = ({ params, job }: World) => ({ ...params, jobId: job.id });

describe("comparing two revisions", () => {
  it("gives both pictures as they were frozen and every change in words", async () => {
    const { approver, rep } = world.visitors;
    const compared = await approver.get(compareRevisions, { params: of(world), query: { before: a, after: b } });
    expect([compared.before.revision.letter, compared.after.revision.letter]).toEqual(["A", "B"]);
    expect([compared.before.revision.state, compared.after.revision.state]).toEqual(["superseded", "issued"]);
    expect(compared.changes.map(({ text }) => text)).toEqual(["B, Layer B: 1 piece redrawn"]);
    expect(JSON.stringify(compared.before.elevation)).not.toBe(JSON.stringify(compared.after.elevation));
    const back = await rep.get(compareRevisions, { params: of(world), query: { before: b, after: a } });
    expect(back.before.elevation).toEqual(compared.after.elevation);
    const same = await rep.get(compareRevisions, { params: of(world), query: { before: a, after: a } });
    expect(same.changes).toEqual([]);
  });

  it("names every bad parameter", async () => {
    const problem = await world.visitors.approver.refusal(compareRevisions, {
      params: of(world),
      query: { before: "A", unit: "in" } as never,
    });
    expect(problem.errors?.map(({ pointer }) => pointer).sort()).toEqual(["/after", "/before", "/unit"]);
  });

  it("finds nothing across jobs, shops, clients or without a session", async () => {
    const other = await buildJob(world);
    const foreign = await issue(other, 90);
    const { owner } = world.visitors;
    for (const [params, query] of [
      [of(world), { before: a, after: foreign }],
      [of(other), { before: a, after: b }],
    ] as const)
      expect((await owner.refusal(compareRevisions, { params, query })).code).toBe("not_found");
    const query = { before: a, after: b };
    const stranger = await signInByMail(
      app,
      await buildContact({ client: await buildClient({ shop: world.owner.shop }) }),
    );
    expect((await stranger.refusal(compareRevisions, { params: of(world), query })).code).toBe("not_found");
    expect((await app.visitor().refusal(compareRevisions, { params: of(world), query })).code).toBe("not_signed_in");
  });

  it("is for staff also with what is still on their table, which the client does not learn of", async () => {
    const c = await issue(world, 100, false);
    const given = { params: of(world), query: { before: b, after: c } };
    const staff = await world.visitors.maker.get(compareRevisions, given);
    expect(staff.after.revision).toMatchObject({ letter: "C", state: "preparing" });
    expect((await world.visitors.approver.refusal(compareRevisions, given)).code).toBe("not_found");
    await app.runJobs();
    await world.visitors.approver.get(compareRevisions, given);
    await world.visitors.owner.get(withdrawRevision, {
      params: { ...world.params, revisionId: c },
      body: { reason: "Too wide" },
    });
    expect((await world.visitors.approver.refusal(compareRevisions, given)).code).toBe("not_found");
  });
});
