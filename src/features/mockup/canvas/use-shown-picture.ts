import { useEffect, useEffectEvent, useMemo } from "react";
import type { Point } from "#shared/geometry/path.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { Drawn } from "../engine/use-engine.ts";
import { capCoversOf } from "../model/cap-covers.ts";
import { castShadows } from "../model/cast-shadows.ts";
import { boxOfChosen, findHole } from "../model/chosen-box.ts";
import { type Drag, documentOfDrag } from "../model/drag.ts";
import { shiftsBetween } from "../model/shifts.ts";
import type { Scene } from "./scene.ts";

type Shown = {
  readonly drawn: Drawn | null;
  readonly drag: Drag | null;
  readonly view: DrawingView;
  readonly room: Size | null;
  readonly spot: Point | null;
};

/**
 * Keeps a scene showing the newest picture, with what was moved since it was made moved in it, so that the hand never waits
 * for the engine; and over it the marks of what is chosen, caught or found.
 */
export function useShownPicture(scene: Scene | null, { drawn, drag, view, room, spot }: Shown): void {
  const { document, figures, figuresOf, selection, site } = useDesk();
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

  useEffect(() => {
    const hole = holeId === null ? null : findHole(wanted, holeId);
    scene?.mark({
      chosen: chosenBox === null ? [] : [chosenBox],
      hole: hole === null ? null : { x: hole.x, y: hole.y, diameter: hole.seenDiameter },
      covers: capCoversOf(wanted, layerKey, limits),
      guides: drag?.kind === "pieces" ? drag.guides : [],
      spot,
    });
  }, [scene, chosenBox, wanted, layerKey, holeId, limits, drag, spot]);
}
