import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { BoardSlats } from "./board-slats.tsx";
import { GrainSelect, ThicknessSelect, WoodSelect } from "./stock-fields.tsx";

/** What the board is made of, a plank or slats on a substrate, and how many there are. */
export function BoardBacker({ writing }: { readonly writing: BoardWriting }) {
  const { document } = useDesk();
  const { draft, set, problemOf } = writing;
  const { backer } = document;
  const { substrate } = draft;
  const kind = (
    <Select
      label="Backer is"
      value={draft.backerIs}
      onChange={(event) => set({ backerIs: event.target.value === "slats" ? "slats" : "plank" })}
    >
      <option value="plank">a plank</option>
      <option value="slats">slats on a substrate</option>
    </Select>
  );
  const quantity = (
    <NumberField
      label="Quantity"
      value={draft.quantity}
      onChange={(count) => set({ quantity: count })}
      error={problemOf("quantity", draft.quantity)}
    />
  );
  const grain = (label: string) => (
    <GrainSelect
      label={label}
      value={draft.grainTurn}
      drawn={backer.grainTurn}
      onChange={(grainTurn) => set({ grainTurn })}
    />
  );
  return (
    <>
      <div className="grid items-start gap-3 sm:grid-cols-2 md:grid-cols-4">
        {kind}
        {draft.backerIs === "plank" ? (
          <>
            <WoodSelect
              label="Wood"
              value={draft.stock}
              drawn={backer.stock}
              onChange={(wood) => set({ stock: wood })}
            />
            <ThicknessSelect
              label="Thickness"
              wood={draft.stock}
              value={draft.thickness}
              onChange={(thickness) => set({ thickness })}
            />
            {grain("Grain runs")}
          </>
        ) : (
          <>
            <WoodSelect
              label="Substrate"
              value={substrate.stock}
              drawn={backer.stock}
              onChange={(wood) => set({ substrate: { ...substrate, stock: wood } })}
            />
            <ThicknessSelect
              label="Its thickness"
              wood={substrate.stock}
              value={substrate.thickness}
              onChange={(thickness) => set({ substrate: { ...substrate, thickness } })}
            />
            {grain("Its grain runs")}
          </>
        )}
        {quantity}
      </div>
      {draft.backerIs === "slats" && <BoardSlats writing={writing} />}
    </>
  );
}
