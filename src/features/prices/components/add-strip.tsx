import { useState } from "react";
import { stripId } from "#shared/cost/entry-ids.ts";
import { stripName, type Thing } from "#shared/cost/things-to-price.ts";
import type { Stock } from "#shared/materials/stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";

type AddStripProps = {
  readonly stock: Stock;
  readonly unit: LengthUnit;
  readonly onAdd: (thing: Thing) => void;
};

const isLength = (mm: number | null): mm is number => mm !== null && mm > 0 && mm <= 500;

/** A section of a wood in stock that slats or frames are cut from. */
export function AddStrip({ stock, unit, onAdd }: AddStripProps) {
  const [chosen, setChosen] = useState(0);
  const [widthMm, setWidth] = useState<number | null>(null);
  const [thicknessMm, setThickness] = useState<number | null>(null);
  const [asked, setAsked] = useState(false);
  const wood = stock.woods[chosen]?.wood;
  if (!wood) return null;
  const fault = (mm: number | null) =>
    asked && !isLength(mm) ? `Over 0, up to ${unit === "mm" ? "500 mm" : "19 11/16″"}.` : undefined;
  const add = () => {
    setAsked(true);
    if (!isLength(widthMm) || !isLength(thicknessMm)) return;
    const section = { widthMm, thicknessMm };
    onAdd({ id: stripId(wood, section, stock), name: stripName(wood.name, section, unit) });
    setWidth(null);
    setThickness(null);
    setAsked(false);
  };
  return (
    <fieldset className="mt-3 grid max-w-3xl grid-cols-2 items-start gap-3 md:grid-cols-[minmax(0,1fr)_9rem_9rem_auto]">
      <legend className="sr-only">Add a strip</legend>
      <Select
        label="Strip of"
        className="col-span-2 md:col-span-1"
        value={chosen}
        onChange={(event) => setChosen(Number(event.target.value))}
      >
        {stock.woods.map(({ wood: { stockId, name } }, index) => (
          <option key={stockId ?? name} value={index}>
            {name}
          </option>
        ))}
      </Select>
      <LengthField label="Wide" unit={unit} value={widthMm} onChange={setWidth} error={fault(widthMm)} />
      <LengthField label="Thick" unit={unit} value={thicknessMm} onChange={setThickness} error={fault(thicknessMm)} />
      <Button className="col-span-2 justify-self-start md:col-span-1 md:mt-6" onClick={add}>
        Add the strip
      </Button>
    </fieldset>
  );
}
