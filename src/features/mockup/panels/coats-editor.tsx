import { type RefObject, useEffect, useRef, useState } from "react";
import { finishColour } from "#shared/colour/finish-colour.ts";
import { hoursWords } from "#shared/dry-fit/words.ts";
import type { Coat } from "#shared/mockup/document.ts";
import { dryingHours } from "#shared/mockup/drying-hours.ts";
import { finishWords } from "#shared/mockup/finish-words.ts";
import { newId } from "../editor/new-id.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { faceStockOfDraft } from "../model/backer-draft.ts";
import { type CoatDraft, coatsOf, mostCoats, moveCoat, newCoat } from "../model/coat-draft.ts";
import { Swatch, WordButton } from "./cell-controls.tsx";
import { CoatItem } from "./coat-item.tsx";

const kinds: readonly { readonly kind: Coat["kind"]; readonly text: string }[] = [
  { kind: "sanding", text: "sanding" },
  { kind: "conditioner", text: "conditioner" },
  { kind: "stain", text: "stain" },
  { kind: "clear coat", text: "clear coat" },
  { kind: "other", text: "other" },
];

/** The finish as its coats in the order they go on, and how the wood is estimated to look under them. */
export function CoatsEditor({ writing }: { readonly writing: BoardWriting }) {
  const { draft, set, problems, tried } = writing;
  const { finish } = draft;
  const list = useRef<HTMLOListElement>(null);
  const [said, setSaid] = useState("");
  const { focusOn, rest } = useFocusIn(list);
  const change = (next: readonly CoatDraft[]) => set({ finish: next });
  const bare = faceStockOfDraft(draft).colour;
  const coats = coatsOf(finish);
  const hours = dryingHours(coats);

  function add(kind: Coat["kind"]) {
    const coat = newCoat(kind, newId());
    change([...finish, coat]);
    focusOn(coat.id, "input");
    setSaid(`Coat ${finish.length + 1} added.`);
  }

  function remove(id: string) {
    const index = finish.findIndex((coat) => coat.id === id);
    const next = finish[index + 1] ?? finish[index - 1];
    change(finish.filter((coat) => coat.id !== id));
    focusOn(next?.id ?? null, "button");
    setSaid(`Coat ${index + 1} removed.`);
  }

  function move(id: string, by: -1 | 1) {
    change(moveCoat(finish, id, by));
    focusOn(id, by < 0 ? "[data-way=up]" : "[data-way=down]");
    setSaid(`Now coat ${finish.findIndex((coat) => coat.id === id) + 1 + by}.`);
  }

  return (
    <div>
      {finish.length === 0 ? (
        <p className="text-base text-graphite">The wood stays bare. Add what goes on it, first coat first.</p>
      ) : (
        <ol ref={list} aria-label="Coats, first to last" className="divide-y divide-rule">
          {finish.map((coat, index) => (
            <CoatItem
              key={coat.id}
              coat={coat}
              place={index + 1}
              of={finish.length}
              problems={problems.coats.get(coat.id) ?? {}}
              tried={tried}
              onChange={(more) => change(finish.map((one) => (one.id === coat.id ? { ...one, ...more } : one)))}
              onMove={(by) => move(coat.id, by)}
              onRemove={() => remove(coat.id)}
            />
          ))}
        </ol>
      )}
      <fieldset ref={rest} tabIndex={-1} className="flex flex-wrap items-center gap-x-3 pt-2">
        <legend className="float-left pr-3 text-sm font-semibold text-ink">Add</legend>
        {kinds.map(({ kind, text }) => (
          <WordButton key={kind} disabled={finish.length >= mostCoats} onClick={() => add(kind)}>
            {text}
          </WordButton>
        ))}
        {finish.length >= mostCoats && <span className="text-fine text-graphite">{mostCoats} coats are the most.</span>}
      </fieldset>
      <p role="status" className="sr-only">
        {said}
      </p>
      <div className="mt-2 flex flex-wrap items-center gap-x-6 gap-y-1 bg-linen px-3 py-2 text-sm text-ink">
        <span className="flex items-center gap-2">
          <Swatch large colour={bare} />
          bare
        </span>
        {coats.length > 0 && (
          <>
            <span className="flex items-center gap-2">
              <Swatch large colour={finishColour(bare, coats)} />
              under its finish, an estimate
            </span>
            <span className="min-w-0 wrap-anywhere">
              {finishWords(coats)}
              {hours > 0 && <span className="text-graphite">, dries {hoursWords(hours)} in all</span>}
            </span>
          </>
        )}
      </div>
    </div>
  );
}

/** Where the focus goes once the list is drawn again: into a coat, or to what adds one when there is none. */
function useFocusIn(list: RefObject<HTMLOListElement | null>) {
  const [target, setTarget] = useState<{ readonly id: string | null; readonly at: string } | null>(null);
  const rest = useRef<HTMLFieldSetElement>(null);
  useEffect(() => {
    if (target === null) return;
    const item = target.id === null ? null : list.current?.querySelector(`[data-coat="${CSS.escape(target.id)}"]`);
    const found = item?.querySelector<HTMLElement>(`${target.at}:not(:disabled)`);
    const fallback = item?.querySelector<HTMLElement>("button:not(:disabled)") ?? rest.current;
    (found ?? fallback)?.focus();
    setTarget(null);
  }, [target, list]);
  return { focusOn: (id: string | null, at: string) => setTarget({ id, at }), rest };
}
