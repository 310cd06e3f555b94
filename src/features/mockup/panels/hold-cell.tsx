import type { Layer } from "#shared/mockup/document.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import type { HoldChoice } from "../model/commands/new-layer.ts";
import { bondLayer, standLayer } from "../model/commands/set-hold.ts";
import { holdChoices, isSameStock } from "../model/stock-choices.ts";
import { CellSelect } from "./cell-controls.tsx";

/** How a layer is held: an adhesive it is bonded with, or the standoff hardware it stands on. */
export function HoldCell({ layer }: { readonly layer: Layer }) {
  const { edit, stock, unit, site } = useDesk();
  const { key, hold } = layer;
  const choices = holdChoices(stock, hold);
  const count = hold.kind === "standoff" ? hold.holes.length : 0;

  function change(index: number) {
    const choice = choices[index];
    if (!choice) return;
    if (choice.kind === "bond")
      edit({ label: `Bond ${key}`, change: (before) => bondLayer(before, { key, adhesive: choice.adhesive }) });
    else {
      const id = newId();
      edit({
        label: `Stand ${key} off`,
        change: (before) => standLayer(before, { key, hardware: choice.hardware, id, site }),
      });
    }
  }

  const option = (choice: HoldChoice, index: number) =>
    choice.kind === "bond" ? (
      <option key={`bond ${choice.adhesive.stockId} ${choice.adhesive.name}`} value={index}>
        bond, {choice.adhesive.name}
      </option>
    ) : (
      <option key={`standoff ${choice.hardware.stockId} ${choice.hardware.name}`} value={index}>
        {choice.hardware.name}, {formatLengthWithUnit(choice.hardware.barrelLength, unit)} barrel
      </option>
    );

  return (
    <span className="flex items-center gap-1.5">
      {hold.kind === "standoff" && <span className="whitespace-nowrap">{count} ×</span>}
      <CellSelect
        aria-label={`How ${key} is held`}
        value={choices.findIndex((choice) => isChoiceOf(choice, layer))}
        onChange={(event) => change(Number(event.target.value))}
      >
        {hold.kind === "pocket" && <option value={-1}>pocket, {hold.adhesive.name}</option>}
        <optgroup label="Bonded">
          {choices.map((choice, index) => choice.kind === "bond" && option(choice, index))}
        </optgroup>
        <optgroup label="On standoffs">
          {choices.map((choice, index) => choice.kind === "standoff" && option(choice, index))}
        </optgroup>
      </CellSelect>
    </span>
  );
}

function isChoiceOf(choice: HoldChoice, { hold }: Layer): boolean {
  if (choice.kind === "bond") return hold.kind === "bond" && isSameStock(choice.adhesive, hold.adhesive);
  return hold.kind === "standoff" && isSameStock(choice.hardware, hold.hardware);
}
