import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { artworkRefusal } from "#shared/artwork/refusals.ts";
import { importSvg } from "../artwork/import-svg.ts";
import { finishImport } from "../commands/finish-import.ts";
import type { Services } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import type { StoredFile } from "../models/stored-file.ts";
import type { Attempt } from "./tasks.ts";

/**
 * Turns a kept SVG into pieces, or writes down why it can't be. An artwork that is no longer importing was done before.
 * A file whose worker broke is refused like any other: trying again would break it again. A disk or a worker that fails is tried again;
 * after the last try the artwork is refused, since it would be "importing" for ever.
 */
export async function importArtwork(
  services: Services,
  { artworkId }: { artworkId: string },
  { isLast }: Attempt,
): Promise<void> {
  const artwork = await Artwork.findOne({ where: { id: artworkId, state: "importing" }, include: ["file"] });
  if (!artwork?.file) return;
  const outcome = await importStored(services, artwork.file, artworkId).catch((error: unknown): ImportOutcome => {
    if (!isLast) throw error;
    services.log.error({ err: error, artworkId }, "The artwork could not be read");
    return { ok: false, refusal: artworkRefusal("import.failed") };
  });
  await services.sequelize.transaction((transaction) =>
    finishImport({ transaction, now: new Date() }, { artworkId, outcome }),
  );
}

async function importStored(
  { storage, log }: Services,
  { storageKey }: StoredFile,
  artworkId: string,
): Promise<ImportOutcome> {
  return importSvg(await storage.read(storageKey), {
    onFault: (message) => log.error({ artworkId, fault: message }, "The artwork import broke"),
  });
}
