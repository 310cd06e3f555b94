import { capitalised, countInWords } from "@/lib/format.ts";

/** The Bench's heading: how many moves are ours. */
export const benchSentence = (ours: number): string =>
  ours === 1 ? "One move is ours" : `${capitalised(countInWords(ours))} ${ours === 0 ? "move is" : "moves are"} ours`;

/** The same for a client: what waits for them. */
export const clientSentence = (theirs: number): string =>
  theirs === 0
    ? "Nothing waits for you"
    : theirs === 1
      ? "One sign waits for you"
      : `${capitalised(countInWords(theirs))} signs wait for you`;
