import type { Mockup as MockupView } from "#shared/contracts/mockups.ts";
import { canIssue } from "#shared/lifecycle/job-states.ts";
import { standardWoods } from "#shared/materials/standard-stock.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { emptyDocument } from "#shared/mockup/empty-document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import type { Mockup } from "../models/mockup.ts";
import type { Actor } from "../policies/actor.ts";
import { mockupPolicy } from "../policies/mockup.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";

/**
 * The draft; before the first save, version 0, what was laid out for a job that was opened like another, else an empty board
 * of the brief's size.
 */
export function presentMockup(
  actor: Actor,
  { job, facts, revisions }: LoadedJob,
  mockup: Mockup | null,
  start: MockupDocument | null = null,
): MockupView {
  const edit = mockupPolicy.edit(actor, facts);
  const can = { edit, issue: edit && canIssue(job.state, revisions) };
  if (!mockup) {
    if (start) return { version: 0, document: start, savedAt: null, savedBy: null, can };
    const { widthMm, heightMm, quantity, viewingDistanceMm } = job.brief;
    const document = emptyDocument({
      backer: usualBacker(),
      widthMm: widthMm ?? 600,
      heightMm: heightMm ?? 400,
      quantity,
      viewingDistanceMm: viewingDistanceMm ?? 3000,
    });
    return { version: 0, document, savedAt: null, savedBy: null, can };
  }
  const read = readDocument(JSON.parse(mockup.document));
  if (!read.ok) throw new Error(`The saved mockup of job ${job.id} can't be read: ${read.reason}`);
  return {
    version: mockup.version,
    document: read.document,
    savedAt: mockup.savedAt.toISOString(),
    savedBy: mockup.saver?.name ?? null,
    can,
  };
}

/** The board a new mockup starts with until the maker chooses one. */
function usualBacker() {
  const [first] = standardWoods;
  if (!first) throw new Error("The standard stock has a wood.");
  return first.wood;
}
