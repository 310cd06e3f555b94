import { heldOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Layer } from "#shared/mockup/document.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import type { HoldChoice } from "../model/commands/new-layer.ts";
import { bondLayer, letInLayer, standLayer } from "../model/commands/set-hold.ts";
import { holdChoices, isSameStock } from "../model/stock-choices.ts";
import { CellSelect } from "./cell-controls.tsx";

/** How a layer is held: an adhesive it is bonded or let in with, or the standoff hardware it stands on. */
export function HoldCell({ layer }: { readonly layer: Layer }) {
  const { edit, stock, unit, site } = useDesk();
  const { key, hold } = layer;
  const choices = holdChoices(stock, hold);
  const count = hold.kind === "standoff" ? hold.holes.length : 0;

  function change(index: number) {
    const choice = choices[index];
    if (!choice) return;
    if (choice.kind === "standoff") {
      const id = newId();
      edit({
        label: `Stand ${key} off`,
        change: (before) => standLayer(before, { key, hardware: choice.hardware, id, site }),
      });
      return;
    }
    const { kind, adhesive } = choice;
    edit({
      label: kind === "bond" ? `Bond ${key}` : `Let ${key} in`,
      change: (before) => (kind === "bond" ? bondLayer : letInLayer)(before, { key, adhesive }),
    });
  }

  const options = (kind: HoldChoice["kind"]) =>
    choices.map(
      (choice, index) =>
        choice.kind === kind && (
          // What is drawn may be one of the stock with another screw: its id and name then stand here twice.
          <option key={`${kind} ${idOf(choice)} ${screwOf(choice)}`} value={index}>
            {wordsOf(choice, unit)}
            {choices.some((other) => other !== choice && isNamedAlike(other, choice)) && screwOf(choice)}
          </option>
        ),
    );

  return (
    <span className="flex items-center gap-1.5">
      {hold.kind === "standoff" && <span className="whitespace-nowrap">{count} ×</span>}
      <CellSelect
        aria-label={`How ${key} is held`}
        disabled={layer.locked}
        value={choices.findIndex((choice) => isChoiceOf(choice, layer))}
        onChange={(event) => change(Number(event.target.value))}
      >
        <optgroup label="Bonded">{options("bond")}</optgroup>
        <optgroup label="Let in">{options("pocket")}</optgroup>
        <optgroup label="On standoffs">{options("standoff")}</optgroup>
      </CellSelect>
    </span>
  );
}

const idOf = (choice: HoldChoice): string => {
  const { stockId, name } = choice.kind === "standoff" ? choice.hardware : choice.adhesive;
  return `${stockId} ${name}`;
};

const screwOf = (choice: HoldChoice): string =>
  choice.kind === "standoff" && "screw" in choice.hardware ? `, ${choice.hardware.screw.name}` : "";

const isNamedAlike = (a: HoldChoice, b: HoldChoice): boolean =>
  a.kind === "standoff" && b.kind === "standoff" && a.hardware.name === b.hardware.name;

function wordsOf(choice: HoldChoice, unit: LengthUnit): string {
  if (choice.kind !== "standoff") return `${choice.kind}, ${choice.adhesive.name}`;
  const held = heldOffsetMm(choice.hardware);
  return held === null
    ? `${choice.hardware.name}, any offset`
    : `${choice.hardware.name}, stands ${formatLengthWithUnit(held, unit)} off`;
}

function isChoiceOf(choice: HoldChoice, { hold }: Layer): boolean {
  if (choice.kind === "standoff") return hold.kind === "standoff" && isSameStock(choice.hardware, hold.hardware);
  return hold.kind === choice.kind && isSameStock(choice.adhesive, hold.adhesive);
}
