import { artworkUsed } from "#shared/mockup/artwork-used.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { newId } from "../db/new-id.ts";
import { invalid, notAllowed, notFound, stale } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { Mockup } from "../models/mockup.ts";
import { isStaff } from "../policies/actor.ts";
import { mockupPolicy } from "../policies/mockup.ts";
import { presentMockup } from "../presenters/mockup.ts";
import { findJob } from "../queries/find-job.ts";
import { findMockup } from "../queries/find-mockup.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { refuseForeignPhoto } from "./refuse-foreign-photo.ts";
import { signalJob } from "./signal-job.ts";

/** Saves the draft if it was edited from the newest version; otherwise answers `stale` with the newer one. */
export async function saveMockup(
  context: Context,
  { jobId, version, document }: { jobId: string; version: number; document: MockupDocument },
): Promise<{ loaded: LoadedJob; mockup: Mockup }> {
  const { actor, transaction, now } = context;
  const loaded = await findJob(context, jobId, { lock: true });
  const { job, facts } = loaded;
  if (!mockupPolicy.see(actor, facts)) throw notFound("mockup");
  if (!isStaff(actor) || !mockupPolicy.edit(actor, facts))
    throw notAllowed("The mockup is drawn by owners and makers.");
  const known = await findMockup(context, { shopId: job.shopId, jobId });
  if (version !== (known?.version ?? 0)) {
    throw stale(
      "Someone saved a newer version while you were drawing. Keep theirs or yours.",
      presentMockup(actor, loaded, known),
    );
  }
  await refuseForeignArtwork(context, { shopId: job.shopId, clientId: job.clientId, document });
  await refuseForeignPhoto(context, { shopId: job.shopId, clientId: job.clientId, document });
  const saved = { version: version + 1, document: JSON.stringify(document), savedBy: actor.personId, savedAt: now };
  if (known) await known.update(saved, { transaction });
  else {
    await Mockup.create({ id: newId(), shopId: job.shopId, jobId, ...saved }, { transaction });
    await logEvent(context, { shopId: job.shopId, jobId, kind: "mockup begun", data: {} });
  }
  await signalJob(context, job, { kind: "mockup", id: jobId, shopOnly: true });
  const mockup = await findMockup(context, { shopId: job.shopId, jobId });
  if (!mockup) throw new Error("A mockup that was saved is there.");
  return { loaded: await refreshJob(context, job), mockup };
}

/** Pieces may only come from artwork of the job's own client: they are copied from job to job. */
export async function refuseForeignArtwork(
  { transaction }: Context,
  { shopId, clientId, document }: { shopId: string; clientId: string; document: MockupDocument },
): Promise<void> {
  const used = artworkUsed(document);
  const known = await Artwork.count({
    where: { id: used, shopId },
    include: [{ association: "job", where: { clientId }, required: true }],
    transaction,
  });
  if (known !== used.length)
    throw invalid([{ pointer: "/document/layers", detail: "A piece comes from artwork that is not this client’s." }]);
}
