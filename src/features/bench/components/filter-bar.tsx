import { jobState, move } from "#shared/contracts/jobs.ts";
import { Select } from "@/components/ui/select.tsx";
import { capitalised } from "@/lib/format.ts";
import type { JobFilter } from "../api/queries.ts";

const moves: Record<(typeof move.options)[number], string> = {
  ours: "Our move",
  client: "The client's move",
  nobody: "Nobody's move",
};

/** Choices that narrow or order the Bench. */
export function FilterBar({
  filter,
  onChange,
}: {
  readonly filter: JobFilter;
  readonly onChange: (name: "state" | "move" | "sort", value: string) => void;
}) {
  return (
    <div className="grid grid-cols-2 gap-3 sm:flex sm:flex-wrap">
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
  );
}
