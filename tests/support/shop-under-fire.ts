import { stat } from "node:fs/promises";
import { join } from "node:path";
import { expect } from "vitest";
import { loadStandardStock } from "#server/commands/load-standard-stock.ts";
import { connect } from "#server/db/connection.ts";
import { sha256Hex } from "#server/files/sha256.ts";
import { initModels } from "#server/models/init-models.ts";
import { artworkSchema, getArtworkFile, listArtworks } from "#shared/contracts/artworks.ts";
import { changeJob, openJob } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { getProof, issueRevision, listRevisions, type Revision, revisionSchema } from "#shared/contracts/revisions.ts";
import { buildLayer, buildSign, plate } from "./build-sign.ts";
import { buildClient, buildContact } from "./factories/client.ts";
import { buildMember } from "./factories/member.ts";
import { testPassword } from "./factories/person.ts";
import { formWith } from "./factories/work.ts";
import type { KillableServer } from "./killable-server.ts";
import { popplerText } from "./poppler.ts";
import { runSql } from "./run-sql.ts";
import { type Answer, Visitor } from "./visitor.ts";

/** Long enough for the queue to take back what a killed process held. */
const patienceMs = 60_000;

/** One owner with one job on a server that is killed again and again, and the memory of what was acknowledged. */
export type ShopUnderFire = Awaited<ReturnType<typeof openShopUnderFire>>;

