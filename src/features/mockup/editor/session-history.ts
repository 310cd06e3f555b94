import type { MockupDocument } from "#shared/mockup/document.ts";
import { type History, startHistory } from "../model/history.ts";
import { isSame } from "../model/same.ts";
import type { DraftPlace } from "./draft-shelf.ts";

/** Of the mockup that was left last: one more document would be memory for what nobody may come back to. */
let left: { readonly key: string; readonly history: History } | null = null;

const keyOf = ({ personId, shop, jobId }: DraftPlace) => [personId, shop, jobId].join(" ");

/** Keeps the steps of a mockup that is being left for another page, for as long as this tab lives. */
export function leaveHistory(place: DraftPlace, history: History): void {
  left = { key: keyOf(place), history };
}

/** The steps of the session so far when the mockup is as it was left, else a new beginning. */
export function resumeHistory(place: DraftPlace, document: MockupDocument): History {
  if (left === null || left.key !== keyOf(place) || !isSame(left.history.present, document))
    return startHistory(document);
  return left.history;
}
