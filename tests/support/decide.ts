import type { z } from "zod";
import { approveRevision, getRevision, getSheet, type Revision } from "#shared/contracts/revisions.ts";
import type { World } from "./factories/work.ts";

export type Approval = z.input<typeof approveRevision.body>;

/** What an approver sends after ticking everything the sheet asks. */
export async function approvalOf(
  { params, visitors }: World,
  revisionId: string,
  overrides: Partial<Approval> = {},
): Promise<Approval> {
  const { acknowledgements, revision } = await visitors.approver.get(getSheet, { params: { ...params, revisionId } });
  return {
    typedName: "Ada Quill",
    acknowledgedIds: acknowledgements.map(({ id }) => id),
    pdfSha256: revision.pdfSha256 ?? "",
    ...overrides,
  };
}

/** Approves a revision as its named approver does. */
export async function approve(
  world: World,
  revisionId: string,
  overrides: Partial<Approval> = {},
): Promise<z.output<typeof approveRevision.result>> {
  const body = await approvalOf(world, revisionId, overrides);
  return world.visitors.approver.get(approveRevision, { params: { ...world.params, revisionId }, body });
}

/** A revision as the shop sees it now. */
export function revisionNow({ params, visitors }: World, revisionId: string): Promise<Revision> {
  return visitors.owner.get(getRevision, { params: { ...params, revisionId } });
}
