import type { BenchRow, Job as JobView } from "#shared/contracts/jobs.ts";
import { canIssue } from "#shared/lifecycle/job-states.ts";
import { revisionApproved } from "#shared/lifecycle/revision-row.ts";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { type MoveFacts, whoseMove } from "#shared/lifecycle/whose-move.ts";
import type { Event } from "../models/event.ts";
import { type Actor, isStaff } from "../policies/actor.ts";
import { jobPolicy } from "../policies/job.ts";
import { mockupPolicy } from "../policies/mockup.ts";
import { portfolioPolicy } from "../policies/portfolio.ts";
import { missingOf } from "../queries/job-moves.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { presentEvent } from "./event.ts";

export type JobExtras = { readonly move: MoveFacts; readonly openNotes: number; readonly lastEvent: Event | null };

/** A row of the Bench as this actor sees it: a client is told nothing of what is still on the shop's table. */
export function presentBenchRow(actor: Actor, loaded: LoadedJob, { move, openNotes, lastEvent }: JobExtras): BenchRow {
  const { job, client } = loaded;
  const seen = isStaff(actor) ? loaded.revisions : loaded.revisions.filter(({ state }) => visibleToClient(state));
  const latest = seen.at(-1) ?? null;
  const approved = revisionApproved(seen);
  const event = isStaff(actor) && lastEvent ? presentEvent(lastEvent) : null;
  return {
    id: job.id,
    number: job.number,
    title: job.title,
    state: job.state,
    whoseMove: job.whoseMove,
    nextStep: isStaff(actor) ? whoseMove(move).reason : clientStep(loaded, latest?.letter ?? ""),
    client: { id: client.id, name: client.name },
    dueOn: job.dueOn,
    latest: latest ? { revisionId: latest.id, letter: latest.letter, state: latest.state } : null,
    approved: approved ? { revisionId: approved.id, letter: approved.letter } : null,
    openNotes,
    lastEvent: event ? { text: `${event.who}: ${event.text}`, at: event.at } : null,
  };
}

export function presentJob(actor: Actor, loaded: LoadedJob, extras: JobExtras): JobView {
  const { job, approvers, facts } = loaded;
  const mayEdit = mockupPolicy.edit(actor, facts);
  return {
    ...presentBenchRow(actor, loaded, extras),
    brief: job.brief,
    briefMissing: isStaff(actor) ? missingOf(loaded) : [],
    approvers: approvers.map(({ contactId, name }) => ({ contactId, name })),
    consent: { given: job.consentAt !== null, at: job.consentAt?.toISOString() ?? null },
    createdAt: job.createdAt.toISOString(),
    can: {
      editBrief: jobPolicy.editBrief(actor, facts),
      seeMockup: mockupPolicy.see(actor, facts),
      editMockup: mayEdit,
      issue: mayEdit && canIssue(job.state, loaded.revisions),
      move: jobPolicy.move(actor, facts),
      seeShopOnly: isStaff(actor),
      giveConsent: jobPolicy.giveConsent(actor, facts),
      share: portfolioPolicy.share(actor),
    },
  };
}

/** One sentence for the client, about what the client can see. */
function clientStep({ job }: LoadedJob, letter: string): string {
  switch (job.state) {
    case "out for proof":
      return job.whoseMove === "client"
        ? `Revision ${letter} waits for your decision`
        : "The shop is answering your notes";
    case "revision asked":
      return "The shop is working on the revision you asked for";
    case "approved":
      return `You approved revision ${letter}, the build is next`;
    case "in build":
      return "Your sign is being built";
    case "handed over":
    case "closed":
      return "Your sign has been handed over";
    case "on hold":
      return "This job is on hold";
    case "cancelled":
      return "This job was cancelled";
    default:
      return "The shop is working on the next proof";
  }
}
