import { type BoundFinding, bindingKey, boundFinding } from "#shared/dry-fit/set-aside.ts";
import { newId } from "../db/new-id.ts";
import { checkDrawing } from "../drawing/draw.ts";
import { sha256Hex } from "../files/sha256.ts";
import { AppError, notAllowed, notFound, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { SetAside } from "../models/set-aside.ts";
import { Shop } from "../models/shop.ts";
import { setAsidePolicy } from "../policies/set-aside.ts";
import { dryFitInput } from "../queries/dry-fit-input.ts";
import { findJob } from "../queries/find-job.ts";
import { draftToJudge } from "./draft-to-judge.ts";
import { logEvent } from "./log-event.ts";

/**
 * Sets a finding of the saved draft aside. What the dry fit finds is worked out here, so that nothing can be set aside
 * which is not there; asked for a second time, the first one stays.
 */
export async function setAsideFinding(
  context: Context,
  {
    jobId,
    mockupVersion,
    finding: asked,
    reason,
  }: { jobId: string; mockupVersion: number; finding: BoundFinding; reason: string },
): Promise<SetAside> {
  const { actor, transaction, now } = context;
  const loaded = await findJob(context, jobId, { lock: true });
  const { job, facts } = loaded;
  if (!setAsidePolicy.see(actor, facts)) throw notFound("set-aside");
  if (!setAsidePolicy.setAside(actor, facts)) throw notAllowed("Findings are set aside by owners and makers.");
  if (!setAsidePolicy.setAsideThis(actor, facts, asked))
    throw notAllowed("A stop about safety is set aside by an owner only.");
  const document = await draftToJudge(context, {
    loaded,
    mockupVersion,
    whenStale: "The mockup was saved again since. Look at the finding once more before you set it aside.",
  });
  const shop = await Shop.findByPk(job.shopId, { transaction, rejectOnEmpty: true });
  const binding = bindingKey(asked);
  const found = await checkDrawing(await dryFitInput(context, { shop, job, document }), { shopId: shop.id });
  const finding = found.find((candidate) => bindingKey(candidate) === binding);
  if (!finding)
    throw wrongState("The dry fit of the saved mockup does not find this any more. Look at what it finds now.");
  const bindingSha256 = sha256Hex(binding);
  const known = await SetAside.findOne({ where: { jobId, bindingSha256, takenBackAt: null }, transaction });
  if (known)
    throw new AppError("already_exists", {
      detail: `${known.setAsideName} has set this aside already: ${known.reason}`,
    });
  const row = await SetAside.create(
    {
      id: newId(),
      shopId: job.shopId,
      jobId,
      rule: finding.rule,
      severity: finding.severity,
      bindingSha256,
      finding: boundFinding(finding),
      reason,
      setAsideBy: actor.personId,
      setAsideName: actor.name,
      setAsideRole: actor.role,
      setAsideAt: now,
    },
    { transaction },
  );
  await logEvent(context, {
    shopId: job.shopId,
    jobId,
    kind: "finding set aside",
    data: { finding: findingName(finding), reason },
  });
  return row;
}

/** As the log calls it: "stop “Hole window”". */
export const findingName = ({ severity, title }: BoundFinding): string => `${severity} “${title}”`;
