import { Popover } from "radix-ui";
import { useState } from "react";
import { type LinedUpBy, linedUpBy } from "#shared/setting-out/line-up.ts";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { type LinedUpWith, lineUp } from "../model/commands/line-up.ts";
import { heapsOf, type Together, togethers, usualTogether } from "../model/together.ts";
import { WordButton } from "./cell-controls.tsx";
import { ToolWord } from "./tool-word.tsx";

const others: readonly LinedUpWith[] = ["the board", "each other", "the first chosen"];

/** Lines up what is chosen by an edge or a middle; it stays open, so that one can be tried after the other. */
export function LineUpPopover({ why }: { readonly why: string | null }) {
  const [open, setOpen] = useState(false);
  if (why !== null && !open) return <ToolWord why={why}>line up</ToolWord>;
  return (
    <Popover.Root open={open} onOpenChange={setOpen}>
      <Popover.Trigger asChild>
        <ToolWord why={null}>line up</ToolWord>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          role="group"
          aria-label="Line up"
          align="start"
          sideOffset={4}
          className="z-40 w-96 space-y-3 border border-ink bg-sheet p-4"
        >
          <LineUpForm why={why} />
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

function LineUpForm({ why }: { readonly why: string | null }) {
  const { document, selection, edit, say } = useDesk();
  const { pieceIds } = selection;
  const usual = usualTogether(document, pieceIds);
  const [chosen, setChosen] = useState<Together | null>(null);
  const together = chosen ?? usual;
  const isOne = heapsOf(document, pieceIds, together).length < 2;
  const [to, setTo] = useState<LinedUpWith>(isOne ? "the board" : "each other");
  const whyNot = why ?? (isOne && to !== "the board" ? `There is only one to line up with ${to}.` : null);

  function press(by: LinedUpBy) {
    const how = { pieceIds, together, by, to };
    if (lineUp(document, how) === document) say(`They lie so already: ${by}, with ${to}.`);
    else edit({ label: `Line up ${by} with ${to}`, change: (before) => lineUp(before, how) });
  }
  const word = (by: LinedUpBy) => (
    <ToolWord key={by} why={whyNot} className="text-center" onClick={() => press(by)}>
      {by}
    </ToolWord>
  );

  return (
    <>
      <div className="grid grid-cols-2 gap-3">
        <Select
          label="With"
          value={to}
          onChange={(event) => setTo(others.find((one) => one === event.target.value) ?? to)}
        >
          {others.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </Select>
        <Select
          label="What moves"
          value={together}
          onChange={(event) => setChosen(togethers.find((one) => one === event.target.value) ?? together)}
        >
          {togethers.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </Select>
      </div>
      <div className="grid grid-cols-3 gap-1">{linedUpBy.map(word)}</div>
      {whyNot !== null && <p className="text-fine text-graphite">{whyNot}</p>}
      <p className="text-right">
        <Popover.Close asChild>
          <WordButton>Done</WordButton>
        </Popover.Close>
      </p>
    </>
  );
}
