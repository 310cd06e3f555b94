// @vitest-environment jsdom
import { act } from "react";
import { expect, it } from "vitest";
import type { DraftShelf, KeptDraft } from "@/features/mockup/editor/draft-shelf.ts";
import { useKeptDrafts } from "@/features/mockup/editor/use-kept-drafts.ts";
import { render, until } from "../../../support/render.tsx";
import { emptyMockup } from "../sample-mockup.ts";
import { memoryShelf } from "./memory-shelf.ts";

const place = { personId: "p1", shop: "copperlark-signs", jobId: "j1" };
const onServer = emptyMockup();
const draft = (deskId: string, quantity: number, keptAt: string): KeptDraft => ({
  deskId,
  version: 4,
  keptAt,
  changes: 1,
  lastChange: null,
  document: emptyMockup({ quantity }),
});

let kept: ReturnType<typeof useKeptDrafts> | null = null;
function Harness({ shelf }: { shelf: DraftShelf }) {
  kept = useKeptDrafts({ shelf, place, onServer });
  return null;
}

it("offers what was left unsaved, the newest first, and lets go of what the server has and what is thrown away", async () => {
  const shelf = memoryShelf();
  await shelf.put(place, draft("d1", 7, "2026-03-04T10:00:00.000Z"));
  await shelf.put(place, draft("d2", 8, "2026-03-04T11:00:00.000Z"));
  // The save arrived although no answer came back.
  await shelf.put(place, draft("d3", 1, "2026-03-04T12:00:00.000Z"));
  await shelf.put({ ...place, personId: "p2" }, draft("d4", 9, "2026-03-04T13:00:00.000Z"));
  const shown = () => kept?.drafts.map(({ document }) => document.quantity) ?? [];
  const desk = await render(<Harness shelf={shelf} />);
  await until(() => shown().length > 0);
  expect(shown()).toEqual([8, 7]);
  expect([...shelf.records.keys()].map((key) => key.split(" ").at(-1))).toEqual(["d1", "d2", "d4"]);
  await act(async () => kept?.forget(draft("d2", 8, "")));
  expect(shown()).toEqual([7]);
  expect((await shelf.list(place)).map(({ deskId }) => deskId)).toEqual(["d1"]);
  await desk.end();
});
