import { Popover } from "radix-ui";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { spacingRange, usualAids } from "../model/desk-aids.ts";
import { CellLength, WordButton } from "./cell-controls.tsx";

/** Rulers, grid and margin of the elevation: each person's own, and no part of the sign. */
export function AidsTools() {
  const { aids, changeAids, unit } = useDesk();
  const { rulers, grid, gridMm, gridCatches, marginMm } = aids;
  return (
    <Popover.Root>
      <Popover.Trigger asChild>
        <WordButton>{grid ? `Grid ${formatLengthWithUnit(gridMm, unit)}` : "Rulers, grid"}</WordButton>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={6}
          aria-label="Rulers, grid and margin"
          className="z-40 w-76 rounded border border-graphite bg-sheet px-4 py-2"
        >
          <Checkbox
            label="Rulers"
            checked={rulers}
            onChange={({ currentTarget }) => changeAids({ rulers: currentTarget.checked })}
          />
          <Checkbox
            label="Grid on the board"
            checked={grid}
            onChange={({ currentTarget }) => changeAids({ grid: currentTarget.checked })}
          />
          <Length
            name="Spacing of the grid"
            mm={gridMm}
            disabled={!grid}
            onCommit={(mm) => changeAids({ gridMm: mm })}
          />
          <Checkbox
            label="Its lines catch"
            checked={gridCatches}
            disabled={!grid}
            onChange={({ currentTarget }) => changeAids({ gridCatches: currentTarget.checked })}
          />
          <Checkbox
            label="A margin inside the board catches"
            checked={marginMm !== null}
            onChange={({ currentTarget }) =>
              changeAids({ marginMm: currentTarget.checked ? usualAids(unit).marginMm : null })
            }
          />
          <Length
            name="Width of the margin"
            mm={marginMm ?? usualAids(unit).marginMm ?? 0}
            disabled={marginMm === null}
            onCommit={(mm) => changeAids({ marginMm: mm })}
          />
          <p className="border-t border-rule pt-2 pb-1 text-fine text-graphite">
            Dragged pieces catch edges, middles and equal gaps, too. With Alt held they catch nothing.
          </p>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

type LengthProps = {
  readonly name: string;
  readonly mm: number;
  readonly disabled: boolean;
  readonly onCommit: (mm: number) => void;
};

function Length({ name, ...length }: LengthProps) {
  const { unit } = useDesk();
  return (
    <span className="flex items-center gap-2 pb-1 pl-8 text-sm text-ink">
      <span className="w-36">{name}</span>
      <span className="w-16">
        <CellLength {...length} unit={unit} bounds={spacingRange} aria-label={name} />
      </span>
      {unit === "mm" && <span className="text-graphite">mm</span>}
    </span>
  );
}
