import { afterAll, beforeAll, expect, it } from "vitest";
import { cursorOf } from "#server/queries/page.ts";
import { listArtworks } from "#shared/contracts/artworks.ts";
import { listClients } from "#shared/contracts/clients.ts";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { listEvents, listJobs } from "#shared/contracts/jobs.ts";
import { listNotes } from "#shared/contracts/notes.ts";
import { listJobMails, listOutgoingMail } from "#shared/contracts/outgoing-mail.ts";
import { listPortfolioPieces, listShareLinks } from "#shared/contracts/portfolio.ts";
import { listRevisions } from "#shared/contracts/revisions.ts";
import { listInvitations, listMembers } from "#shared/contracts/shop.ts";
import { listStock } from "#shared/contracts/stock.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";

let app: TestApp;
let world: World;
let revisionId: string;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  const document = buildSign([buildLayer("B", [plate("p1", 90, 40, [200, 200])])]);
  revisionId = (await buildRevision(app, world, { document })).id;
});
afterAll(() => app.stop());

const lists: { list: string; endpoint: Endpoint; query?: Record<string, string> }[] = [
  { list: "jobs by due day", endpoint: listJobs },
  { list: "jobs by number", endpoint: listJobs, query: { sort: "number" } },
  { list: "newest jobs", endpoint: listJobs, query: { sort: "newest" } },
  { list: "events", endpoint: listEvents },
  { list: "artwork", endpoint: listArtworks },
  { list: "revisions", endpoint: listRevisions },
  { list: "notes", endpoint: listNotes },
  { list: "portfolio pieces", endpoint: listPortfolioPieces },
  { list: "portfolio links", endpoint: listShareLinks },
  { list: "clients", endpoint: listClients },
  { list: "stock", endpoint: listStock },
  { list: "members", endpoint: listMembers },
  { list: "invitations", endpoint: listInvitations },
  { list: "outgoing mail", endpoint: listOutgoingMail },
  { list: "mail of a job", endpoint: listJobMails },
];

const someId = "6a0f3c52-6a0e-4c11-9d37-0f2a54f1f001";
const forged: (readonly unknown[])[] = [
  [],
  [null],
  [null, null],
  [null, null, null],
  [{ $gt: 0 }],
  [["a"]],
  ["now", someId],
  ["2030-01-01", someId],
  ["0000-01-01T00:00:00Z", someId],
  ["2030-01-01T00:00:00Z", "no-id"],
  ["2030-01-01T00:00:00Z", someId, someId],
  [0, "tomorrow", someId],
  [0, "0000-01-01", someId],
  ["0", "2030-01-01", someId],
  [0.5, "2030-01-01", someId],
  [1e300, "2030-01-01", someId],
  [-1],
  [1e300],
  ["99999999999999999999"],
  ["-1"],
  ["1; drop table jobs"],
  ["'", "'", "'"],
];
const asSent = (values: readonly unknown[]): string => cursorOf(values as never);

it.each(lists)("$list begin nowhere that a forged cursor names", async ({ list, endpoint, query = {} }) => {
  const params = { ...world.params, jobId: world.job.id, revisionId };
  const given = Object.fromEntries(
    Object.entries(params).filter(([name]) => endpoint.path.includes(`:${name}`)),
  ) as never;
  const ask = (cursor: string) =>
    world.visitors.owner.ask(endpoint, { params: given, query: { ...query, cursor } as never });
  let refused = 0;
  for (const cursor of ["", "???", "bnVsbA", "WzFd", "x".repeat(300), ...forged.map(asSent)]) {
    const { status, text } = await ask(cursor);
    // A cursor may fit another list by chance; then it is a place like any other. It is never a failure of ours.
    expect([200, 400], `${list}: ${cursor} ${text}`).toContain(status);
    if (status === 400) {
      expect(JSON.parse(text)).toMatchObject({ code: "malformed_request" });
      refused += 1;
    }
  }
  expect(refused).toBeGreaterThanOrEqual(forged.length);
  const tooLong = await ask("x".repeat(401));
  expect(JSON.parse(tooLong.text)).toMatchObject({ code: "validation_failed", errors: [{ pointer: "/cursor" }] });
});
