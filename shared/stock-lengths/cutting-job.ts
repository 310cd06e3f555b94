/** An end of a part as the saw makes it. */
export type BarEnd = {
  /** Between blade and bar, degrees: 90 is square, 45 a mitre. Of two cuts at one end the flatter. */
  readonly angle: number;
  /** The edge of the bar that the part reaches farther along, or between them where two cuts meet; of no account at 90 degrees. */
  readonly longPoint: "upper" | "lower" | "middle";
};

/** A part to be cut from a bar, drawn lying: its start on the left, its face towards the viewer. */
export type BarPart = {
  readonly id: string;
  /** What is written on the part, short. */
  readonly label: string;
  /** Long point to long point, mm. */
  readonly lengthMm: number;
  readonly quantity: number;
  readonly start: BarEnd;
  readonly end: BarEnd;
};

/** A length that the bars come in. */
export type StockLength = {
  readonly id: string;
  readonly label: string;
  readonly lengthMm: number;
  /** A bar's price in minor units of the shop's currency; null when it isn't known. */
  readonly price: number | null;
  /** How many there are to cut from; null when any number can be had. */
  readonly onHand: number | null;
};

export type SawRules = {
  /** What the blade takes, square to itself, mm. */
  readonly kerfMm: number;
  /** What is cut off each bar's first end to begin with, kerf included, mm. */
  readonly squaringMm: number;
  /** Share of each bar that knots and flaws are reckoned to take, 0 to less than 1. */
  readonly rejectShare: number;
  /** Whether parts whose two cuts are parallel lie in each other, so that one cut serves two. */
  readonly nests: boolean;
};

export type CuttingJob = {
  readonly parts: readonly BarPart[];
  readonly stock: readonly StockLength[];
  /** Width of bars and parts, mm. */
  readonly widthMm: number;
  readonly saw: SawRules;
};

/** Why a job can't be planned: which of its fields, as "parts.3.lengthMm", and what is wrong with it. */
export type CuttingProblem = { readonly field: string; readonly words: string };

/** A square end. */
export const squareEnd: BarEnd = { angle: 90, longPoint: "upper" };

/** Whether both cuts of a part run the same way, so that parts can lie in each other. */
export function hasParallelCuts({ start, end }: Pick<BarPart, "start" | "end">): boolean {
  const isOneCut = start.longPoint !== "middle" && end.longPoint !== "middle";
  return isOneCut && start.angle === end.angle && start.angle < 90 && start.longPoint !== end.longPoint;
}
