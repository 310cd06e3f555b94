import { isEditable } from "#shared/lifecycle/note-edits.ts";
import { canMoveNote, type NoteState } from "#shared/lifecycle/note-states.ts";
import { takesNotes } from "#shared/lifecycle/revision-states.ts";
import { type Actor, isInsider, isStaff } from "./actor.ts";
import { type RevisionFacts, revisionPolicy } from "./revision.ts";

export type NoteFacts = {
  readonly state: NoteState;
  readonly shopOnly: boolean;
  readonly authorId: string;
};

const sideOf = (actor: Actor): "shop" | "client" => (isStaff(actor) ? "shop" : "client");

export const notePolicy = {
  /** A shop-only note does not exist for a client. */
  see: (actor: Actor, revision: RevisionFacts, note: NoteFacts): boolean =>
    revisionPolicy.see(actor, revision) && (isStaff(actor) || !note.shopOnly),
  add: (actor: Actor, revision: RevisionFacts): boolean =>
    revisionPolicy.see(actor, revision) && takesNotes(revision.state),
  addShopOnly: (actor: Actor, revision: RevisionFacts): boolean => isStaff(actor) && notePolicy.add(actor, revision),
  reply: (actor: Actor, revision: RevisionFacts, note: NoteFacts): boolean =>
    notePolicy.see(actor, revision, note) && takesNotes(revision.state),
  /** The author puts right what they wrote, a note or a reply, for a few minutes. */
  edit: (
    actor: Actor,
    revision: RevisionFacts,
    note: NoteFacts,
    written: { readonly authorId: string; readonly createdAt: Date; readonly now: Date },
  ): boolean =>
    notePolicy.reply(actor, revision, note) &&
    isInsider(actor) &&
    written.authorId === actor.personId &&
    isEditable(written.createdAt, written.now),
  move: (actor: Actor, revision: RevisionFacts, note: NoteFacts, to: NoteState): boolean =>
    notePolicy.see(actor, revision, note) &&
    takesNotes(revision.state) &&
    isInsider(actor) &&
    canMoveNote(note.state, to, { side: sideOf(actor), isAuthor: note.authorId === actor.personId }),
};
