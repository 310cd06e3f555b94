import type { BenchRow, Job as JobView } from "#shared/contracts/jobs.ts";
import { canIssue, type JobState } from "#shared/lifecycle/job-states.ts";
import { type RevisionInRow, revisionApproved, revisionOut } from "#shared/lifecycle/revision-row.ts";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { type Move, type MoveFacts, whoseMove } from "#shared/lifecycle/whose-move.ts";
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
  const told = whoseMove(isStaff(actor) ? move : { ...move, revisions: seen });
  return {
    id: job.id,
    number: job.number,
    title: job.title,
    state: job.state,
    whoseMove: told.move,
    nextStep: isStaff(actor) ? told.reason : clientStep(job.state, revisionOut(seen), told.move),
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

/** One sentence for the client, about the revision that the client sees out. */
function clientStep(state: JobState, out: RevisionInRow | null, move: Move): string {
  switch (state) {
    case "handed over":
    case "closed":
      return "Your sign has been handed over";
    case "on hold":
      return "This job is on hold";
    case "cancelled":
      return "This job was cancelled";
    default:
      if (out?.state === "issued")
        return move === "client"
          ? `Revision ${out.letter} waits for your decision`
          : "The shop is answering your notes";
      if (out?.state === "revision asked") return "The shop is working on the revision you asked for";
      if (out && state === "in build") return "Your sign is being built";
      if (out) return `You approved revision ${out.letter}, the build is next`;
      return "The shop is working on the next proof";
  }
}
