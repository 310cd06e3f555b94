/** What the completeness of a brief depends on. */
export type BriefFacts = {
  readonly widthMm: number | null;
  readonly heightMm: number | null;
  readonly place: "inside" | "outside" | null;
  readonly viewingDistanceMm: number | null;
  readonly words: string;
  readonly dueOn: string | null;
  /** How many approvers it names. */
  readonly approvers: number;
};

/** What a brief still lacks before a mockup can be agreed on, in the words of the form. Empty when it is complete. */
export function briefMissing(brief: BriefFacts): string[] {
  const missing: string[] = [];
  if (brief.widthMm === null || brief.heightMm === null) missing.push("size");
  if (brief.place === null) missing.push("inside or outside");
  if (brief.viewingDistanceMm === null) missing.push("viewing distance");
  if (brief.words.trim() === "") missing.push("words as they shall read");
  if (brief.dueOn === null) missing.push("due day");
  if (brief.approvers === 0) missing.push("who approves");
  return missing;
}
