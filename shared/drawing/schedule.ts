import type { Hold, Layer, MockupDocument } from "../mockup/document.ts";
import { finishWords } from "../mockup/finish-words.ts";
import type { Figures } from "../stack/figures.ts";
import { type BandWording, formatBand } from "../units/format-band.ts";
import { formatLength, formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { formatMass, formatMassColumn } from "../units/mass.ts";

/** A layer as the schedule lists it, lettered in the reader's unit. */
export type ScheduleRow = {
  readonly key: string;
  readonly what: string;
  readonly stock: string;
  readonly thickness: string;
  readonly heldBy: string;
  readonly offset: string;
  readonly topAt: string;
  readonly pieces: string;
  readonly mass: string;
};

const nothing = "–";

/** What the pieces of a layer stand on, as their figures say; "nothing" is a finding's business, here it is a dash. */
function supportOf(layer: Layer, figures: Figures): string {
  const keys = figures.pieces.filter(({ layerKey }) => layerKey === layer.key).map(({ restsOn }) => restsOn[0]);
  const known = [...new Set(keys.filter((key) => key !== undefined))].sort();
  return known.length === 0 ? nothing : known.join(", ");
}

function heldBy(hold: Hold, support: string, unit: LengthUnit): string {
  switch (hold.kind) {
    case "bond":
      return `bond on ${support}, ${hold.tack ? `${hold.tack.name}, then ` : ""}${hold.adhesive.name}`;
    case "pocket":
      return `pocket ${formatLength(hold.depth, unit)} deep in ${support}, ${hold.adhesive.name}`;
    case "standoff": {
      const count = hold.holes.length;
      return `${count} ${count === 1 ? "standoff" : "standoffs"}, ${hold.hardware.name}`;
    }
  }
}

/** How a sign hangs, in the schedule. */
export const hangingWords: Readonly<Record<MockupDocument["hanging"]["kind"], string>> = {
  cleat: "cleat",
  keyholes: "keyholes",
  wire: "wire",
  "screwed through": "screwed through",
  "through standoffs": "through its standoffs",
  none: "not chosen",
};

/** What a backer is made of, from the wall outward as its thickness is given: "Birch plywood, slats of Eastern white pine". */
export const backerStockWords = ({ stock, slats }: MockupDocument["backer"]): string =>
  slats ? `${stock.name}, slats of ${slats.stock.name}` : stock.name;

/** Slats and frame in words, where the backer has them: "slats at 45°", "framed in Black walnut 18 × 24". */
export function layingWords({ backer, frame }: Pick<MockupDocument, "backer" | "frame">, unit: LengthUnit): string[] {
  return [
    ...(backer.slats ? [`slats at ${Math.round(backer.slats.angle * 10) / 10}°`] : []),
    ...(frame
      ? [`framed in ${frame.stock.name} ${formatLength(frame.width, unit)} × ${formatLength(frame.depth, unit)}`]
      : []),
  ];
}

/** The schedule, backer first and then the layers from the wall outward. Hidden layers are part of the sign and stay in. */
export function scheduleRows(
  document: MockupDocument,
  figures: Figures,
  unit: LengthUnit,
  heights: BandWording = "nominal",
): ScheduleRow[] {
  const { backer, hanging } = document;
  const figuresOf = (key: string) => figures.layers.find((layer) => layer.key === key);
  const [backerMass = nothing, ...masses] = formatMassColumn(
    [figures.backerMassG, ...document.layers.map(({ key }) => figuresOf(key)?.massG ?? Number.NaN)],
    unit,
  );
  const first: ScheduleRow = {
    key: "A",
    what: ["Backer", ...layingWords(document, unit), finishWords(backer.finish)].join(", "),
    stock: backerStockWords(backer),
    thickness: [backer.thickness, ...(backer.slats ? [backer.slats.thickness] : [])]
      .map((thickness) => formatLength(thickness, unit))
      .join(" + "),
    heldBy: hangingWords[hanging.kind],
    offset: nothing,
    topAt: formatBand(figures.backerTop, unit, heights),
    pieces: "1",
    mass: backerMass,
  };
  const layers = document.layers.map((layer, index): ScheduleRow => {
    const own = figuresOf(layer.key);
    return {
      key: layer.key,
      what: layer.name,
      stock: layer.stock.name,
      thickness: formatLength(layer.thickness, unit),
      heldBy: heldBy(layer.hold, supportOf(layer, figures), unit),
      offset: layer.hold.kind === "standoff" ? formatLength(layer.hold.offset, unit) : nothing,
      topAt: own ? formatBand(own.top, unit, heights) : nothing,
      pieces: String(layer.pieces.length),
      mass: masses[index] ?? nothing,
    };
  });
  return [first, ...layers];
}

/** Everything together, for the line under the schedule. */
export function scheduleTotal(document: MockupDocument, figures: Figures, unit: LengthUnit): string {
  const off = formatLengthWithUnit(figures.offWall.nominal, unit);
  const behind = formatLengthWithUnit(document.hanging.gap, unit);
  const gap = document.hanging.gap > 0 ? `, ${behind} of gap behind it included` : "";
  const many = document.quantity > 1 ? ` ${document.quantity} signs.` : "";
  return `Mass about ${formatMass(figures.massG, unit)} without hardware. Stands ${off} off the wall${gap}.${many}`;
}
