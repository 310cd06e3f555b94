import { createContext, useContext, useMemo } from "react";
import type { OnWall } from "#shared/drawing/on-wall.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { useAsked } from "./use-asked.ts";
import type { WallPort } from "./wall-messages.ts";

const startWorker = (onError: () => void): WallPort => {
  const worker = new Worker(new URL("./wall.worker.ts", import.meta.url), { type: "module", name: "wall" });
  worker.addEventListener("error", onError);
  return worker;
};

/** Who draws the sign for its wall. A worker, unless somebody above says otherwise. */
export const WallWorkerContext = createContext<(onError: () => void) => WallPort>(startWorker);

/** The sign in planes, drawn beside the page: the newest that there is, and whether the one asked for could not be drawn. */
export function useOnWall(
  document: MockupDocument,
  unit: LengthUnit,
): { readonly onWall: OnWall | null; readonly isFailed: boolean } {
  // Which photo it hangs in, and where, changes nothing of its picture.
  const asked = useMemo(
    () => ({
      document: { ...document, presentation: { ...document.presentation, photo: null, wall: "#FFFFFF" } },
      unit,
    }),
    [document, unit],
  );
  const { question, answer } = useAsked(useContext(WallWorkerContext), asked);
  const onWall = answer?.said?.ok ? answer.said.onWall : null;
  return { onWall, isFailed: onWall === null && answer !== null && answer.of === question };
}
