import type { MockupDocument } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import type { ReadContext } from "../http/context.ts";
import { MockupStart } from "../models/mockup-start.ts";

/** What the mockup of a job begins with that was opened like another; null for any other job. */
export async function findMockupStart(
  { transaction }: Pick<ReadContext, "transaction">,
  { shopId, jobId }: { shopId: string; jobId: string },
): Promise<MockupDocument | null> {
  const start = await MockupStart.findOne({ where: { shopId, jobId }, transaction });
  if (!start) return null;
  const read = readDocument(JSON.parse(start.document));
  if (!read.ok) throw new Error(`The start of job ${jobId}'s mockup can't be read: ${read.reason}`);
  return read.document;
}
