import { useEffect, useEffectEvent, useMemo } from "react";
import { faceColour } from "#shared/drawing/face-colour.ts";
import type { Box, Point } from "#shared/geometry/path.ts";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { Drawn } from "../engine/use-engine.ts";
import { capCoversOf } from "../model/cap-covers.ts";
import { castShadows } from "../model/cast-shadows.ts";
import { boxOfChosen, findHole } from "../model/chosen-box.ts";
import { type Drag, documentOfDrag } from "../model/drag.ts";
import type { Measure } from "../model/move-measures.ts";
import { shiftsBetween } from "../model/shifts.ts";
import type { LetteredMeasure, Sweep } from "./marks.ts";
import type { Scene } from "./scene.ts";

type Shown = {
  readonly drawn: Drawn | null;
  readonly drag: Drag | null;
  readonly view: DrawingView;
  readonly room: Size | null;
  readonly spot: Point | null;
  readonly sweep: Sweep | null;
};

/**
 * Keeps a scene showing the newest picture, with what was moved since it was made moved in it, so that the hand never waits
 * for the engine; and over it the marks of what is chosen, caught or found. Gives the box of what is chosen.
 */
export function useShownPicture(scene: Scene | null, { drawn, drag, view, room, spot, sweep }: Shown): Box | null {
  const { document, figures, figuresOf, selection, site, unit, aids } = useDesk();
  const { layerKey, pieceIds, holeId } = selection;
  const { limits } = site;
  const { wall } = document.presentation;
  const elevation = drawn?.elevation ?? null;
  const of = drawn?.input.document ?? document;
  const wanted = useMemo(() => documentOfDrag(document, drag), [document, drag]);
  const shifts = useMemo(() => shiftsBetween(of, wanted), [of, wanted]);
  const chosenBox = useMemo(
    () => figures && boxOfChosen(figures, pieceIds, shiftsBetween(figuresOf, wanted)),
    [figures, figuresOf, pieceIds, wanted],
  );
  const latestShifts = useEffectEvent(() => shifts);
  const latestShadows = useEffectEvent(() => figures && castShadows(document, figures));

  useEffect(() => {
    if (scene !== null && elevation !== null) void scene.show(elevation, latestShifts());
  }, [scene, elevation]);
  useEffect(() => scene?.ground(wall), [scene, wall]);
  useEffect(() => scene?.shift(shifts), [scene, shifts]);

  const isLifted = drag?.kind === "pieces";
  // Until the picture has caught up with where they were put down, pieces keep the shadows they had in the hand.
  const isSettled = shifts.size === 0;
  useEffect(() => {
    if (isLifted) scene?.lift(latestShadows());
    else if (isSettled) scene?.lift(null);
  }, [scene, isLifted, isSettled]);

  useEffect(() => {
    if (room !== null) scene?.look(view, room);
  }, [scene, view, room]);

  const { board, backer } = wanted;
  const gridMm = aids.grid ? aids.gridMm : null;
  const wood = faceColour(backer);
  useEffect(() => scene?.rule(gridMm === null ? null : { board, gridMm, wood }), [scene, board, gridMm, wood]);

  useEffect(() => {
    const hole = holeId === null ? null : findHole(wanted, holeId);
    scene?.mark({
      chosen: chosenBox === null ? [] : [chosenBox],
      hole: hole === null ? null : { x: hole.x, y: hole.y, diameter: hole.seenDiameter },
      covers: capCoversOf(wanted, layerKey, limits),
      guides: drag?.kind === "pieces" ? drag.guides : [],
      measures: drag?.kind === "pieces" ? lettered(drag.measures, unit) : [],
      sweep,
      spot,
    });
  }, [scene, chosenBox, wanted, layerKey, holeId, limits, drag, unit, sweep, spot]);

  return chosenBox;
}

/** An equal distance is told by its sign. */
const lettered = (measures: readonly Measure[], unit: LengthUnit): LetteredMeasure[] =>
  measures.map((measure) => ({
    ...measure,
    text: `${measure.isEqual ? "= " : ""}${formatLength(measure.to - measure.from, unit)}`,
  }));
