import * as contract from "#shared/contracts/named-drafts.ts";
import { keepDraft } from "../commands/keep-draft.ts";
import { removeDraft } from "../commands/remove-draft.ts";
import { renameDraft } from "../commands/rename-draft.ts";
import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { namedDraftPolicy } from "../policies/named-draft.ts";
import { presentDraft, presentDraftWithDocument } from "../presenters/named-draft.ts";
import { findJob } from "../queries/find-job.ts";
import { findNamedDraft } from "../queries/find-named-draft.ts";
import { listNamedDrafts } from "../queries/list-named-drafts.ts";
import { pageOf } from "../queries/page.ts";

export function registerNamedDraftRoutes(routes: Routes): void {
  read(routes, contract.listDrafts, async (context, { params, query }) => {
    const facts = await factsToSee(context, params.jobId);
    return pageOf(
      await listNamedDrafts(context, params.jobId, query),
      query.limit,
      (draft) => presentDraft(context.actor, facts, draft),
      ({ keptAt, id }) => [keptAt.toISOString(), id],
    );
  });

  read(routes, contract.getDraft, async (context, { params }) => {
    const facts = await factsToSee(context, params.jobId);
    const draft = await findNamedDraft(context, { ...params, withDocument: true });
    return presentDraftWithDocument(context.actor, facts, draft);
  });

  write(routes, contract.keepDraft, async (context, { params, body }) => {
    const draft = await keepDraft(context, { jobId: params.jobId, ...body });
    return presentDraft(context.actor, await factsToSee(context, params.jobId), draft);
  });

  write(routes, contract.renameDraft, async (context, { params, body }) => {
    const draft = await renameDraft(context, { ...params, ...body });
    return presentDraft(context.actor, await factsToSee(context, params.jobId), draft);
  });

  write(routes, contract.removeDraft, async (context, { params }) => {
    await removeDraft(context, params);
    return undefined;
  });
}

async function factsToSee(context: ReadContext, jobId: string) {
  const { facts } = await findJob(context, jobId);
  if (!namedDraftPolicy.see(context.actor, facts)) throw notFound("draft");
  return facts;
}
