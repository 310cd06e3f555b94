import { formatLengthWithUnit, formatSize } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { type Change, sameThing, type Wording } from "./change.ts";
import type { MockupDocument } from "./document.ts";
import { finishWords } from "./finish-words.ts";
import { listHoleChanges } from "./hole-changes.ts";
import { listLayerChanges } from "./layer-changes.ts";
import { listPieceChanges } from "./piece-changes.ts";

export type { Change, ChangeKind } from "./change.ts";

/**
 * What changed from one document to another, in words: the whole sign first, then layer by layer from the wall outward.
 * Layers are matched by key, pieces and holes by id. No change, no entry; any difference that a client or a builder
 * could see has one.
 */
export function listChanges(before: MockupDocument, after: MockupDocument, unit: LengthUnit = "mm"): Change[] {
  const wording: Wording = { unit };
  return [
    ...listSignChanges(before, after, wording),
    ...listLayerChanges(before, after, wording),
    ...listHoleChanges(before, after, wording),
    ...listPieceChanges(before, after, wording),
  ];
}

function listSignChanges(before: MockupDocument, after: MockupDocument, { unit }: Wording): Change[] {
  const changes: Change[] = [];
  const middle = { x: after.board.width / 2, y: after.board.height / 2 };
  const say = (kind: Change["kind"], text: string) =>
    changes.push({
      kind,
      text,
      layerKey: kind === "backer" ? "A" : null,
      pieceIds: [],
      where: kind === "presentation" || kind === "quantity" ? null : middle,
    });
  const length = (mm: number) => formatLengthWithUnit(mm, unit);
  const size = ({ board }: MockupDocument) => formatSize(board.width, board.height, unit);

  if (before.board.width !== after.board.width || before.board.height !== after.board.height) {
    say("board", `Board ${size(before)} becomes ${size(after)}`);
  }
  if (!sameThing(before.board.outline, after.board.outline)) {
    say("board", `Outline of the board: ${before.board.outline.kind} becomes ${after.board.outline.kind}`);
  }
  if (before.board.measures !== after.board.measures) {
    say("board", `The board's measures mean ${after.board.measures}, not ${before.board.measures}`);
  }
  const [was, is] = [before.backer, after.backer];
  if (!sameThing(was.stock, is.stock)) say("backer", `Backer of ${stockWords(was.stock, is.stock)}`);
  if (was.thickness !== is.thickness) {
    say("backer", `Backer ${length(was.thickness)} thick becomes ${length(is.thickness)}`);
  }
  if (was.slats === null && is.slats !== null) say("backer", `Slats of ${is.slats.stock.name} are laid on the backer`);
  else if (was.slats !== null && is.slats === null) say("backer", "The slats are taken off the backer");
  else if (!sameThing(was.slats, is.slats)) say("backer", "The slats are laid otherwise");
  if (before.frame === null && after.frame !== null)
    say("backer", `A frame of ${after.frame.stock.name} goes round it`);
  else if (before.frame !== null && after.frame === null) say("backer", "The frame is gone");
  else if (!sameThing(before.frame, after.frame)) say("backer", "The frame is made otherwise");
  if (was.grainTurn !== is.grainTurn) say("backer", `Grain turned ${was.grainTurn}° becomes ${is.grainTurn}°`);
  const [wasFinish, isFinish] = [finishWords(was.finish), finishWords(is.finish)];
  if (wasFinish !== isFinish) say("backer", `Finish of the backer: ${wasFinish} becomes ${isFinish}`);
  else if (!sameThing(was.finish, is.finish)) say("backer", `Finish of the backer: ${isFinish}, other details`);
  if (before.hanging.kind !== after.hanging.kind) {
    say("hanging", `Hanging: ${before.hanging.kind} becomes ${after.hanging.kind}`);
  }
  if (before.hanging.gap !== after.hanging.gap) {
    say("hanging", `Gap to the wall ${length(before.hanging.gap)} becomes ${length(after.hanging.gap)}`);
  }
  if (before.hanging.pose !== after.hanging.pose) {
    say("hanging", `The sign is ${before.hanging.pose}, then ${after.hanging.pose}`);
  }
  if (before.hanging.carriesKg !== after.hanging.carriesKg) say("hanging", "Other load stated for the wall's fixing");
  if (!sameThing(before.hanging.points, after.hanging.points)) say("hanging", "The wall's fixings are set otherwise");
  if (before.quantity !== after.quantity) say("quantity", `Quantity ${before.quantity} becomes ${after.quantity}`);
  if (before.presentation.wall !== after.presentation.wall) {
    say("presentation", `Wall shown ${before.presentation.wall} becomes ${after.presentation.wall}`);
  }
  if (!sameThing(before.presentation.light, after.presentation.light)) say("presentation", "The light falls otherwise");
  if (before.presentation.viewingDistance !== after.presentation.viewingDistance) {
    say(
      "presentation",
      `Viewing distance ${length(before.presentation.viewingDistance)} becomes ${length(after.presentation.viewingDistance)}`,
    );
  }
  return changes;
}

function stockWords(was: { name: string; colour: string }, is: { name: string; colour: string }): string {
  if (was.name !== is.name) return `${was.name} becomes ${is.name}`;
  return was.colour === is.colour ? `${is.name}: other properties` : `${is.name}: ${was.colour} becomes ${is.colour}`;
}
