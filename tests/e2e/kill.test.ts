import { readdir } from "node:fs/promises";
import { connect } from "node:net";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Artwork } from "#server/models/artwork.ts";
import { plainSvg } from "../support/factories/work.ts";
import { type KillableServer, prepareServer } from "../support/killable-server.ts";
import { runSql } from "../support/run-sql.ts";
import { openShopUnderFire, type ShopUnderFire } from "../support/shop-under-fire.ts";

let server: KillableServer;
let shop: ShopUnderFire;
beforeAll(async () => {
  server = await prepareServer();
  await server.start();
  shop = await openShopUnderFire(server);
});
afterAll(async () => {
  await shop.close();
  await server.clear();
});

const heldJobs = () =>
  runSql(server.database.ownerUrl, "select task_identifier from graphile_worker.jobs where locked_at is not null");

describe("a server that is killed", () => {
  it("in the middle of an issue draws the PDF after its next start, and mails it once", async () => {
    const revision = await shop.issue(90);
    expect(revision?.state).toBe("preparing");
    await expect.poll(heldJobs, { timeout: 20_000, interval: 5 }).toEqual([{ task_identifier: "render-proof" }]);
    await server.kill();
    const [row] = await runSql(server.database.ownerUrl, "select state, pdf_file_id from revisions");
    expect(row).toEqual({ state: "preparing", pdf_file_id: null });
    await server.start();
    await shop.settled();
    await shop.expectWhole();
    expect(shop.acknowledged.revisionIds.size).toBe(1);
  });

  it("in the middle of an upload keeps nothing of it, and takes the file the next time", async () => {
    const svg = plainSvg();
    const { hostname, port } = new URL(server.baseUrl);
    const socket = connect(Number(port), hostname);
    // The kill ends the connection; that is what is wanted.
    socket.on("error", () => undefined);
    const cookie = [...shop.visitor.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
    const head = [
      `POST ${shop.files} HTTP/1.1`,
      `Host: ${hostname}:${port}`,
      `Cookie: ${cookie}`,
      "X-Standproud: 1",
      "Content-Type: multipart/form-data; boundary=x",
      "Content-Length: 100000",
      "",
      '--x\r\nContent-Disposition: form-data; name="file"; filename="logo.svg"\r\n\r\n',
    ].join("\r\n");
    socket.write(head + svg.slice(0, 120));
    const quarantine = join(server.filesDir, "quarantine");
    const halves = async () => (await readdir(quarantine)).filter((name) => name.startsWith("upload-"));
    await expect.poll(halves, { timeout: 20_000, interval: 5 }).toHaveLength(1);
    await server.kill();
    socket.destroy();
    await server.start();
    expect(await Artwork.count()).toBe(0);
    await shop.bringIn(svg);
    // Killed again as soon as the file is acknowledged, while it is being turned into pieces or before.
    await server.kill();
    expect(shop.acknowledged.artworks.size).toBe(1);
    await server.start();
    await shop.settled();
    await shop.expectWhole();
  });
});
