import type { Revision } from "#shared/contracts/revisions.ts";

export type Side = "shop" | "client";

const clientWords: Partial<Record<Revision["state"], string>> = {
  issued: "the newest",
  superseded: "replaced",
  "revision asked": "to change",
};

/** A revision's state as one word or two beside its letter: the shop's own words, or plain ones for the client. */
export const revisionStateWord = (state: Revision["state"], side: Side): string =>
  side === "client" ? (clientWords[state] ?? state) : state;
