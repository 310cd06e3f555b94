import { formatLength } from "#shared/units/format-length.ts";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { isSameStock, thicknessChoices, withCurrent } from "../model/stock-choices.ts";

const grains = [
  { turn: 0, text: "along the width" },
  { turn: 90, text: "along the height" },
] as const;

/** What the board is cut from, which way its grain runs, and how many there are. */
export function BoardWood({ writing }: { readonly writing: BoardWriting }) {
  const { document, stock, unit } = useDesk();
  const { draft, set, problemOf } = writing;
  const woods = withCurrent(
    stock.woods.map(({ wood }) => wood),
    document.backer.stock,
  );
  const stocked = stock.woods.find((one) => isSameStock(one.wood, draft.stock))?.thicknessesMm ?? [];
  const turns = grains.some(({ turn }) => turn === document.backer.grainTurn)
    ? grains
    : [...grains, { turn: document.backer.grainTurn, text: `at ${document.backer.grainTurn}° to the width` }];
  return (
    <div className="grid gap-3 sm:grid-cols-2 md:grid-cols-4">
      <Select
        label={document.backer.slats ? "Wood under the slats" : "Wood"}
        value={woods.findIndex((one) => isSameStock(one, draft.stock))}
        onChange={(event) => {
          const chosen = woods[Number(event.target.value)];
          if (chosen) set({ stock: chosen });
        }}
      >
        {woods.map((one, index) => (
          <option key={`${one.stockId} ${one.name}`} value={index}>
            {one.name}
          </option>
        ))}
      </Select>
      <Select
        label={`Thickness, ${unit}`}
        value={draft.thickness}
        onChange={(event) => set({ thickness: Number(event.target.value) })}
      >
        {thicknessChoices(stocked, draft.thickness).map((one) => (
          <option key={one} value={one}>
            {formatLength(one, unit)}
          </option>
        ))}
      </Select>
      <Select
        label="Grain runs"
        value={draft.grainTurn}
        onChange={(event) => set({ grainTurn: Number(event.target.value) })}
      >
        {turns.map(({ turn, text }) => (
          <option key={turn} value={turn}>
            {text}
          </option>
        ))}
      </Select>
      <NumberField
        label="Quantity"
        value={draft.quantity}
        onChange={(quantity) => set({ quantity })}
        error={problemOf("quantity", draft.quantity)}
      />
    </div>
  );
}
