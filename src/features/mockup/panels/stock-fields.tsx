import type { Wood } from "#shared/mockup/document.ts";
import { formatLength } from "#shared/units/format-length.ts";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { isSameStock, thicknessChoices, withCurrent } from "../model/stock-choices.ts";

type WoodSelectProps = {
  readonly label: string;
  readonly value: Wood;
  /** The one in the drawing, offered also when the stock has it no more. */
  readonly drawn: Wood;
  readonly onChange: (wood: Wood) => void;
};

/** A wood out of the shop's stock. */
export function WoodSelect({ label, value, drawn, onChange }: WoodSelectProps) {
  const { stock } = useDesk();
  const woods = withCurrent(
    withCurrent(
      stock.woods.map(({ wood }) => wood),
      drawn,
    ),
    value,
  );
  return (
    <Select
      label={label}
      value={woods.findIndex((one) => isSameStock(one, value))}
      onChange={(event) => {
        const chosen = woods[Number(event.target.value)];
        if (chosen) onChange(chosen);
      }}
    >
      {woods.map((one, index) => (
        <option key={`${one.stockId} ${one.name}`} value={index}>
          {one.name}
        </option>
      ))}
    </Select>
  );
}

type ThicknessSelectProps = {
  readonly label: string;
  readonly wood: Wood;
  readonly value: number;
  readonly onChange: (mm: number) => void;
};

/** A thickness that the wood comes in, or the one that is drawn. */
export function ThicknessSelect({ label, wood, value, onChange }: ThicknessSelectProps) {
  const { stock, unit } = useDesk();
  const stocked = stock.woods.find((one) => isSameStock(one.wood, wood))?.thicknessesMm ?? [];
  return (
    <Select label={`${label}, ${unit}`} value={value} onChange={(event) => onChange(Number(event.target.value))}>
      {thicknessChoices(stocked, value).map((one) => (
        <option key={one} value={one}>
          {formatLength(one, unit)}
        </option>
      ))}
    </Select>
  );
}

const grains = [
  { turn: 0, text: "along the width" },
  { turn: 90, text: "along the height" },
] as const;

type GrainSelectProps = {
  readonly label: string;
  readonly value: number;
  /** The turn in the drawing, offered also when it is aslant. */
  readonly drawn: number;
  readonly onChange: (turn: number) => void;
};

/** Which way the grain of a board runs. */
export function GrainSelect({ label, value, drawn, onChange }: GrainSelectProps) {
  const turns = grains.some(({ turn }) => turn === drawn)
    ? grains
    : [...grains, { turn: drawn, text: `at ${drawn}° to the width` }];
  return (
    <Select label={label} value={value} onChange={(event) => onChange(Number(event.target.value))}>
      {turns.map(({ turn, text }) => (
        <option key={turn} value={turn}>
          {text}
        </option>
      ))}
    </Select>
  );
}
