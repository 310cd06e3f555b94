import { importSvg } from "../artwork/import-svg.ts";
import { finishImport } from "../commands/finish-import.ts";
import type { Services } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";

/**
 * Turns a kept SVG into pieces, or writes down why it can't be. An artwork that is no longer importing was done before.
 * A file whose worker broke is refused like any other: trying again would break it again.
 */
export async function importArtwork(services: Services, { artworkId }: { artworkId: string }): Promise<void> {
  const artwork = await Artwork.findOne({ where: { id: artworkId, state: "importing" }, include: ["file"] });
  if (!artwork?.file) return;
  const bytes = await services.storage.read(artwork.file.storageKey);
  const outcome = await importSvg(bytes, {
    onFault: (message) => services.log.error({ artworkId, fault: message }, "The artwork import broke"),
  });
  await services.sequelize.transaction((transaction) =>
    finishImport({ transaction, now: new Date() }, { artworkId, outcome }),
  );
}
