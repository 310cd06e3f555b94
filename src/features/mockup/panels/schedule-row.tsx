import type { ScheduleRow as RowFigures } from "#shared/drawing/schedule.ts";
import { type Layer, locateSchema } from "#shared/mockup/document.ts";
import { formatLength } from "#shared/units/format-length.ts";

import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { raiseLayer } from "../model/commands/set-hold.ts";
import { setLayer } from "../model/commands/set-layer.ts";
import { offsetBounds } from "../model/limits.ts";
import { chooseAlso, chooseLayer } from "../model/selection.ts";
import { catchBarrel, typedReachMm } from "../model/snapping.ts";
import { isSameStock, thicknessChoices, withCurrent } from "../model/stock-choices.ts";
import { CellLength, CellSelect, CellText, Swatch } from "./cell-controls.tsx";
import { DeskCell, DeskRowHead } from "./desk-table.tsx";
import { HoldCell } from "./hold-cell.tsx";

type ScheduleRowProps = {
  readonly layer: Layer;
  /** null until they were first computed. */
  readonly figures: RowFigures | null;
};

/** One layer in the schedule. Pressing its key chooses it. */
export function ScheduleRow({ layer, figures }: ScheduleRowProps) {
  const { document, edit, choose, selection, stock, unit } = useDesk();
  const { key, name, hold, locked } = layer;
  const isChosen = selection.layerKey === key;
  const isBeside = layer.pieces.some(({ id }) => selection.pieceIds.includes(id));
  const sheets = withCurrent(
    stock.acrylics.map(({ acrylic }) => acrylic),
    layer.stock,
  );
  const stocked = stock.acrylics.find(({ acrylic }) => isSameStock(acrylic, layer.stock))?.thicknessesMm ?? [];

  function changeStock(index: number) {
    const sheet = sheets[index];
    if (sheet) edit({ label: `Stock of ${key}`, change: (before) => setLayer(before, { key, stock: sheet }) });
  }

  function changeOffset(offset: number) {
    if (hold.kind !== "standoff") return;
    const caught = catchBarrel(offset, { stock: stock.hardware, current: hold.hardware, reachMm: typedReachMm[unit] });
    edit({ label: `Raise ${key}`, change: (before) => raiseLayer(before, { key, ...caught }) });
  }

  function chooseThis() {
    if (!isChosen) choose(chooseLayer(document, key));
  }

  return (
    <tr
      aria-current={isChosen || undefined}
      className={cx((isChosen || isBeside) && "bg-indigo/8", layer.hidden && "opacity-70")}
      onPointerDownCapture={({ target }) => {
        // Its key chooses when the press ends, alone or beside others.
        if (!(target instanceof Element && target.closest("[data-chooses]"))) chooseThis();
      }}
      // Not on focus: who goes from the list of pieces to the bar by Tab passes here with what is chosen. Not while the event
      // is on its way down either: drawn again before its cell heard of it, the cell would put back its old text.
      onChange={chooseThis}
    >
      <DeskRowHead>
        <button
          type="button"
          aria-label={`Choose ${key}, ${name}${locked ? ", locked" : ""}`}
          aria-pressed={isChosen || isBeside}
          data-chooses
          onClick={({ shiftKey }) =>
            choose(shiftKey ? chooseAlso(document, selection, key) : chooseLayer(document, key))
          }
          className="min-h-7 min-w-7 cursor-pointer rounded border border-transparent text-left font-semibold underline decoration-dotted underline-offset-4 hover:bg-linen"
        >
          {key}
        </button>
        {locked && <span className="block text-fine font-normal text-graphite">locked</span>}
      </DeskRowHead>
      <DeskCell className="min-w-28">
        <CellText
          aria-label={`Name of ${key}`}
          disabled={locked}
          maxLength={120}
          value={name}
          onCommit={(text) => {
            if (text.trim() === "") return "Give the layer a name.";
            edit({ label: `Rename ${key}`, change: (before) => setLayer(before, { key, name: text }) });
            return null;
          }}
        />
      </DeskCell>
      <DeskCell className="min-w-32">
        <span className="flex items-center gap-2">
          <Swatch colour={layer.stock.colour} />
          <CellSelect
            aria-label={`Stock of ${key}`}
            disabled={locked}
            value={sheets.findIndex((sheet) => isSameStock(sheet, layer.stock))}
            onChange={(event) => changeStock(Number(event.target.value))}
          >
            {sheets.map((sheet, index) => (
              <option key={`${sheet.stockId} ${sheet.name}`} value={index}>
                {sheet.name}
              </option>
            ))}
          </CellSelect>
        </span>
      </DeskCell>
      <DeskCell className="min-w-14">
        <CellSelect
          aria-label={`Thickness of ${key}`}
          disabled={locked}
          value={layer.thickness}
          onChange={(event) => {
            const thickness = Number(event.target.value);
            edit({ label: `Thickness of ${key}`, change: (before) => setLayer(before, { key, thickness }) });
          }}
        >
          {thicknessChoices(stocked, layer.thickness).map((thickness) => (
            <option key={thickness} value={thickness}>
              {formatLength(thickness, unit)}
            </option>
          ))}
        </CellSelect>
      </DeskCell>
      <DeskCell className="w-1/4 min-w-32">
        <HoldCell layer={layer} />
      </DeskCell>
      <DeskCell className="min-w-14">
        {hold.kind === "standoff" ? (
          <CellLength
            aria-label={`Offset of ${key}`}
            disabled={locked}
            mm={hold.offset}
            unit={unit}
            bounds={offsetBounds}
            onCommit={changeOffset}
          />
        ) : (
          "–"
        )}
      </DeskCell>
      <DeskCell className="min-w-27">
        <CellSelect
          aria-label={`How ${key} is located`}
          disabled={locked}
          value={layer.locate}
          onChange={(event) => {
            const locate = locateSchema.parse(event.target.value);
            edit({ label: `Locate ${key}`, change: (before) => setLayer(before, { key, locate }) });
          }}
        >
          {locateSchema.options.map((way) => (
            <option key={way} value={way}>
              {way}
            </option>
          ))}
        </CellSelect>
      </DeskCell>
      <DeskCell>{figures?.topAt}</DeskCell>
      <DeskCell>{layer.pieces.length}</DeskCell>
      <DeskCell>{figures?.mass}</DeskCell>
    </tr>
  );
}
