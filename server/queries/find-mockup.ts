import type { ReadContext } from "../http/context.ts";
import { Mockup } from "../models/mockup.ts";

/** The draft of a job that was found before, with who saved it; null before the first save. */
export function findMockup(
  { transaction }: ReadContext,
  { shopId, jobId }: { shopId: string; jobId: string },
): Promise<Mockup | null> {
  return Mockup.findOne({ where: { shopId, jobId }, include: ["saver"], transaction });
}
