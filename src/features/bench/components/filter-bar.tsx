import { useId, useState } from "react";
import { jobState, move } from "#shared/contracts/jobs.ts";
import { Button } from "@/components/ui/button.tsx";
import { Select } from "@/components/ui/select.tsx";
import { cx } from "@/lib/cx.ts";
import { capitalised } from "@/lib/format.ts";
import type { JobFilter } from "../api/queries.ts";

const moves: Record<(typeof move.options)[number], string> = {
  ours: "Our move",
  client: "The client's move",
  nobody: "Nobody's move",
};

/** Choices that narrow or order the Bench. On a phone they stand behind a button, so that the jobs come first. */
export function FilterBar({
  filter,
  onChange,
}: {
  readonly filter: JobFilter;
  readonly onChange: (name: "state" | "move" | "sort", value: string) => void;
}) {
  const id = useId();
  const [open, setOpen] = useState(false);
  const narrowed = [filter.whoseMove, filter.state].filter(Boolean).length;
  return (
    <div className="w-full sm:w-auto">
      <Button
        size="small"
        className="sm:hidden"
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen((before) => !before)}
      >
        Filter and order{narrowed > 0 && ` (${narrowed} on)`}
      </Button>
      <div id={id} className={cx("grid-cols-2 gap-3 pt-3 sm:flex sm:flex-wrap sm:pt-0", open ? "grid" : "hidden")}>
        <Select
          label="Whose move"
          className="sm:w-44"
          value={filter.whoseMove ?? ""}
          onChange={(event) => onChange("move", event.target.value)}
        >
          <option value="">Everyone's</option>
          {move.options.map((name) => (
            <option key={name} value={name}>
              {moves[name]}
            </option>
          ))}
        </Select>
        <Select
          label="State"
          className="sm:w-44"
          value={filter.state ?? ""}
          onChange={(event) => onChange("state", event.target.value)}
        >
          <option value="">Any state</option>
          {jobState.options.map((name) => (
            <option key={name} value={name}>
              {capitalised(name)}
            </option>
          ))}
        </Select>
        <Select
          label="Order"
          className="col-span-2 sm:w-44"
          value={filter.sort ?? "due"}
          onChange={(event) => onChange("sort", event.target.value)}
        >
          <option value="due">Due first</option>
          <option value="newest">Newest first</option>
          <option value="number">By number</option>
        </Select>
      </div>
    </div>
  );
}
