import { setTimeout as pause } from "node:timers/promises";
import { afterAll, beforeAll, expect, it } from "vitest";
import { plainSvg } from "../support/factories/work.ts";
import { type KillableServer, prepareServer } from "../support/killable-server.ts";
import { seededRandom } from "../support/seeded-random.ts";
import { openShopUnderFire, type ShopUnderFire } from "../support/shop-under-fire.ts";

const kills = 50;
const random = seededRandom(4600);

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

it("fifty kills at random moments lose nothing that was acknowledged and leave nothing half done", async () => {
  for (let round = 1; round <= kills; round += 1) {
    const issuing = shop.issue(80 + round);
    const bringing = shop.bringIn(plainSvg().replace("<svg ", `<svg id="round${round}" `));
    // In two rounds of three the revision is acknowledged first, so that the kill meets its PDF, its keeping or its mail.
    if (round % 3 !== 0) await issuing;
    await pause(random() * 1_500);
    await server.kill();
    await Promise.all([issuing, bringing]);
    await server.start();
    await shop.settled();
    await shop.expectWhole();
  }
  await shop.expectWhole({ again: true });
  const { revisionIds, artworks } = shop.acknowledged;
  process.stdout.write(
    `${kills} kills; acknowledged before them: ${revisionIds.size} issues, ${artworks.size} uploads.\n`,
  );
  expect(revisionIds.size).toBeGreaterThan(kills / 2);
  expect(artworks.size).toBeGreaterThan(kills / 2);
});
