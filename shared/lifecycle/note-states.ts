export const noteStates = ["open", "answered", "settled"] as const;
export type NoteState = (typeof noteStates)[number];

export const noteKinds = ["must change", "question", "fine as is"] as const;
export type NoteKind = (typeof noteKinds)[number];

/** Who acts on a note. Approving settles the open notes that the approver ticks. */
export type NoteActor = { readonly side: "shop" | "client"; readonly isAuthor: boolean; readonly approving?: boolean };

/**
 * Whether the note may go from one state to another: the shop answers an open one, its author settles it (or the
 * approver in approving), and either side opens an answered or settled one again.
 */
export function canMoveNote(from: NoteState, to: NoteState, actor: NoteActor): boolean {
  if (from === to) return false;
  if (to === "answered") return from === "open" && actor.side === "shop";
  if (to === "settled") return actor.isAuthor || (actor.side === "client" && actor.approving === true);
  return true;
}

/**
 * The state after a reply: an answer by the shop makes an open note answered, an answer by the client opens an answered
 * one.
 */
export function noteStateAfterReply(state: NoteState, side: "shop" | "client"): NoteState {
  if (side === "shop") return state === "open" ? "answered" : state;
  return state === "answered" ? "open" : state;
}

/** Whether the note holds the job up on the shop's side. "Fine as is" and the shop's own notes never do. */
export function waitsOnShop(note: {
  readonly kind: NoteKind;
  readonly state: NoteState;
  readonly side: "shop" | "client";
  readonly shopOnly: boolean;
}): boolean {
  return note.state === "open" && note.side === "client" && !note.shopOnly && note.kind !== "fine as is";
}

/** Whether approving has to ask about the note: an open "must change" is settled by name or the approval stops. */
export function asksAtApproval(note: {
  readonly kind: NoteKind;
  readonly state: NoteState;
  readonly shopOnly: boolean;
}): boolean {
  return note.kind === "must change" && note.state === "open" && !note.shopOnly;
}
