import { type FrameCover, frameCover } from "../../frame/frame-cover.ts";
import { frameRefusalWords } from "../../frame/frame-words.ts";
import { isShorter } from "../../geometry/tolerance.ts";
import type { MockupDocument } from "../../mockup/document.ts";
import { backerThicknessMm, frameOf } from "../../stack/backer.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Outcome } from "../../units/outcome.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

/** Rule 34: the frame can be made, and covers the edges of plank, substrate and slats. */
export const frameEdges: Rule = { number: 34, title: "Frame", check, mends };

function check({ document, kernel, context }: RuleInput): Finding[] {
  const round = frameOf(document, kernel);
  const { board, frame } = document;
  if (!round || !frame) return [];
  const where = { x: board.width / 2, y: 0 };
  if (!round.ok) {
    const { value } = round.reason;
    const text = `The frame can't be made. ${frameRefusalWords(round.reason, context.unit)}`;
    return [
      foundBy(frameEdges, {
        severity: "stop",
        text,
        where,
        value: Number.isFinite(value) ? value : null,
        source: "plane geometry",
      }),
    ];
  }
  const cover = coverOf(document);
  if (!cover?.ok) return [];
  const { bareSubstrateMm, bareSlatsMm, flushDepthMm } = cover.value;
  if (!isShorter(0, bareSubstrateMm + bareSlatsMm)) return [];
  const mm = (length: number) => formatFine(length, context.unit);
  const bare = document.backer.slats
    ? [
        ...(isShorter(0, bareSubstrateMm) ? [`${mm(bareSubstrateMm)} of the substrate's edge`] : []),
        ...(isShorter(0, bareSlatsMm) ? [`${mm(bareSlatsMm)} of the slats' ends`] : []),
      ].join(" and ")
    : `${mm(bareSubstrateMm)} of the board's edge`;
  return [
    foundBy(frameEdges, {
      severity: "caution",
      text: `The frame is ${mm(frame.depth)} deep and leaves ${bare} bare; at ${mm(flushDepthMm)} it is level with the face.`,
      where,
      value: frame.depth,
      limit: flushDepthMm,
      unit: "mm",
      source: "arithmetic",
    }),
  ];
}

function coverOf({ backer, frame }: Pick<MockupDocument, "backer" | "frame">): Outcome<FrameCover> | null {
  if (!frame) return null;
  const { thickness, slats } = backer;
  const sanding = slats ? thickness + slats.thickness - backerThicknessMm(backer) : 0;
  return frameCover(frame.depth, { substrate: thickness, slats: slats?.thickness ?? 0, sanding });
}

/** The depth at which the frame is level with the face. */
function mends({ severity }: Finding, { document, context }: RuleInput): Mend[] {
  const cover = severity === "caution" ? coverOf(document) : null;
  if (!cover?.ok) return [];
  const depth = cover.value.flushDepthMm;
  return [{ label: `Make it ${formatFine(depth, context.unit)} deep`, steps: [{ kind: "frame depth", depth }] }];
}
