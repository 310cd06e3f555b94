import type { ScheduleRow as RowFigures } from "#shared/drawing/schedule.ts";
import { type Layer, locateSchema } from "#shared/mockup/document.ts";
import { formatLength } from "#shared/units/format-length.ts";
import { Cell, RowHead } from "@/components/ui/table.tsx";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { moveLayer, removeLayer } from "../model/commands/order-layers.ts";
import { raiseLayer } from "../model/commands/set-hold.ts";
import { setLayer } from "../model/commands/set-layer.ts";
import { chooseLayer } from "../model/selection.ts";
import { catchBarrel } from "../model/snapping.ts";
import { isSameStock, thicknessChoices, withCurrent } from "../model/stock-choices.ts";
import { CellLength, CellSelect, CellText, Swatch } from "./cell-controls.tsx";
import { HoldCell } from "./hold-cell.tsx";
import { RowTools } from "./row-tools.tsx";

/** An offset typed this near to a barrel in stock means that barrel. */
const typedReachMm = 0.26;

type ScheduleRowProps = {
  readonly layer: Layer;
  /** null until they were first computed. */
  readonly figures: RowFigures | null;
  readonly isFirst: boolean;
  readonly isLast: boolean;
};

/** One layer in the schedule. Pressing its key chooses it. */
export function ScheduleRow({ layer, figures, isFirst, isLast }: ScheduleRowProps) {
  const { document, edit, choose, selection, stock, unit } = useDesk();
  const { key, name, hold } = layer;
  const isChosen = selection.layerKey === key;
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
    const caught = catchBarrel(offset, { stock: stock.hardware, current: hold.hardware, reachMm: typedReachMm });
    edit({ label: `Raise ${key}`, change: (before) => raiseLayer(before, { key, ...caught }) });
  }

  return (
    <tr
      aria-current={isChosen || undefined}
      className={cx(isChosen && "bg-indigo/8", layer.hidden && "opacity-70")}
      onFocusCapture={() => {
        if (!isChosen) choose(chooseLayer(document, key));
      }}
    >
      <RowHead className="py-1">
        <button
          type="button"
          aria-label={`Choose ${key}, ${name}`}
          aria-pressed={isChosen}
          onClick={() => choose(chooseLayer(document, key))}
          className="min-h-8 min-w-8 cursor-pointer rounded border border-transparent text-left font-semibold underline decoration-dotted underline-offset-4 hover:bg-linen"
        >
          {key}
        </button>
      </RowHead>
      <Cell className="min-w-36 py-1">
        <CellText
          aria-label={`Name of ${key}`}
          maxLength={120}
          value={name}
          onCommit={(text) => {
            if (text.trim() === "") return false;
            edit({ label: `Rename ${key}`, change: (before) => setLayer(before, { key, name: text }) });
            return true;
          }}
        />
      </Cell>
      <Cell className="min-w-40 py-1">
        <span className="flex items-center gap-2">
          <Swatch colour={layer.stock.colour} />
          <CellSelect
            aria-label={`Stock of ${key}`}
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
      </Cell>
      <Cell className="w-20 py-1">
        <CellSelect
          aria-label={`Thickness of ${key}`}
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
      </Cell>
      <Cell className="min-w-52 py-1">
        <HoldCell layer={layer} />
      </Cell>
      <Cell className="w-20 py-1">
        {hold.kind === "standoff" ? (
          <CellLength aria-label={`Offset of ${key}`} mm={hold.offset} unit={unit} onCommit={changeOffset} />
        ) : (
          "–"
        )}
      </Cell>
      <Cell className="w-32 py-1">
        <CellSelect
          aria-label={`How ${key} is located`}
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
      </Cell>
      <Cell className="py-2">{figures?.topAt}</Cell>
      <Cell className="py-2">{layer.pieces.length}</Cell>
      <Cell className="py-2 whitespace-nowrap">{figures?.mass}</Cell>
      <Cell className="py-1">
        <RowTools
          layer={layer}
          isFirst={isFirst}
          isLast={isLast}
          onMove={(towards) =>
            edit({
              label: `Move ${key} towards the ${towards}`,
              change: (before) => moveLayer(before, { key, towards }),
            })
          }
          onHide={() =>
            edit({
              label: layer.hidden ? `Show ${key}` : `Hide ${key}`,
              change: (before) => setLayer(before, { key, hidden: !layer.hidden }),
            })
          }
          onRemove={() => edit({ label: `Remove ${key}`, change: (before) => removeLayer(before, { key }) })}
        />
      </Cell>
    </tr>
  );
}
