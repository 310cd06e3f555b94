import { useEffect, useState } from "react";
import { useSessionDraft } from "@/lib/session-draft.ts";
import { emptyDraft, type NoteDraft, readNoteDraft } from "../model/note-draft.ts";
import { noteButtonId } from "./note-item.tsx";

/** The reader's side of the notes of one sheet: which is chosen, what is being written, and whether a spot is being touched. */
export function useNoteDesk(revisionId: string) {
  const [draft, setDraft] = useSessionDraft(`standproud:note:${revisionId}`, readNoteDraft);
  const [isPlacing, setPlacing] = useState(false);
  const [selectedId, setSelectedId] = useState<string | null>(null);
  const [said, setSaid] = useState("");
  /** A note that was left with words in it, until the next one is begun. */
  const [left, setLeft] = useState<NoteDraft | null>(null);

  useEffect(() => {
    if (!isPlacing) return;
    const handleKey = (event: KeyboardEvent) => {
      if (event.key === "Escape") setPlacing(false);
    };
    window.addEventListener("keydown", handleKey);
    return () => window.removeEventListener("keydown", handleKey);
  }, [isPlacing]);

  function begin() {
    setSelectedId(null);
    setLeft(null);
    setDraft(draft ?? emptyDraft);
    setPlacing(true);
  }

  /** A spot of the board in mm, and the piece and layer that were touched there. */
  function place(spot: { x: number; y: number; pieceId: string | null; layerKey: string | null }) {
    setDraft({ ...(draft ?? emptyDraft), anchor: { on: "spot", ...spot } });
    setPlacing(false);
  }

  function change(next: NoteDraft) {
    setDraft(next);
    if (next.anchor !== null) setPlacing(false);
  }

  function close() {
    setDraft(null);
    setPlacing(false);
  }

  function leave() {
    setLeft(draft !== null && draft.text.trim() !== "" ? draft : null);
    close();
  }

  function takeUpAgain() {
    setDraft(left);
    setLeft(null);
  }

  function land(noteId: string, words: string) {
    close();
    setSelectedId(noteId);
    setSaid(words);
    // The form that had the focus is gone; the new line takes it once it is drawn.
    requestAnimationFrame(() => document.getElementById(noteButtonId(noteId))?.focus({ preventScroll: true }));
  }

  return {
    draft,
    isPlacing,
    selectedId,
    said,
    begin,
    place,
    change,
    leave,
    takeUpAgain: left === null ? null : takeUpAgain,
    land,
    startPlacing: () => setPlacing(true),
    stopPlacing: () => setPlacing(false),
    select: setSelectedId,
  };
}
