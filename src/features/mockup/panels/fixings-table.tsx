import { useRef, useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Table } from "@/components/ui/table.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { boardOfDraft, measuresOf } from "../model/board-draft.ts";
import { mostFixings, spreadFixings } from "../model/fixings.ts";
import { coordinateBounds } from "../model/limits.ts";
import { CellLength, WordButton } from "./cell-controls.tsx";
import { DeskCell, DeskHead, DeskRowHead } from "./desk-table.tsx";

/** Where the wall's fixings are: spread along the upper edge, or each at its place. */
export function FixingsTable({ writing }: { readonly writing: BoardWriting }) {
  const { document, unit } = useDesk();
  const { draft, set, problems } = writing;
  const [count, setCount] = useState<number | null>(draft.fixings.length || 2);
  const [below, setBelow] = useState<number | null>(30);
  const add = useRef<HTMLButtonElement>(null);
  const { width, height } = measuresOf(draft, document);
  const isCount = count !== null && Number.isInteger(count) && count >= 1 && count <= mostFixings;
  const isBelow = below !== null && below >= 0 && below <= height;
  const change = (id: string, to: { fromX?: number; fromY?: number }) =>
    set({ fixings: draft.fixings.map((one) => (one.id === id ? { ...one, ...to } : one)) });

  function spread() {
    if (!isCount || !isBelow) return;
    const board = boardOfDraft(draft, document);
    set({
      fixings: spreadFixings(board, { count, below }).map(({ x, y }) => ({
        id: newId(),
        fromX: x - width / 2,
        fromY: y - height / 2,
      })),
    });
  }

  return (
    <fieldset
      className="min-w-0"
      onKeyDown={(event) => {
        // Enter takes what is written here; it does not send the whole form.
        if (event.key === "Enter" && event.target instanceof HTMLInputElement) event.preventDefault();
      }}
    >
      <legend className="pb-1 font-sans text-sm font-semibold text-ink">
        Where the fixings are
        <span className="pl-2 font-normal text-graphite" role="status">
          {draft.fixings.length === 0 ? "not said" : counted(draft.fixings.length, "place")}
        </span>
      </legend>
      <div className="flex flex-wrap items-end gap-3">
        <NumberField
          className="w-24"
          label="How many"
          value={count}
          onChange={setCount}
          error={isCount || count === null || Number.isNaN(count) ? undefined : `From 1 to ${mostFixings}.`}
        />
        <div className="w-44">
          <LengthField
            label="Below the upper edge"
            unit={unit}
            value={below}
            onChange={setBelow}
            error={isBelow || below === null || Number.isNaN(below) ? undefined : "Within the board."}
          />
        </div>
        <Button disabled={!isCount || !isBelow} onClick={spread}>
          Spread them evenly
        </Button>
      </div>
      {draft.fixings.length > 0 && (
        <Table caption="Places of the fixings" className="mt-2 max-w-md">
          <thead>
            <tr>
              {["Fixing", `x, ${unit}`, `y, ${unit}`].map((head) => (
                <DeskHead key={head}>{head}</DeskHead>
              ))}
              <DeskHead>
                <span className="sr-only">Removal</span>
              </DeskHead>
            </tr>
          </thead>
          <tbody>
            {draft.fixings.map(({ id, fromX, fromY }, index) => {
              const title = `fixing ${index + 1}`;
              const problem = problems.fixings.get(id);
              const tie = problem === undefined ? {} : { "aria-invalid": true, "aria-describedby": `${id}-problem` };
              return (
                <tr key={id}>
                  <DeskRowHead>{index + 1}</DeskRowHead>
                  <DeskCell className="w-28">
                    <CellLength
                      {...tie}
                      aria-label={`x of ${title}`}
                      mm={width / 2 + fromX}
                      unit={unit}
                      bounds={coordinateBounds}
                      onCommit={(mm) => change(id, { fromX: mm - width / 2 })}
                    />
                  </DeskCell>
                  <DeskCell className="w-28">
                    <CellLength
                      {...tie}
                      aria-label={`y of ${title}`}
                      mm={height / 2 + fromY}
                      unit={unit}
                      bounds={coordinateBounds}
                      onCommit={(mm) => change(id, { fromY: mm - height / 2 })}
                    />
                  </DeskCell>
                  <DeskCell>
                    <WordButton
                      aria-label={`Remove ${title}`}
                      onClick={() => {
                        set({ fixings: draft.fixings.filter((one) => one.id !== id) });
                        add.current?.focus();
                      }}
                    >
                      Remove
                    </WordButton>
                    {problem && (
                      <span id={`${id}-problem`} className="pl-2 text-oxblood">
                        {problem}
                      </span>
                    )}
                  </DeskCell>
                </tr>
              );
            })}
          </tbody>
        </Table>
      )}
      <p className="pt-1 text-sm text-graphite">
        <WordButton
          ref={add}
          className="-ml-1"
          disabled={draft.fixings.length >= mostFixings}
          onClick={() =>
            set({ fixings: [...draft.fixings, { id: newId(), fromX: 0, fromY: Math.min(30, height) - height / 2 }] })
          }
        >
          Add a place
        </WordButton>{" "}
        x and y are from the board’s upper left corner.
      </p>
    </fieldset>
  );
}
