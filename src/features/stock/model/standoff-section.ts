import type { Hardware } from "#shared/mockup/document.ts";
import { measureIn, measuresOf, type NumberedMeasure } from "./measures.ts";
import { type Body, drawable, type Place } from "./section-bodies.ts";
import { partsOf } from "./section-of-kind.ts";
import type { WrittenHardware } from "./written.ts";

/**
 * A measured distance: along the axis between two heights above the wood (`x`), or across it at one height, from `from`
 * to `to` off the axis.
 */
export type Dimension = NumberedMeasure & Place & { readonly mm: number | null };

/** A standoff cut along its axis: the wood's face at 0, the viewer towards greater heights. All mm. */
export type StandoffSection = {
  readonly bodies: readonly Body[];
  readonly dimensions: readonly Dimension[];
  /** Least and greatest height, and the farthest from the axis. */
  readonly from: number;
  readonly to: number;
  readonly reach: number;
};

/** What is drawn for a measure that is not written yet. */
const usual: Readonly<Record<Hardware["kind"], Readonly<Record<string, number>>>> = {
  capStud: {
    barrelLength: 19,
    barrelDiameter: 16,
    boreDepth: 16,
    boreDiameter: 8,
    floorThickness: 3,
    floorHole: 4,
    studLength: 14,
    studDiameter: 5,
    capDiameter: 16,
    capThickness: 3,
  },
  throughScrew: {
    barrelLength: 16,
    barrelDiameter: 12,
    boreDiameter: 5,
    washerThickness: 0,
    "cap.diameter": 14,
    "cap.thickness": 4,
  },
  blindStud: { studLength: 22, studDiameter: 4, barrelLength: 10, barrelDiameter: 10 },
  edgeGrip: {
    barrelLength: 14,
    barrelDiameter: 16,
    slotWidth: 5,
    gripDepth: 5,
    height: 23,
    floorThickness: 3,
    floorHole: 4,
  },
};

/** The section of a standoff as it is written so far; what is missing is drawn as usual, without a figure. */
export function standoffSection(hardware: WrittenHardware): StandoffSection {
  const of = (field: string): number => drawable(measureIn(hardware, field), usual[hardware.kind][field] ?? 1);
  const { bodies, at } = partsOf(hardware, of);
  const dimensions = measuresOf(hardware).flatMap((measure): Dimension[] => {
    const place = at[measure.field];
    if (!place) return [];
    const written = measureIn(hardware, measure.field);
    return [{ ...measure, ...place, mm: written !== null && Number.isFinite(written) ? written : null }];
  });
  const points = bodies.flatMap(({ outline }) => outline);
  return {
    bodies,
    dimensions,
    from: Math.min(...points.map(([x]) => x)),
    to: Math.max(...points.map(([x]) => x)),
    reach: Math.max(...points.map(([, y]) => Math.abs(y))),
  };
}
