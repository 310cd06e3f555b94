import * as contract from "#shared/contracts/revision-documents.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, read } from "../http/route.ts";
import { revisionPolicy } from "../policies/revision.ts";
import { presentRevisionDocument } from "../presenters/revision-document.ts";
import { findRevision } from "../queries/find-revision.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";

export function registerRevisionDocumentRoutes(routes: Routes): void {
  read(routes, contract.getRevisionDocument, async (context, { params }) => {
    const { revision, facts } = await findRevision(context, params.revisionId, { withSnapshot: true });
    if (!revisionPolicy.build(context.actor, facts)) throw notFound("revision");
    return presentRevisionDocument(revision, snapshotOf(revision));
  });
}
