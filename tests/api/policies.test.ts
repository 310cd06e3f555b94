import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { ShareLink } from "#server/models/share-link.ts";
import { addArtwork } from "#shared/contracts/artworks.ts";
import type { ErrorCode } from "#shared/contracts/error-codes.ts";
import { problemSchema } from "#shared/contracts/errors.ts";
import { getJob, openJob } from "#shared/contracts/jobs.ts";
import { openShareLink } from "#shared/contracts/portfolio.ts";
import { addWallPhoto } from "#shared/contracts/wall-photos.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { formWith, plainSvg } from "../support/factories/work.ts";
import {
  type ActorName,
  actors,
  type PolicyRow,
  policyTable,
  routeName,
  type Verdict,
} from "../support/policy-table.ts";
import { buildPolicyWorld, type PolicyWorld } from "../support/policy-world.ts";
import type { Answer, Given } from "../support/visitor.ts";
import { pngOf, twoHalves } from "../support/wall-pictures.ts";

let app: TestApp;
let world: PolicyWorld;
let wall: Uint8Array<ArrayBuffer>;
beforeAll(async () => {
  wall = await pngOf(twoHalves(60, 40));
  app = await startTestApp();
  world = await buildPolicyWorld(app);
}, 120_000);
afterAll(() => app.stop());

const verdictOfCode: Partial<Record<ErrorCode, Verdict>> = { not_found: "-", not_allowed: "n", not_signed_in: "o" };

function verdictOf({ status, text }: Answer): Verdict {
  if (status < 400) return "y";
  return verdictOfCode[problemSchema.parse(JSON.parse(text)).code] ?? "y";
}

/** Asks as one actor. A file route gets a file, every other what its row says. */
function ask({ endpoint, given }: PolicyRow, actor: ActorName): Promise<Answer> {
  const visitor = world.askers[actor];
  if (endpoint === addArtwork || endpoint === addWallPhoto) {
    return visitor.send("POST", endpoint.path.replace(":shop", world.params.shop).replace(":jobId", world.jobId), {
      body: endpoint === addArtwork ? formWith("logo.svg", plainSvg()) : formWith("wall.png", wall, "image/png"),
    });
  }
  return visitor.ask(endpoint, (given?.(world) ?? {}) as Given<typeof endpoint>);
}

describe("who may do what", () => {
  it("names every route of the application, and no other", () => {
    const registered = app.registered.map(({ endpoint }) => routeName(endpoint)).sort();
    expect(policyTable.map(({ endpoint }) => routeName(endpoint)).sort()).toEqual(registered);
  });

  it.each(policyTable.map((row) => ({ row, name: routeName(row.endpoint) })))("$name", async ({ row }) => {
    const wanted = row.verdicts.split(" ");
    const answers: { actor: ActorName; verdict: Verdict; status: number; text: string }[] = [];
    // Those who may come last: what they do could take away what the others must be refused.
    const order = [...actors].sort(
      (a, b) => Number(wanted[actors.indexOf(a)] === "y") - Number(wanted[actors.indexOf(b)] === "y"),
    );
    for (const actor of order) {
      const answer = await ask(row, actor);
      answers.push({ actor, verdict: verdictOf(answer), status: answer.status, text: answer.text.slice(0, 300) });
    }
    const got = actors.map((actor) => answers.find((answer) => answer.actor === actor)?.verdict).join(" ");
    expect(got, JSON.stringify(answers, null, 1)).toBe(row.verdicts);
    // The first who may must really get through, or the row would only show that a request was wrong.
    const first = answers.find(({ verdict }) => verdict === "y");
    const throughAnyway = row.endpoint.path === "/api/account/password";
    if (first && !throughAnyway) expect(first.status, first.text).toBeLessThan(400);
  });
});

describe("a guest with a portfolio link", () => {
  it("sees the pieces while it is live, and is told kindly when it is not", async () => {
    const guest = app.visitor();
    const shown = await guest.get(openShareLink, { params: { token: world.liveShareToken } });
    expect(shown.pieces.map(({ title }) => title)).toEqual(["To show"]);
    await ShareLink.update({ expiresAt: new Date(Date.now() - 1000) }, { where: {} });
    expect((await guest.refusal(openShareLink, { params: { token: world.liveShareToken } })).code).toBe("link_expired");
    await ShareLink.update({ expiresAt: new Date(Date.now() + 60_000), revokedAt: new Date() }, { where: {} });
    expect((await guest.refusal(openShareLink, { params: { token: world.liveShareToken } })).code).toBe("link_expired");
    expect((await guest.refusal(openShareLink, { params: { token: "B".repeat(43) } })).code).toBe("not_found");
  });
});

describe("a job of which nothing was issued", () => {
  it("is not there for its client", async () => {
    const opened = await world.askers.owner.get(openJob, {
      params: world.params,
      body: { clientId: world.clientId, title: "Quiet" },
    });
    const params = { ...world.params, jobId: opened.id };
    expect((await world.askers.approver.refusal(getJob, { params })).code).toBe("not_found");
    expect((await world.askers.rep.get(getJob, { params })).title).toBe("Quiet");
  });
});
