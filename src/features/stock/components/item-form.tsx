import { useQuery } from "@tanstack/react-query";
import { useEffect, useRef } from "react";
import type { StockEntry } from "#shared/contracts/stock-entry.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { screwsQuery } from "../api/queries.ts";
import type { WrittenEntry } from "../model/written.ts";
import { AcrylicFields } from "./acrylic-fields.tsx";
import { AdhesiveFields } from "./adhesive-fields.tsx";
import { HardwareFields } from "./hardware-fields.tsx";
import { ScrewFields } from "./screw-fields.tsx";
import { useItemForm } from "./use-item-form.ts";
import { WoodFields } from "./wood-fields.tsx";

type ItemFormProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly start: WrittenEntry;
  readonly version: number;
  readonly action: string;
  readonly send: (entry: StockEntry, version: number) => Promise<unknown>;
  readonly onChanged: (isChanged: boolean) => void;
};

/** One item of the stock, by the fields of its kind. */
export function ItemForm({ shop, unit, start, version, action, send, onChanged }: ItemFormProps) {
  const item = useItemForm({ unit, start, version, send });
  const { faults, newer, problem, busy } = item;
  const report = useRef<HTMLDivElement>(null);
  // A long form's end may lie below what is shown. Where a field is at fault, that one is gone to instead.
  const concernsAll = newer !== null || (problem !== null && faults.size === 0);
  useEffect(() => {
    if (concernsAll) report.current?.scrollIntoView({ block: "nearest" });
  }, [concernsAll]);
  const change = (entry: WrittenEntry) => {
    item.change(entry);
    onChanged(true);
  };
  return (
    <form ref={item.form} noValidate onSubmit={item.handleSubmit} className="space-y-5">
      <KindFields shop={shop} unit={unit} entry={item.entry} faults={faults} onChange={change} />
      <div ref={report} className="space-y-3">
        {newer && (
          <Notice tone="caution" title="Not saved: somebody else changed it meanwhile.">
            <p>They saved it as “{newer.name}”. What you wrote is still here.</p>
            <div className="mt-2 flex flex-wrap gap-3">
              <Button size="small" onClick={item.keepMine}>
                Save mine over it
              </Button>
              <Button size="small" onClick={item.takeTheirs}>
                Take theirs
              </Button>
            </div>
          </Notice>
        )}
        {problem && <Notice tone="error">{problem}</Notice>}
      </div>
      {!problem && faults.size > 0 && (
        <p role="status" className="text-sm text-oxblood">
          {faults.size === 1 ? "One thing has to be mended first." : `${faults.size} things have to be mended first.`}
        </p>
      )}
      <Button type="submit" kind="primary" busy={busy} disabled={!item.isChanged && !busy}>
        {action}
      </Button>
    </form>
  );
}

function KindFields({
  shop,
  unit,
  entry,
  faults,
  onChange,
}: Pick<ItemFormProps, "shop" | "unit"> & {
  readonly entry: WrittenEntry;
  readonly faults: ReturnType<typeof useItemForm>["faults"];
  readonly onChange: (entry: WrittenEntry) => void;
}) {
  const screws = useQuery({ ...screwsQuery(shop), enabled: entry.kind === "hardware" });
  switch (entry.kind) {
    case "acrylic":
      return <AcrylicFields unit={unit} entry={entry} faults={faults} onChange={onChange} />;
    case "wood":
      return <WoodFields unit={unit} entry={entry} faults={faults} onChange={onChange} />;
    case "hardware":
      return (
        <HardwareFields
          unit={unit}
          entry={entry}
          screws={screws.isPending ? null : (screws.data ?? []).map(({ screw }) => screw)}
          faults={faults}
          onChange={onChange}
        />
      );
    case "screw":
      return (
        <>
          <ScrewFields
            unit={unit}
            screw={entry.screw}
            faults={faults}
            within="screw"
            onChange={(screw) => onChange({ ...entry, screw })}
          />
          <NumberField
            label="On hand"
            hint="Leave it empty while nobody has counted."
            className="max-w-60"
            value={entry.quantity}
            onChange={(quantity) => onChange({ ...entry, quantity })}
            error={faults.get("quantity")}
          />
        </>
      );
    case "adhesive":
      return <AdhesiveFields entry={entry} faults={faults} onChange={onChange} />;
  }
}
