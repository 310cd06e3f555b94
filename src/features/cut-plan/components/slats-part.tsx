import { useMemo } from "react";
import type { SlatPlan } from "#shared/cut-plan/wood-plan.ts";
import { drawBradMap, drawSlatPlan } from "#shared/drawing/slat-plan.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { formatMass } from "#shared/units/mass.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";
import { counted } from "@/lib/format.ts";
import { cutsWords, degreesWords } from "../model/plan-words.ts";
import { DrawingBlock } from "./drawing-block.tsx";
import { usePaper } from "./use-paper.ts";

type SlatsPartProps = { readonly plan: SlatPlan; readonly document: MockupDocument; readonly unit: LengthUnit };

/** Slats in the order they are laid, each with its measures and saw settings, their brads, and both as pictures. */
export function SlatsPart({ plan, document, unit }: SlatsPartProps) {
  const { ref, paperMm } = usePaper();
  const { layout, settings, brads, glue } = plan;
  const { slats, spine, design } = layout;
  const mm = (length: number) => formatLengthWithUnit(length, unit);
  const saw = settings.map(({ setting, cuts }) => `${degreesWords(setting)} for ${counted(cuts, "cut")}`).join(", ");
  return (
    <div ref={ref} className="mt-4">
      <p className="text-base text-ink">
        {counted(slats.length, "slat")} of {mm(design.slatWidth)}
        {spine && `, and a spine of ${mm(design.spineWidth)}, ${mm(spine.length)} long`}
        {document.quantity > 1 && `, for each of ${document.quantity} signs`}. Saw settings, off a square cut: {saw}.
      </p>
      <p className="text-base text-graphite">
        Laid {mm(design.overhang)} past the edge and trimmed flush. An end that “fits” shows a joint: cut it true. The
        others are trimmed away.
        {glue && ` Glue for one sign: about ${formatMass(glue.massG, unit)}.`}
      </p>
      {paperMm !== null && <Pictures plan={plan} document={document} unit={unit} paperMm={paperMm} />}
      <p className="mt-3 text-base text-graphite">
        {brads.ok
          ? bradWords(brads.value.brads.length, brads.value.without, brads.value.withOne)
          : `No brads are set out: ${brads.words}`}
      </p>
      <Table caption="Slats in the order they are laid" className="mt-4">
        <thead>
          <tr>
            {["No.", "Side", `Long point, ${unit}`, `Short point, ${unit}`, "Near end", "Far end"].map((head) => (
              <HeadCell key={head}>{head}</HeadCell>
            ))}
          </tr>
        </thead>
        <tbody>
          {spine && (
            <tr>
              <RowHead>S</RowHead>
              <Cell>spine</Cell>
              <Cell>{formatLength(spine.length, unit)}</Cell>
              <Cell>{formatLength(spine.length, unit)}</Cell>
              <Cell>0°</Cell>
              <Cell>0°</Cell>
            </tr>
          )}
          {slats.map(({ order, side, longPoint, shortPoint, near, far }) => (
            <tr key={order} className="break-inside-avoid">
              <RowHead>{order}</RowHead>
              <Cell>{side}</Cell>
              <Cell>{formatLength(longPoint, unit)}</Cell>
              <Cell>{formatLength(shortPoint, unit)}</Cell>
              <Cell className="whitespace-nowrap">{cutsWords(near)}</Cell>
              <Cell className="whitespace-nowrap">{cutsWords(far)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

function Pictures({ plan: { layout, brads }, document, unit, paperMm }: SlatsPartProps & { readonly paperMm: number }) {
  // Two beside each other where there is room for both.
  const isWide = paperMm > 180;
  const widthMm = isWide ? Math.floor(paperMm / 2) - 4 : paperMm;
  const heightMm = widthMm * 1.2;
  const slatPlan = useMemo(() => drawSlatPlan({ layout, widthMm, heightMm }), [layout, widthMm, heightMm]);
  const bradMap = useMemo(() => {
    const barrels = document.layers.flatMap(({ hold }) =>
      hold.kind === "standoff" ? hold.holes.map(({ x, y }) => ({ x, y, diameter: hold.hardware.barrelDiameter })) : [],
    );
    return brads.ok ? drawBradMap({ layout, widthMm, heightMm, brads: brads.value.brads, barrels, unit }) : null;
  }, [layout, brads, document, unit, widthMm, heightMm]);
  return (
    <div className="mt-4 grid items-start gap-5 md:grid-cols-2">
      {slatPlan && <DrawingBlock list={slatPlan} title="Slats in place, numbered in the order they are laid" />}
      {bradMap && <DrawingBlock list={bradMap} title="Brads, as crosses, over the slats" />}
    </div>
  );
}

function bradWords(count: number, without: readonly number[], withOne: readonly number[]): string {
  const named = (orders: readonly number[]) => orders.map((order) => (order === 0 ? "the spine" : order)).join(", ");
  const parts = [
    `${counted(count, "brad")} a sign, clear of the trim line, joints and screws.`,
    without.length > 0 && `No brad fits in ${named(without)}: glue and clamp.`,
    withOne.length > 0 && `Only one fits in ${named(withOne)}: clamp until the glue holds.`,
  ];
  return parts.filter(Boolean).join(" ");
}
