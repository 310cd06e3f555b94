// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { beforeEach, expect, it } from "vitest";
import type { Note } from "#shared/contracts/notes.ts";
import { NoteItem } from "@/features/notes/components/note-item.tsx";
import { button, press, render } from "../../support/render.tsx";

const note: Note = {
  id: "00000000-0000-4000-8000-000000000003",
  number: 3,
  fromLetter: "A",
  kind: "question",
  state: "open",
  text: "Is it heavy?",
  shopOnly: false,
  anchor: { on: "whole" },
  zone: null,
  author: "Ines",
  side: "client",
  at: "2026-11-29T17:21:00.000Z",
  editedAt: null,
  editableUntil: null,
  replies: [],
  can: { reply: true, settle: true, reopen: false },
};

const show = (shown: Note) =>
  render(
    <QueryClientProvider client={new QueryClient()}>
      <NoteItem
        shop="a"
        revisionId="b"
        letter="A"
        note={shown}
        pieceNames={new Map()}
        isSelected={false}
        onSelect={() => undefined}
      />
    </QueryClientProvider>,
  );

beforeEach(() => window.sessionStorage.clear());

it("shows an answer that was begun before the page was loaded again, without taking the focus", async () => {
  window.sessionStorage.setItem(`standproud:reply:${note.id}`, JSON.stringify("It hangs on"));
  await show(note);
  expect(document.querySelector("textarea")?.value).toBe("It hangs on");
  expect(document.activeElement).toBe(document.body);
});

it("keeps it closed where there is none, and takes the focus when it is asked for", async () => {
  await show(note);
  expect(document.querySelector("textarea")).toBeNull();
  await press(button("Reply to note 3"));
  expect(document.activeElement).toBe(document.querySelector("textarea"));
});

it("keeps it closed where nobody may answer any more", async () => {
  window.sessionStorage.setItem(`standproud:reply:${note.id}`, JSON.stringify("It hangs on"));
  await show({ ...note, can: { reply: false, settle: false, reopen: false } });
  expect(document.querySelector("textarea")).toBeNull();
});
