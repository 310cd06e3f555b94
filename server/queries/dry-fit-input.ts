import type { MockupDocument } from "#shared/mockup/document.ts";
import type { CheckInput } from "../drawing/drawing-worker.ts";
import type { ReadContext } from "../http/context.ts";
import type { Job } from "../models/job.ts";
import type { Shop } from "../models/shop.ts";
import { dryFitContext } from "./dry-fit-context.ts";
import { limitsOf } from "./find-limits.ts";

/** What a job's document is checked with, whoever asks: issuing and setting aside must find the same. */
export async function dryFitInput(
  context: ReadContext,
  { shop, job, document }: { shop: Shop; job: Job; document: MockupDocument },
): Promise<CheckInput> {
  return {
    document,
    limits: await limitsOf(context, shop.id),
    context: await dryFitContext(context, { shop, brief: job.brief }),
  };
}
