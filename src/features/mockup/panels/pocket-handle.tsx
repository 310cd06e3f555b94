import { deepestPocketOf } from "#shared/dry-fit/pocket-depth.ts";
import type { Hold } from "#shared/mockup/document.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import { useDesk } from "../editor/desk-context.ts";
import { setPocket } from "../model/commands/set-hold.ts";
import { pocketDepthBounds } from "../model/limits.ts";
import { catchDepth, nextDepth, pocketCatches } from "../model/pocket-catches.ts";
import { CatchLines } from "./catch-lines.tsx";
import { SectionGrip } from "./section-grip.tsx";
import type { LayerInSection, SectionHandleProps } from "./section-handle.tsx";
import { catchPx, fineStepMm } from "./section-steps.ts";

type PocketHandleProps = SectionHandleProps & {
  readonly hold: Extract<Hold, { kind: "pocket" }>;
  /** The depth that the section shows. */
  readonly shownDepth: number;
  readonly at: LayerInSection;
};

/** A layer that is let in, in the section: dragged or moved by arrows deeper or less deep into what it lies in. */
export function PocketHandle({ layer, hold, shownDepth, at, ...section }: PocketHandleProps) {
  const { figures, pxPerMm, pxOfDepth, pxOfHeight, drag, onDrag } = section;
  const { figuresOf: drawn, edit, selection, site, unit } = useDesk();
  const { key, thickness } = layer;
  const { depth } = hold;
  const isChosen = selection.layerKey === key;
  const face = at.bottom + shownDepth;
  const sunk = drag?.kind === "let in" && drag.key === key ? drag.depth : depth;
  const deepest = deepestPocketOf({ document: drawn, figures, limits: site.limits }, key);
  const catches = pocketCatches({ thickness, deepest });
  const within = (mm: number) => Math.min(pocketDepthBounds.most, Math.max(pocketDepthBounds.least, mm));

  function pull(by: number, free: boolean) {
    const wanted = within(depth - by);
    onDrag({ kind: "let in", key, depth: within(catchDepth(wanted, free ? [] : catches, catchPx / pxPerMm)) });
  }

  function step(towards: "viewer" | "wall", fine: boolean) {
    const deeper = towards === "wall";
    const to = fine
      ? depth + (deeper ? fineStepMm : -fineStepMm)
      : nextDepth(depth, catches, deeper ? "deeper" : "shallower");
    if (to === undefined) return;
    edit({
      label: `Let ${key} in`,
      together: `let in ${key}`,
      change: (before) => setPocket(before, { key, depth: within(to) }),
    });
  }

  return (
    <>
      {isChosen && (
        <CatchLines
          lines={catches.map(({ depth: deep, what }) => ({ at: deep, label: `${formatLength(deep, unit)} ${what}` }))}
          now={sunk}
          pxOf={(deep) => pxOfDepth(face - deep)}
          top={pxOfHeight(0)}
          bottom={pxOfHeight(drawn.board.height)}
        />
      )}
      <SectionGrip
        layerKey={key}
        label={`Depth of the pocket of ${key}, ${layer.name}`}
        now={sunk}
        most={pocketDepthBounds.most}
        text={`${formatLengthWithUnit(sunk, unit)} deep`}
        title="Drag to let it in deeper or less deep. Arrows go from catch to catch, with Shift by half a millimetre."
        drag={drag}
        onDrag={onDrag}
        pxPerMm={pxPerMm}
        place={{ ...at.place, left: at.place.left + (shownDepth - sunk) * pxPerMm }}
        onPull={pull}
        onStep={step}
      />
    </>
  );
}
