import { refreshJob } from "#server/commands/refresh-job.ts";
import { newId } from "#server/db/new-id.ts";
import { Job } from "#server/models/job.ts";
import { Revision } from "#server/models/revision.ts";
import type { TestApp } from "../app.ts";
import { buildJob } from "./job.ts";
import type { World } from "./work.ts";

/**
 * A new job whose revision A is out, with the drawing and the PDF of a revision that was really issued in the same
 * shop: drawing each anew would take a second a test. No mail goes out.
 */
export async function buildIssued(
  app: TestApp,
  world: World,
  templateId: string,
  overrides: Parameters<typeof buildJob>[1] = {},
): Promise<{ own: World; revisionId: string }> {
  const own = await buildJob(world, overrides);
  const template = await Revision.findByPk(templateId, { rejectOnEmpty: true });
  const { shopId, snapshot, snapshotSha256, issuedBy, pdfFileId } = template;
  const revisionId = newId();
  const now = new Date();
  await app.services.sequelize.transaction(async (transaction) => {
    const job = await Job.findByPk(own.job.id, { transaction, lock: true, rejectOnEmpty: true });
    const frozen = { snapshot, snapshotSha256, issuedBy, requestedAt: now, message: "" };
    const revision = await Revision.create(
      { id: revisionId, shopId, jobId: job.id, letter: "A", sequence: 1, state: "preparing", ...frozen },
      { transaction },
    );
    await revision.update({ state: "issued", pdfFileId, issuedAt: now }, { transaction });
    await refreshJob({ transaction }, job);
  });
  return { own, revisionId };
}
