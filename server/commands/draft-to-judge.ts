import type { MockupDocument } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import { stale, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { presentMockup } from "../presenters/mockup.ts";
import { findMockup } from "../queries/find-mockup.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";

/**
 * The saved draft of a locked job in the version that somebody judged: to issue it, or to set a finding of it aside.
 * Throws wrong_state before the first save and `stale`, with the newer one and the caller's words, when it has moved on.
 */
export async function draftToJudge(
  context: Context,
  { loaded, mockupVersion, whenStale }: { loaded: LoadedJob; mockupVersion: number; whenStale: string },
): Promise<MockupDocument> {
  const { job } = loaded;
  const mockup = await findMockup(context, { shopId: job.shopId, jobId: job.id });
  if (!mockup) throw wrongState("There is no mockup yet. Draw it first.");
  if (mockup.version !== mockupVersion) throw stale(whenStale, presentMockup(context.actor, loaded, mockup));
  const read = readDocument(JSON.parse(mockup.document));
  if (!read.ok) throw new Error(`A saved mockup can't be read: ${read.reason}`);
  return read.document;
}
