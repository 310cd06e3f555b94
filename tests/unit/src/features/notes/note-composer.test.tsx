// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act } from "react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { NoteComposer } from "@/features/notes/components/note-composer.tsx";
import { useNoteDesk } from "@/features/notes/components/use-note-desk.ts";
import { emptyDraft } from "@/features/notes/model/note-draft.ts";
import { startAnswers } from "../../support/answers.ts";
import { button, press, render, until } from "../../support/render.tsx";

const revisionId = "00000000-0000-4000-8000-000000000002";
const pieces = [
  { id: "p1", name: "Gold ring", layerKey: "C", x: 300, y: 160.5 },
  { id: "p2", name: "", layerKey: "D", x: 40, y: 340 },
];
const handleAdded = vi.fn();

function Desk({ isStaff }: { readonly isStaff: boolean }) {
  const desk = useNoteDesk(revisionId);
  return (
    <>
      <button type="button" onClick={desk.begin}>
        Add a note
      </button>
      <button type="button" onClick={() => desk.place({ x: 12.3, y: 45.6, pieceId: "p1", layerKey: "C" })}>
        Drawing
      </button>
      {desk.takeUpAgain && (
        <button type="button" onClick={desk.takeUpAgain}>
          Take it up again
        </button>
      )}
      <output>{desk.isPlacing ? "cross-hair" : "no cross-hair"}</output>
      {desk.draft && (
        <NoteComposer
          shop="copperlark-signs"
          revisionId={revisionId}
          draft={desk.draft}
          onDraft={desk.change}
          pieces={pieces}
          maySayShopOnly={isStaff}
          isPlacing={desk.isPlacing}
          onPlace={desk.startPlacing}
          onAdded={(noteId, words) => {
            desk.land(noteId, words);
            handleAdded(noteId, words);
          }}
          onLeave={desk.leave}
        />
      )}
    </>
  );
}

let server: Awaited<ReturnType<typeof startAnswers>>;
beforeEach(async () => {
  sessionStorage.clear();
  handleAdded.mockClear();
  server = await startAnswers(() => ({ status: 201, json: { id: "n5", number: 5, zone: "B3" } }));
});
afterEach(() => server.end());

const show = (isStaff = false) =>
  render(
    <QueryClientProvider client={new QueryClient()}>
      <Desk isStaff={isStaff} />
    </QueryClientProvider>,
  );

function set<T extends HTMLElement>(selector: string, kind: { prototype: T; new (): T }, value: string) {
  const control = document.querySelector(selector);
  return act(async () => {
    // React listens to the element's own setter, so the value goes in past it.
    Object.getOwnPropertyDescriptor(kind.prototype, "value")?.set?.call(control, value);
    control?.dispatchEvent(new Event(control instanceof HTMLSelectElement ? "change" : "input", { bubbles: true }));
  });
}
const write = (text: string) => set("textarea", HTMLTextAreaElement, text);
const choose = (value: string) => set("select", HTMLSelectElement, value);
const pick = async (kind: string) => {
  const radio = document.querySelector<HTMLInputElement>(`input[value="${kind}"]`);
  if (radio) await press(radio);
};
const crossHair = () => document.querySelector("output")?.textContent;

it("goes by keyboard: a piece from the list, a kind, the words", async () => {
  await show();
  await press(button("Add a note"));
  expect(crossHair()).toBe("cross-hair");
  await choose("p1");
  expect(crossHair()).toBe("no cross-hair");
  await pick("question");
  await write("Is this ring let in?");
  await press(button("Add the note"));
  await until(() => handleAdded.mock.calls.length > 0);
  expect(server.asked.map(({ body }) => body)).toEqual([
    {
      text: "Is this ring let in?",
      kind: "question",
      anchor: { on: "spot", x: 300, y: 160.5, layerKey: "C", pieceId: "p1" },
      shopOnly: false,
    },
  ]);
  expect(handleAdded).toHaveBeenCalledWith("n5", "Note 5 is on the drawing, zone B3.");
  expect(document.querySelector("form")).toBeNull();
});

it("sends the spot that was touched, not the middle of its piece", async () => {
  await show();
  await press(button("Add a note"));
  await press(button("Drawing"));
  expect(document.querySelector("select")?.selectedOptions[0]?.textContent).toBe("The spot touched, on Gold ring");
  await pick("must change");
  await write("Wider");
  await press(button("Add the note"));
  await until(() => handleAdded.mock.calls.length > 0);
  expect(server.asked[0]?.body).toMatchObject({ anchor: { on: "spot", x: 12.3, y: 45.6, pieceId: "p1" } });
});

it("keeps what is being typed over a reload of the page, and forgets it when it is left", async () => {
  const first = await show();
  await press(button("Add a note"));
  await choose("whole");
  await write("Half a thou");
  await first.end();
  await show();
  expect(document.querySelector("textarea")?.value).toBe("Half a thou");
  expect(document.querySelector("select")?.value).toBe("whole");
  await press(button("Leave it"));
  expect(document.querySelector("form")).toBeNull();
  await press(button("Add a note"));
  expect(document.querySelector("textarea")?.value).toBe(emptyDraft.text);
});

it("says what is missing and sends nothing", async () => {
  await show();
  await press(button("Add a note"));
  await press(button("Add the note"));
  for (const words of ["Touch the spot on the drawing", "Choose what kind of note", "Write something first"]) {
    expect(document.body.textContent).toContain(words);
  }
  expect(server.asked).toEqual([]);
});

it("leaves the cross-hair by Escape and keeps the note", async () => {
  await show();
  await press(button("Add a note"));
  await act(async () => window.dispatchEvent(new KeyboardEvent("keydown", { key: "Escape" })));
  expect(crossHair()).toBe("no cross-hair");
  expect(document.querySelector("form")).not.toBeNull();
});

it("offers a note for the shop alone to staff only", async () => {
  await show(true);
  await press(button("Add a note"));
  expect(document.body.textContent).toContain("Shop only");
  await press(button("Leave it"));
  await show(false);
  await press(button("Add a note"));
  expect(document.body.textContent).not.toContain("Shop only");
});

it("gives back a note that was left with words in it, and offers nothing for an empty one", async () => {
  await show();
  await press(button("Add a note"));
  await press(button("Leave it"));
  expect(document.body.textContent).not.toContain("Take it up again");
  await press(button("Add a note"));
  await write("Wider, please");
  await press(button("Leave it"));
  expect(document.querySelector("form")).toBeNull();
  await press(button("Take it up again"));
  expect(document.querySelector("textarea")?.value).toBe("Wider, please");
});
