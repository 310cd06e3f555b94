import { useState } from "react";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { finishWords } from "#shared/mockup/finish-words.ts";
import { formatLength } from "#shared/units/format-length.ts";
import { Button } from "@/components/ui/button.tsx";
import { DistanceField } from "@/components/ui/distance-field.tsx";
import { Field } from "@/components/ui/field.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { type BoardFields, setBoard } from "../model/commands/set-board.ts";
import { type Bounds, boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { isSameStock, thicknessChoices, withCurrent } from "../model/stock-choices.ts";

const hangings: readonly { kind: MockupDocument["hanging"]["kind"]; text: string }[] = [
  { kind: "none", text: "not chosen" },
  { kind: "cleat", text: "cleat" },
  { kind: "keyholes", text: "keyholes" },
  { kind: "wire", text: "wire" },
  { kind: "screwed through", text: "screwed through" },
  { kind: "through standoffs", text: "through its standoffs" },
];

/** Where the light comes from, as people say it. Degrees clockwise from the top. */
const lights = [
  { azimuth: 0, text: "from above" },
  { azimuth: 45, text: "from the upper right" },
  { azimuth: 90, text: "from the right" },
  { azimuth: 270, text: "from the left" },
  { azimuth: 315, text: "from the upper left" },
] as const;

type LengthName = "width" | "height" | "gap" | "viewingDistance";
type Lengths = Readonly<Record<LengthName, number | null>>;

const bounds: Readonly<Record<LengthName, Bounds>> = {
  width: { least: 20, most: 10_000 },
  height: { least: 20, most: 10_000 },
  gap: { least: 0, most: 500 },
  viewingDistance: { least: 100, most: 200_000 },
};
const lengthNames = Object.keys(bounds) as LengthName[];

const isCount = (value: number): boolean => Number.isInteger(value) && value >= 1 && value <= 1000;

/** Size, wood and hanging of the board, and the light it is shown in. One step for all of it. */
export function BoardForm({ onDone }: { readonly onDone: () => void }) {
  const { document, stock, unit, edit } = useDesk();
  const { board, backer, hanging, presentation, quantity } = document;
  const [fields, setFields] = useState<BoardFields>({});
  const [lengths, setLengths] = useState<Lengths>({
    width: board.width,
    height: board.height,
    gap: hanging.gap,
    viewingDistance: presentation.viewingDistance,
  });
  const woods = withCurrent(
    stock.woods.map(({ wood }) => wood),
    backer.stock,
  );
  const wood = fields.stock ?? backer.stock;
  const thickness = fields.thickness ?? backer.thickness;
  const stocked = stock.woods.find((one) => isSameStock(one.wood, wood))?.thicknessesMm ?? [];
  const azimuth = fields.light?.azimuth ?? presentation.light.azimuth;

  const set = (more: BoardFields) => setFields((before) => ({ ...before, ...more }));
  const fits =
    isCount(fields.quantity ?? quantity) && lengthNames.every((name) => isWithinBounds(lengths[name], bounds[name]));
  const lengthField = (name: LengthName, label: string) => (
    <LengthField
      label={label}
      unit={unit}
      value={lengths[name]}
      onChange={(mm) => setLengths((before) => ({ ...before, [name]: mm }))}
      error={boundsProblem(lengths[name], bounds[name], unit)}
    />
  );

  function change() {
    const { gap, ...sizes } = lengths;
    if (!fits || gap === null || sizes.width === null || sizes.height === null || sizes.viewingDistance === null)
      return;
    const { width, height, viewingDistance } = sizes;
    const all = {
      ...fields,
      width,
      height,
      viewingDistance,
      hanging: { ...hanging, ...fields.hanging, gap },
    };
    edit({ label: "Change the board", change: (before) => setBoard(before, all) });
    onDone();
  }

  return (
    <form
      noValidate
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        change();
      }}
    >
      <div className="grid gap-3 sm:grid-cols-2">
        {lengthField("width", "Width")}
        {lengthField("height", "Height")}
        <Select
          label="Wood"
          value={woods.findIndex((one) => isSameStock(one, wood))}
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
          value={thickness}
          onChange={(event) => set({ thickness: Number(event.target.value) })}
        >
          {thicknessChoices(stocked, thickness).map((one) => (
            <option key={one} value={one}>
              {formatLength(one, unit)}
            </option>
          ))}
        </Select>
        <Field
          label="Finish"
          maxLength={120}
          value={(fields.finish ?? backer.finish).length === 0 ? "" : finishWords(fields.finish ?? backer.finish)}
          onChange={(event) =>
            set({
              finish: event.target.value === "" ? [] : [{ kind: "other", name: event.target.value, dryingHours: 0 }],
            })
          }
        />
        <Field
          label="Quantity"
          type="number"
          min={1}
          max={1000}
          value={Number.isNaN(fields.quantity) ? "" : (fields.quantity ?? quantity)}
          error={isCount(fields.quantity ?? quantity) ? undefined : "Write a whole number from 1 to 1000."}
          onChange={(event) => set({ quantity: event.target.valueAsNumber })}
        />
        <Select
          label="Hung by"
          value={fields.hanging?.kind ?? hanging.kind}
          onChange={(event) => {
            const chosen = hangings.find(({ kind }) => kind === event.target.value);
            if (chosen) set({ hanging: { ...hanging, kind: chosen.kind } });
          }}
        >
          {hangings.map(({ kind, text }) => (
            <option key={kind} value={kind}>
              {text}
            </option>
          ))}
        </Select>
        {lengthField("gap", "Gap behind the board")}
        <Select
          label="Light"
          value={azimuth}
          onChange={(event) => set({ light: { ...presentation.light, azimuth: Number(event.target.value) } })}
        >
          {!lights.some((light) => light.azimuth === azimuth) && (
            <option value={azimuth}>{azimuth}° from the top</option>
          )}
          {lights.map((light) => (
            <option key={light.azimuth} value={light.azimuth}>
              {light.text}
            </option>
          ))}
        </Select>
        <DistanceField
          label="Seen from"
          unit={unit}
          value={lengths.viewingDistance}
          onChange={(mm) => setLengths((before) => ({ ...before, viewingDistance: mm }))}
          error={
            isWithinBounds(lengths.viewingDistance, bounds.viewingDistance)
              ? undefined
              : `From ${unit === "mm" ? "0.1 to 200 m" : "1/3 to 656 feet"}.`
          }
        />
        <Field
          label="Wall colour"
          type="color"
          value={(fields.wall ?? presentation.wall).toLowerCase()}
          onChange={(event) => set({ wall: event.target.value.toUpperCase() })}
        />
      </div>
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onDone}>Cancel</Button>
        <Button type="submit" disabled={!fits}>
          Change the board
        </Button>
      </div>
    </form>
  );
}