/** Fills the database from here and signs in at the running server. End it with `close`. */
export async function openShopUnderFire(server: KillableServer) {
  const sequelize = connect(server.database.ownerUrl, { poolMax: 1 });
  initModels(sequelize);
  const owner = await buildMember();
  await sequelize.transaction((transaction) =>
    loadStandardStock({ shopId: owner.shop.id, now: new Date(), transaction }),
  );
  const client = await buildClient({ shop: owner.shop });
  const approver = await buildContact({ client });
  const visitor = new Visitor(server.baseUrl);
  await visitor.signIn("password", { email: owner.email, password: testPassword });
  const params = { shop: owner.shop.slug };
  const { id: jobId } = await visitor.get(openJob, { params, body: { clientId: client.id, title: "Under fire" } });
  const jobParams = { ...params, jobId };
  await visitor.get(changeJob, { params: jobParams, body: { approverIds: [approver.contact.id] } });

  const acknowledged = { revisionIds: new Set<string>(), artworks: new Map<string, string>() };
  const whole = new Set<string>();
  const files = `/api/shops/${params.shop}/jobs/${jobId}/artworks`;

  /** Saves a sign of its own and issues it. Undefined when the server died before it answered. */
  async function issue(width: number): Promise<Revision | undefined> {
    const document = buildSign([buildLayer("B", [plate("p1", width, 40, [300, 200])])]);
    return answeredOrCut(async () => {
      const { version } = await visitor.get(getMockup, { params: jobParams });
      const saved = await visitor.get(saveMockup, { params: jobParams, body: { version, document } });
      const answer = await visitor.ask(issueRevision, { params: jobParams, body: { mockupVersion: saved.version } });
      if (answer.status !== 202) throw new Error(`Not issued: ${answer.status} ${answer.text}`);
      const revision = revisionSchema.parse(JSON.parse(answer.text));
      acknowledged.revisionIds.add(revision.id);
      return revision;
    });
  }

  async function bringIn(svg: string): Promise<void> {
    await answeredOrCut(async () => {
      const answer: Answer = await visitor.send("POST", files, { body: formWith("logo.svg", svg) });
      if (answer.status !== 202) throw new Error(`Not taken: ${answer.status} ${answer.text}`);
      acknowledged.artworks.set(artworkSchema.parse(JSON.parse(answer.text)).id, svg);
    });
  }

  /** Nothing in the queue and nothing half done. */
  async function settled(): Promise<void> {
    const waiting = () =>
      runSql(server.database.ownerUrl, "select task_identifier, last_error from graphile_worker.jobs");
    await expect.poll(waiting, { timeout: patienceMs, interval: 200 }).toEqual([]);
  }

  /** Everything acknowledged is there, everything that is there is whole. Bytes found whole before are read again only with `again`. */
  async function expectWhole({ again = false }: { again?: boolean } = {}): Promise<void> {
    const revisions = await allPages((cursor) =>
      visitor.get(listRevisions, { params: jobParams, query: { limit: 100, ...cursor } }),
    );
    for (const id of acknowledged.revisionIds) expect(revisions.map((one) => one.id)).toContain(id);
    const [newest, ...older] = revisions;
    if (newest) expect(newest.state).toBe("issued");
    expect(older.every(({ state }) => state === "superseded")).toBe(true);
    for (const { id, pdfSha256, snapshotSha256 } of revisions) {
      if (whole.has(id) && !again) continue;
      whole.add(id);
      const { status, bytes } = await download(getProof.path.replace(":shop", params.shop).replace(":revisionId", id));
      expect(status).toBe(200);
      expect(sha256Hex(bytes)).toBe(pdfSha256);
      expect(await popplerText(bytes, "pdfinfo")).toContain(`sha256:${snapshotSha256}`);
    }
    const artworks = await allPages((cursor) =>
      visitor.get(listArtworks, { params: jobParams, query: { limit: 100, ...cursor } }),
    );
    for (const [id, svg] of acknowledged.artworks)
      expect(artworks.find((one) => one.id === id)).toMatchObject({ state: "ready", sha256: sha256Hex(svg) });
    for (const { id, state, sha256 } of artworks) {
      expect(state).toBe("ready");
      if (whole.has(id) && !again) continue;
      whole.add(id);
      const file = await download(getArtworkFile.path.replace(":shop", params.shop).replace(":artworkId", id));
      expect(sha256Hex(file.bytes)).toBe(sha256);
    }
    await expectRowsWhole(revisions.length);
  }

  async function expectRowsWhole(revisions: number): Promise<void> {
    const { ownerUrl } = server.database;
    const stored = await runSql<{ storage_key: string; byte_size: number }>(ownerUrl, "select * from stored_files");
    for (const { storage_key, byte_size } of stored)
      expect((await stat(join(server.filesDir, "kept", storage_key))).size).toBe(byte_size);
    const counted = await runSql(
      ownerUrl,
      `select (select count(*)::int from events where kind = 'revision issued') as issued,
              (select count(*)::int from outgoing_mails where kind = 'proof issued' and state in ('sent', 'dropped')) as mails`,
    );
    expect(counted).toEqual([{ issued: revisions, mails: revisions }]);
  }

  async function download(path: string): Promise<{ status: number; bytes: Uint8Array }> {
    const cookie = [...visitor.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
    const response = await fetch(server.baseUrl + path, { headers: { Cookie: cookie } });
    return { status: response.status, bytes: new Uint8Array(await response.arrayBuffer()) };
  }

  return {
    shop: owner.shop,
    approver,
    visitor,
    files,
    acknowledged,
    issue,
    bringIn,
    settled,
    expectWhole,
    close: () => sequelize.close(),
  };
}

/** What a request answered; undefined when the connection was cut by the kill. Anything else is thrown. */
async function answeredOrCut<T>(ask: () => Promise<T>): Promise<T | undefined> {
  try {
    return await ask();
  } catch (error) {
    if (error instanceof TypeError) return undefined;
    throw error;
  }
}

async function allPages<T>(
  ask: (cursor: { cursor?: string }) => Promise<{ items: T[]; next: string | null }>,
): Promise<T[]> {
  const items: T[] = [];
  let next: string | null = null;
  do {
    const page = await ask(next === null ? {} : { cursor: next });
    items.push(...page.items);
    next = page.next;
  } while (next !== null);
  return items;
}
