import type { Hold } from "#shared/mockup/document.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import { useDesk } from "../editor/desk-context.ts";
import { raiseLayer } from "../model/commands/set-hold.ts";
import { mostOffsetMm } from "../model/limits.ts";
import { barrelLengths, catchBarrel, hardwareOfLength, nextBarrel } from "../model/snapping.ts";
import { CatchLines } from "./catch-lines.tsx";
import { SectionGrip } from "./section-grip.tsx";
import type { LayerInSection, SectionHandleProps } from "./section-handle.tsx";
import { catchPx, fineStepMm } from "./section-steps.ts";

type RaiseHandleProps = SectionHandleProps & {
  readonly hold: Extract<Hold, { kind: "standoff" }>;
  /** The offset that the section shows. */
  readonly shownOffset: number;
  readonly at: LayerInSection;
};

/** A standoff layer in the section, dragged or moved by arrows from barrel to barrel. */
export function RaiseHandle({ layer, hold, shownOffset, at, ...section }: RaiseHandleProps) {
  const { pxPerMm, pxOfDepth, pxOfHeight, drag, onDrag } = section;
  const { figuresOf: drawn, edit, selection, stock, unit } = useDesk();
  const { key } = layer;
  const { hardware, offset } = hold;
  const isChosen = selection.layerKey === key;
  const foot = at.bottom - shownOffset;
  const raised = drag?.kind === "raise" && drag.key === key ? drag.offset : offset;

  function pull(by: number, free: boolean) {
    const wanted = Math.min(mostOffsetMm, Math.max(0, offset + by));
    const reachMm = free ? 0 : catchPx / pxPerMm;
    const caught = catchBarrel(Math.round(wanted * 10) / 10, { stock: stock.hardware, current: hardware, reachMm });
    onDrag({ kind: "raise", key, ...caught });
  }

  function step(towards: "viewer" | "wall", fine: boolean) {
    const up = towards === "viewer";
    const to = fine
      ? offset + (up ? fineStepMm : -fineStepMm)
      : nextBarrel(offset, [...stock.hardware, hardware], up ? "up" : "down");
    if (to === undefined) return;
    const taken = hardwareOfLength(to, stock.hardware, hardware);
    edit({
      label: `Raise ${key}`,
      together: `raise ${key}`,
      change: (before) => raiseLayer(before, { key, offset: to, hardware: taken }),
    });
  }

  return (
    <>
      {isChosen && (
        <CatchLines
          lines={barrelLengths([...stock.hardware, hardware]).map((length) => ({
            at: length,
            label: formatLength(length, unit),
          }))}
          now={raised}
          pxOf={(length) => pxOfDepth(foot + length)}
          top={pxOfHeight(0)}
          bottom={pxOfHeight(drawn.board.height)}
        />
      )}
      <SectionGrip
        layerKey={key}
        label={`Raise ${key}, ${layer.name}`}
        now={raised}
        most={mostOffsetMm}
        text={`${formatLengthWithUnit(raised, unit)}, ${hardware.name}`}
        title="Drag to raise. Arrows go from barrel to barrel, with Shift by half a millimetre."
        drag={drag}
        onDrag={onDrag}
        pxPerMm={pxPerMm}
        place={{ ...at.place, left: at.place.left + (raised - shownOffset) * pxPerMm }}
        onPull={pull}
        onStep={step}
      />
    </>
  );
}
