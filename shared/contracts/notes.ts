import { z } from "zod";
import { noteKinds, noteStates } from "../lifecycle/note-states.ts";
import { addresses } from "./addresses.ts";
import { inShop, instant, nothing, pageOf, pageQuery, writtenText } from "./common.ts";
import { endpoint } from "./endpoint.ts";

const coordinate = z.number().finite().min(-10_000).max(10_000);

/** A spot in mm on the board or on a layer, on a piece, or the whole sign. */
export const anchorSchema = z.discriminatedUnion("on", [
  z.strictObject({ on: z.literal("whole") }),
  z.strictObject({
    on: z.literal("spot"),
    x: coordinate,
    y: coordinate,
    layerKey: z.string().max(2).nullable(),
    pieceId: z.string().max(64).nullable(),
  }),
]);
export type Anchor = z.infer<typeof anchorSchema>;

export const noteKind = z.enum(noteKinds);
export const noteState = z.enum(noteStates);

export const replySchema = z.strictObject({
  id: z.uuid(),
  text: z.string(),
  author: z.string(),
  side: z.enum(["shop", "client"]),
  at: instant,
  editedAt: instant.nullable(),
  /** Until when the reader, its author, may change it; null for everyone else. */
  editableUntil: instant.nullable(),
});
export const noteSchema = z.strictObject({
  id: z.uuid(),
  number: z.number().int(),
  kind: noteKind,
  state: noteState,
  text: z.string(),
  anchor: anchorSchema,
  /** As B3; null for the whole sign. */
  zone: z.string().nullable(),
  author: z.string(),
  side: z.enum(["shop", "client"]),
  shopOnly: z.boolean(),
  fromLetter: z.string(),
  at: instant,
  editedAt: instant.nullable(),
  editableUntil: instant.nullable(),
  replies: z.array(replySchema),
  can: z.strictObject({ reply: z.boolean(), settle: z.boolean(), reopen: z.boolean() }),
});
export type Note = z.infer<typeof noteSchema>;

const oneRevision = inShop.extend({ revisionId: z.uuid() });
const oneNote = inShop.extend({ noteId: z.uuid() });
const said = (longest: number) => writtenText(longest).refine((text) => text.length > 0, "Write something first.");

export const listNotes = endpoint({
  ...addresses.listNotes,
  summary: "Notes of a revision, those carried over too",
  params: oneRevision,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(noteSchema),
});
export const addNote = endpoint({
  ...addresses.addNote,
  summary: "Leave a note at a spot",
  params: oneRevision,
  query: nothing,
  body: z.strictObject({
    text: said(4000),
    kind: noteKind,
    anchor: anchorSchema,
    shopOnly: z.boolean().default(false),
  }),
  result: noteSchema,
  status: 201,
});
export const replyToNote = endpoint({
  ...addresses.replyToNote,
  summary: "Answer a note; the shop's answer makes it answered",
  params: oneNote,
  query: nothing,
  body: z.strictObject({ text: said(4000) }),
  result: noteSchema,
  status: 201,
});
export const editNote = endpoint({
  ...addresses.editNote,
  summary: "Put right a note within five minutes of leaving it",
  params: oneNote,
  query: nothing,
  body: z.strictObject({ text: said(4000), kind: noteKind }),
  result: noteSchema,
});
export const editReply = endpoint({
  ...addresses.editReply,
  summary: "Put right a reply within five minutes of sending it",
  params: oneNote.extend({ replyId: z.uuid() }),
  query: nothing,
  body: z.strictObject({ text: said(4000) }),
  result: noteSchema,
});
export const setNoteState = endpoint({
  ...addresses.setNoteState,
  summary: "Settle a note or open it again",
  params: oneNote,
  query: nothing,
  body: z.strictObject({ state: z.enum(["settled", "open"]) }),
  result: noteSchema,
});
