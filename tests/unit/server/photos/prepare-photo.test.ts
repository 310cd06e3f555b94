import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, expect, it } from "vitest";
import { preparePhoto, stopPhotos } from "#server/photos/prepare-photo.ts";
import { jpegOf, twoHalves } from "../../../support/wall-pictures.ts";

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "standproud-photos-"));
});
afterAll(async () => {
  await stopPhotos();
  await rm(folder, { recursive: true, force: true });
});

it("leaves room in the line for another shop, whatever one shop brings at once", async () => {
  const photo = await jpegOf(twoHalves(60, 40));
  const bring = async (name: string, shop: string) => {
    const path = join(folder, name);
    await writeFile(path, photo);
    return preparePhoto({ path, originalName: "wall.jpg", byteSize: photo.byteLength }, shop);
  };
  const own = ["a", "b", "c", "d"].map((name) => bring(name, "first"));
  const other = bring("e", "second");
  const outcomes = await Promise.allSettled(own);
  const refused = outcomes.flatMap((outcome) => (outcome.status === "rejected" ? [outcome.reason] : []));
  expect(refused).toMatchObject([{ code: "too_many_requests" }, { code: "too_many_requests" }]);
  expect(await other).toMatchObject({ widthPx: 60, heightPx: 40 });
  // Those that were made ready have left the line.
  expect(await bring("f", "first")).toMatchObject({ widthPx: 60 });
});
