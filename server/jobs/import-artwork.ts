import { Op } from "sequelize";
import { artworkRefusal } from "#shared/artwork/refusals.ts";
import type { ImportedFile } from "../artwork/import-bytes.ts";
import { importFile } from "../artwork/import-file.ts";
import { finishImport } from "../commands/finish-import.ts";
import type { Services } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import type { Attempt } from "./tasks.ts";

/**
 * Turns a kept file into pieces, or writes down why it can't be; or traces a picture again as was asked last. An artwork for which neither
 * is open was done before.
 * A file whose worker broke is refused like any other: trying again would break it again. A disk or a worker that fails is tried again;
 * after the last try the artwork is refused, since it would be "importing" for ever.
 */
export async function importArtwork(
  services: Services,
  { artworkId }: { artworkId: string },
  { isLast }: Attempt,
): Promise<void> {
  const artwork = await Artwork.findOne({
    where: { id: artworkId, [Op.or]: [{ state: "importing" }, { traceAsked: { [Op.not]: null } }] },
    include: ["file"],
  });
  if (!artwork?.file) return;
  const outcome = await importStored(services, artwork).catch((error: unknown): ImportedFile => {
    if (!isLast) throw error;
    services.log.error({ err: error, artworkId }, "The artwork could not be read");
    return { ok: false, refusal: artworkRefusal("import.failed") };
  });
  await services.sequelize.transaction((transaction) =>
    finishImport({ transaction, now: new Date() }, { artworkId, outcome, asked: artwork.traceAsked }),
  );
}

async function importStored({ storage, log }: Services, { id, file, traceAsked }: Artwork): Promise<ImportedFile> {
  return importFile(await storage.read(file?.storageKey ?? ""), {
    ...(traceAsked ? { choices: traceAsked } : {}),
    onFault: (message) => log.error({ artworkId: id, fault: message }, "The artwork import broke"),
  });
}
