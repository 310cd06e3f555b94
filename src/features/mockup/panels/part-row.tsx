import type { MockupDocument } from "#shared/mockup/document.ts";
import { formatLength } from "#shared/units/format-length.ts";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { ArtworkPart, Destination } from "../model/artwork-parts.ts";
import { differenceWords, sheetOfPart } from "../model/sheet-of-part.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { CellSelect } from "./cell-controls.tsx";
import { nameOfHold } from "./layer-fields.tsx";
import { SwatchPair } from "./swatch-pair.tsx";

type PartRowProps = {
  readonly part: ArtworkPart;
  readonly parts: readonly ArtworkPart[];
  /** The place of its hold in the list of holds, chosen or proposed. */
  readonly hold: number;
  readonly onSend: (to: Destination) => void;
  readonly onChange: (fields: Partial<Pick<ArtworkPart, "sheet" | "thickness" | "hold" | "solid">>) => void;
};

/** One part of an artwork: its colour beside its sheet's, where it goes, and what it is cut from and held by. */
export function PartRow({ part, parts, hold, onSend, onChange }: PartRowProps) {
  const { document, stock, unit } = useDesk();
  const { id, colour, to } = part;
  const sheet = sheetOfPart(part, { parts, document, stock });
  const thicknesses = stock.acrylics[part.sheet]?.thicknessesMm ?? [];

  function changeSheet(index: number) {
    const offered = stock.acrylics[index]?.thicknessesMm ?? [];
    const thickness = offered.includes(part.thickness) ? part.thickness : (offered[0] ?? part.thickness);
    onChange({ sheet: index, thickness });
  }

  return (
    <tr className="border-b border-rule align-middle">
      <th scope="row" className="py-1 pr-3 text-left font-normal">
        <span className="flex items-center gap-2">
          <SwatchPair artwork={colour} sheet={sheet?.colour ?? null} />
          <span className="text-sm whitespace-nowrap tabular-nums">
            <span className="font-semibold">{id}</span>, {counted(part.indices.length, "piece")}
          </span>
        </span>
      </th>
      <td className="px-1">
        <DestinationSelect part={part} parts={parts} document={document} onSend={onSend} />
      </td>
      {to.kind === "new" ? (
        <>
          <td className="px-1">
            <CellSelect
              aria-label={`Stock of ${id}`}
              value={part.sheet}
              onChange={(event) => changeSheet(Number(event.target.value))}
            >
              {stock.acrylics.map(({ acrylic }, index) => (
                <option key={`${acrylic.stockId} ${acrylic.name}`} value={index}>
                  {acrylic.name}
                </option>
              ))}
            </CellSelect>
          </td>
          <td className="px-1 text-sm whitespace-nowrap text-graphite tabular-nums">
            {sheet && differenceWords(colour, sheet.colour)}
          </td>
          <td className="px-1">
            <CellSelect
              aria-label={`Thickness, ${unit} of ${id}`}
              value={part.thickness}
              onChange={(event) => onChange({ thickness: Number(event.target.value) })}
            >
              {thicknesses.map((thickness) => (
                <option key={thickness} value={thickness}>
                  {formatLength(thickness, unit)}
                </option>
              ))}
            </CellSelect>
          </td>
          <td className="px-1">
            <CellSelect
              aria-label={`Held by of ${id}`}
              value={hold}
              onChange={(event) => onChange({ hold: Number(event.target.value) })}
            >
              {optionsOfHold(stock).map((option, index) => (
                <option key={nameOfHold(option)} value={index}>
                  {nameOfHold(option)}
                </option>
              ))}
            </CellSelect>
          </td>
          <td className="text-center">
            <input
              type="checkbox"
              aria-label={`Close its openings of ${id}`}
              checked={part.solid}
              onChange={(event) => onChange({ solid: event.target.checked })}
              className="size-5 cursor-pointer align-middle accent-indigo"
            />
          </td>
        </>
      ) : (
        <td colSpan={5} className="px-1 text-sm text-graphite">
          {sheet ? `${sheet.name}: ${differenceWords(colour, sheet.colour)}` : "Stays in the file."}
        </td>
      )}
    </tr>
  );
}

type DestinationSelectProps = {
  readonly part: ArtworkPart;
  readonly parts: readonly ArtworkPart[];
  readonly document: MockupDocument;
  readonly onSend: (to: Destination) => void;
};

function DestinationSelect({ part, parts, document, onSend }: DestinationSelectProps) {
  const hosts = parts.filter(({ id, to }) => id !== part.id && to.kind === "new");
  const layers = document.layers.filter(({ locked }) => !locked);
  return (
    <CellSelect
      aria-label={`Where ${part.id} goes`}
      value={wordOf(part.to)}
      onChange={(event) => onSend(destinationOf(event.target.value))}
    >
      <option value="new">a layer of its own</option>
      <option value="out">left out</option>
      {hosts.length > 0 && (
        <optgroup label="Together with">
          {hosts.map(({ id }) => (
            <option key={id} value={`with ${id}`}>
              with {id}
            </option>
          ))}
        </optgroup>
      )}
      {layers.length > 0 && (
        <optgroup label="Into a layer that is there">
          {layers.map(({ key, name }) => (
            <option key={key} value={`layer ${key}`}>
              into {key}, {name}
            </option>
          ))}
        </optgroup>
      )}
    </CellSelect>
  );
}

function wordOf(to: Destination): string {
  if (to.kind === "with") return `with ${to.part}`;
  return to.kind === "layer" ? `layer ${to.key}` : to.kind;
}

function destinationOf(value: string): Destination {
  if (value.startsWith("with ")) return { kind: "with", part: value.slice(5) };
  if (value.startsWith("layer ")) return { kind: "layer", key: value.slice(6) };
  return { kind: value === "out" ? "out" : "new" };
}
