import { formatLength } from "#shared/units/format-length.ts";
import { Select } from "@/components/ui/select.tsx";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { HoldChoice } from "../model/commands/new-layer.ts";
import { optionsOfHold } from "../model/stock-choices.ts";

/** What a new layer is cut from and held by, as places in the stock lists. */
export type LayerChoice = { readonly sheet: number; readonly thickness: number; readonly hold: number };

type LayerFieldsProps = {
  readonly choice: LayerChoice;
  readonly onChange: (choice: LayerChoice) => void;
  /** Ends each label for screen readers when there are several layers: "of #27314F". */
  readonly of?: string;
  readonly hint?: string;
  /** One below the other, where there is not room for three beside each other. */
  readonly narrow?: boolean;
};

/** Stock, thickness and hold of a layer that is to be made. */
export function LayerFields({ choice, onChange, of = "", hint, narrow = false }: LayerFieldsProps) {
  const { stock, unit } = useDesk();
  const sheet = stock.acrylics[choice.sheet];
  const label = (text: string) => (
    <>
      {text}
      <span className="sr-only"> {of}</span>
    </>
  );

  function changeSheet(index: number) {
    const thicknesses = stock.acrylics[index]?.thicknessesMm ?? [];
    const thickness = thicknesses.includes(choice.thickness) ? choice.thickness : (thicknesses[0] ?? choice.thickness);
    onChange({ ...choice, sheet: index, thickness });
  }

  return (
    <div className={cx("grid gap-3", narrow ? "grid-cols-2 *:last:col-span-2" : "sm:grid-cols-[3fr_2fr_4fr]")}>
      <Select
        label={label("Stock")}
        {...(hint ? { hint } : {})}
        value={choice.sheet}
        onChange={(event) => changeSheet(Number(event.target.value))}
      >
        {stock.acrylics.map(({ acrylic }, index) => (
          <option key={`${acrylic.stockId} ${acrylic.name}`} value={index}>
            {acrylic.name}
          </option>
        ))}
      </Select>
      <Select
        label={label(`Thickness, ${unit}`)}
        value={choice.thickness}
        onChange={(event) => onChange({ ...choice, thickness: Number(event.target.value) })}
      >
        {(sheet?.thicknessesMm ?? []).map((thickness) => (
          <option key={thickness} value={thickness}>
            {formatLength(thickness, unit)}
          </option>
        ))}
      </Select>
      <Select
        label={label("Held by")}
        value={choice.hold}
        onChange={(event) => onChange({ ...choice, hold: Number(event.target.value) })}
      >
        {optionsOfHold(stock).map((option, index) => (
          <option key={nameOfHold(option)} value={index}>
            {nameOfHold(option)}
          </option>
        ))}
      </Select>
    </div>
  );
}

/** A hold in words, as its choice names it. */
export function nameOfHold(option: HoldChoice): string {
  return option.kind === "standoff" ? option.hardware.name : `${option.kind}, ${option.adhesive.name}`;
}
