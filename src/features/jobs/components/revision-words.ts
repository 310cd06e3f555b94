import type { Revision } from "#shared/contracts/revisions.ts";
import type { MarkTone } from "@/components/ui/letter-mark.tsx";

type State = Revision["state"];

export const revisionTone: Record<State, MarkTone> = {
  draft: "quiet",
  preparing: "quiet",
  issued: "client",
  approved: "settled",
  "revision asked": "ours",
  superseded: "quiet",
  withdrawn: "quiet",
};

const shopWords: Record<State, string> = {
  draft: "Draft: its PDF could not be made",
  preparing: "Preparing: the PDF is being made",
  issued: "Out with the client",
  approved: "Approved",
  "revision asked": "Revision asked",
  superseded: "Superseded by a later letter",
  withdrawn: "Withdrawn",
};

const clientWords: Partial<Record<State, string>> = {
  issued: "The newest, to look at",
  approved: "Approved: this one gets built",
  "revision asked": "You asked for a change",
  superseded: "Replaced by a newer one",
};

/** A revision's state in words for the side that reads it. */
export const revisionWords = (state: State, side: "shop" | "client"): string =>
  side === "client" ? (clientWords[state] ?? shopWords[state]) : shopWords[state];
