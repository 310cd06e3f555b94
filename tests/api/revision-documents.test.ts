import { afterAll, beforeAll, expect, it } from "vitest";
import { getRevisionDocument } from "#shared/contracts/revision-documents.ts";
import { documentVersion } from "#shared/mockup/document.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";

const document = buildSign([buildLayer("B", [plate("disc plate", 210, 90, [200, 200])])]);

let app: TestApp;
let world: World;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
});
afterAll(() => app.stop());

it("hands the shop the mockup that a revision froze, and a client nothing of it", async () => {
  const { id } = await buildRevision(app, world, { document });
  const params = { ...world.params, revisionId: id };
  for (const who of ["owner", "maker", "rep"] as const) {
    const answer = await world.visitors[who].get(getRevisionDocument, { params });
    expect(answer).toEqual({ revisionId: id, letter: "A", state: "issued", document });
    expect(answer.document.version).toBe(documentVersion);
  }
  expect((await world.visitors.approver.refusal(getRevisionDocument, { params })).code).toBe("not_found");
});
