import type { Job } from "#shared/contracts/jobs.ts";
import { paths } from "@/app/paths.ts";
import type { JobMove } from "../api/mutations.ts";

export type NextAction =
  | { readonly kind: "go"; readonly label: string; readonly to: string }
  | { readonly kind: "part"; readonly label: string; readonly id: string }
  | { readonly kind: "move"; readonly label: string; readonly move: JobMove }
  | null;

/**
 * The one button at the top of a job: where its next step is done. Null when there is nothing for this reader to press.
 * What the server lets the reader do (`can`) decides; this only chooses among it.
 */
export function nextActionOf(job: Job, shop: string, side: "shop" | "client"): NextAction {
  const { can, latest } = job;
  const sheet = latest && paths.sheet(shop, latest.revisionId);
  const seeSheet: NextAction =
    latest && sheet ? { kind: "go", label: `Look at revision ${latest.letter}`, to: sheet } : null;
  if (side === "client") {
    return job.state === "brief" && can.editBrief
      ? { kind: "part", label: "Fill in the brief", id: "brief" }
      : seeSheet;
  }
  const way = wayToMockup(job, shop);
  const mockup: NextAction = way && { kind: "go", ...way };
  switch (job.state) {
    case "brief":
      return can.editBrief ? { kind: "part", label: "Fill in the brief", id: "brief" } : mockup;
    case "mockup":
      return mockup;
    case "revision asked":
      return mockup ?? seeSheet;
    case "out for proof":
      return job.openNotes > 0 && job.whoseMove === "ours" && sheet
        ? { kind: "go", label: "Answer the notes", to: sheet }
        : seeSheet;
    case "approved":
      return can.move ? { kind: "move", label: "Start the build", move: "in build" } : seeSheet;
    case "in build":
      return can.move ? { kind: "move", label: "Handed over to the client", move: "handed over" } : seeSheet;
    case "handed over":
      return can.move ? { kind: "move", label: "Close the job", move: "closed" } : null;
    case "on hold":
      return can.move ? { kind: "move", label: "Take it up again", move: "taken up again" } : null;
    default:
      return null;
  }
}

/** How a reader gets from a job to its mockup, whatever its next step is; null for those who do not see mockups. */
export function wayToMockup({ id, can }: Job, shop: string): { readonly label: string; readonly to: string } | null {
  if (!can.seeMockup) return null;
  return { label: can.editMockup ? "Open the mockup" : "Look at the mockup", to: paths.mockup(shop, id) };
}

/** Who sees the mockup may look at what it takes to build it. */
export const wayToCutPlan = (
  { id }: Pick<Job, "id">,
  shop: string,
): { readonly label: string; readonly to: string } => ({
  label: "Cut plan",
  to: paths.cutPlan(shop, id),
});
