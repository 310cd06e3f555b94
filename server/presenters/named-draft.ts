import type { NamedDraft as NamedDraftView, NamedDraftWithDocument } from "#shared/contracts/named-drafts.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import type { NamedDraft } from "../models/named-draft.ts";
import type { Actor } from "../policies/actor.ts";
import type { JobFacts } from "../policies/job.ts";
import { namedDraftPolicy } from "../policies/named-draft.ts";

/** A draft without what it holds. */
export function presentDraft(actor: Actor, on: JobFacts, draft: NamedDraft): NamedDraftView {
  return {
    id: draft.id,
    name: draft.name,
    keptBy: draft.keeper?.name ?? "",
    keptAt: draft.keptAt.toISOString(),
    can: { change: namedDraftPolicy.change(actor, on) },
  };
}

/** A draft with its document in today's version; the stored text stays as it was. */
export function presentDraftWithDocument(actor: Actor, on: JobFacts, draft: NamedDraft): NamedDraftWithDocument {
  if (draft.document === null) throw new Error(`Draft ${draft.id} was read without its document.`);
  const read = readDocument(JSON.parse(draft.document));
  if (!read.ok) throw new Error(`Draft ${draft.id} can't be read: ${read.reason}`);
  return { ...presentDraft(actor, on, draft), document: read.document };
}
