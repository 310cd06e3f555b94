import type { Hold, Layer } from "#shared/mockup/document.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Table } from "@/components/ui/table.tsx";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { type CapCover, capCovers } from "../model/cap-covers.ts";
import { addHole, fitHoles, fixHole, proposeHoles, removeHole, setHole } from "../model/commands/holes.ts";
import { boxOfPieces } from "../model/commands/pieces.ts";
import { coordinateBounds, holeBounds } from "../model/limits.ts";
import { chooseHole } from "../model/selection.ts";
import { CellLength, WordButton } from "./cell-controls.tsx";
import { DeskCell, DeskHead, DeskRowHead } from "./desk-table.tsx";

type HolesTableProps = { readonly layer: Layer; readonly hold: Extract<Hold, { kind: "standoff" }> };

/** The standoff holes of a layer: where they are, how wide, and which one is fixed. */
export function HolesTable({ layer, hold }: HolesTableProps) {
  const { document, selection, edit, choose, unit, site, holesByHand, putHolesByHand } = useDesk();
  const { key, locked } = layer;
  const covers = new Map(capCovers(hold, site.limits).map((cover) => [cover.id, cover]));
  const byHand = holesByHand === key;

  function add() {
    const box = boxOfPieces(
      document,
      layer.pieces.map(({ id }) => id),
    );
    const at = box ?? { x: 0, y: 0, width: document.board.width, height: document.board.height };
    const id = newId();
    edit({
      label: `Add a hole to ${key}`,
      change: (before) => addHole(before, { key, id, site, x: at.x + at.width / 2, y: at.y + at.height / 2 }),
      choose: (after) => chooseHole(after, id),
    });
  }

  return (
    <div>
      <div className="flex flex-wrap items-baseline gap-x-3 pb-1">
        <h3 className="font-serif text-sm font-bold text-ink">Holes of {key}</h3>
        <WordButton disabled={locked} onClick={add}>
          Add a hole
        </WordButton>
        <WordButton disabled={locked} aria-pressed={byHand} onClick={() => putHolesByHand(byHand ? null : key)}>
          {byHand ? "Stop putting holes by hand" : "Put holes by hand"}
        </WordButton>
        <WordButton
          disabled={locked}
          onClick={() => {
            const id = newId();
            edit({ label: `Propose holes in ${key}`, change: (before) => proposeHoles(before, { key, id, site }) });
          }}
        >
          Propose holes near the corners
        </WordButton>
        <WordButton
          disabled={locked}
          title="Wide enough to have play, narrow enough to hide under the cap"
          onClick={() =>
            edit({ label: `Fit the holes of ${key}`, change: (before) => fitHoles(before, { key, site }) })
          }
        >
          Fit the diameters
        </WordButton>
      </div>
      {hold.holes.length === 0 ? (
        <p className="text-sm text-graphite">No holes yet: nothing holds this layer. Add one, or have four proposed.</p>
      ) : (
        <Table caption={`Holes of ${key}`}>
          <thead>
            <tr>
              {["Hole", `x, ${unit}`, `y, ${unit}`, `Diameter, ${unit}`, "Cap covers", "Fixed"].map((head) => (
                <DeskHead key={head}>{head}</DeskHead>
              ))}
              <DeskHead>
                <span className="sr-only">Removal</span>
              </DeskHead>
            </tr>
          </thead>
          <tbody>
            {hold.holes.map((hole, index) => {
              const title = `Hole ${index + 1}`;
              const set = (to: { x?: number; y?: number; diameter?: number }) =>
                edit({ label: `${title} of ${key}`, change: (before) => setHole(before, { holeId: hole.id, ...to }) });
              return (
                <tr key={hole.id} className={cx(selection.holeId === hole.id && "bg-indigo/8")}>
                  <DeskRowHead>
                    <WordButton
                      aria-pressed={selection.holeId === hole.id}
                      onClick={() => choose(chooseHole(document, hole.id))}
                    >
                      {title}
                    </WordButton>
                  </DeskRowHead>
                  <DeskCell className="w-28">
                    <CellLength
                      aria-label={`x of ${title}`}
                      disabled={locked}
                      mm={hole.x}
                      unit={unit}
                      exact
                      bounds={coordinateBounds}
                      onCommit={(mm) => set({ x: mm })}
                    />
                  </DeskCell>
                  <DeskCell className="w-28">
                    <CellLength
                      aria-label={`y of ${title}`}
                      disabled={locked}
                      mm={hole.y}
                      unit={unit}
                      exact
                      bounds={coordinateBounds}
                      onCommit={(mm) => set({ y: mm })}
                    />
                  </DeskCell>
                  <DeskCell className="w-28">
                    <CellLength
                      aria-label={`Diameter of ${title}`}
                      disabled={locked}
                      mm={hole.diameter}
                      unit={unit}
                      bounds={holeBounds}
                      onCommit={(mm) => set({ diameter: mm })}
                    />
                  </DeskCell>
                  <DeskCell className="w-36">
                    <CoverWords cover={covers.get(hole.id)} unit={unit} />
                  </DeskCell>
                  <DeskCell className="w-20">
                    <input
                      type="radio"
                      name={`fixed hole of ${key}`}
                      aria-label={`${title} is the fixed one`}
                      disabled={locked}
                      checked={hole.fixed}
                      onChange={() =>
                        edit({
                          label: `Fix ${title} of ${key}`,
                          change: (before) => fixHole(before, { holeId: hole.id }),
                        })
                      }
                      className="size-5 cursor-pointer accent-indigo"
                    />
                  </DeskCell>
                  <DeskCell>
                    <WordButton
                      aria-label={`Remove ${title}`}
                      disabled={locked}
                      onClick={() =>
                        edit({
                          label: `Remove ${title} of ${key}`,
                          change: (before) => removeHole(before, { holeId: hole.id }),
                        })
                      }
                    >
                      Remove
                    </WordButton>
                  </DeskCell>
                </tr>
              );
            })}
          </tbody>
        </Table>
      )}
    </div>
  );
}

/** How far the cap still reaches over a hole that lies hard over to one side. */
function CoverWords({ cover, unit }: { readonly cover: CapCover | undefined; readonly unit: LengthUnit }) {
  if (cover === undefined) return <>no hole in the panel</>;
  const by = formatLengthWithUnit(Math.abs(cover.reach), unit);
  if (cover.isEnough) return <>by {by} at least</>;
  return (
    <span className="font-semibold text-oxblood">{cover.reach < 0 ? `shows by up to ${by}` : `only by ${by}`}</span>
  );
}
