import type { Point } from "../geometry/path.ts";

export type Severity = "stop" | "caution" | "remark";

/** What a rule found. `where` is a spot on the board in mm that the screen zooms to. */
export type Finding = {
  readonly rule: number;
  /** Short name of the rule in trade words, as "Hole window". */
  readonly title: string;
  readonly severity: Severity;
  /** What, by how much, and why, in a sentence or two with units. */
  readonly text: string;
  readonly layerKey: string | null;
  readonly pieceIds: readonly string[];
  readonly holeId: string | null;
  readonly where: Point | null;
  /** The measured value that a finding set aside is bound to, rounded to 0.01 of its unit; null when the rule measures nothing. */
  readonly value: number | null;
  readonly limit: number | null;
  readonly unit: string | null;
  /** Published source, "common practice" or "our choice". */
  readonly source: string;
};
