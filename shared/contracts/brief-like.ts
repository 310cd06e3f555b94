import { carriesWords } from "../mockup/carries-words.ts";
import { type Brief, emptyBrief } from "./jobs.ts";

/**
 * The brief of another sign like an earlier one: its size, place, distance, lighting, quantity and what asks for more than a
 * drawing, with the new words. What the client is about and the brand's colours stay with the client; what the wall is like
 * belongs to that wall. Lighting is written freely, so that it stays too where it carries a word of the earlier sign.
 */
export function briefLike(
  brief: Brief,
  {
    sameClient,
    words,
    newWords,
  }: { readonly sameClient: boolean; readonly words: readonly string[]; readonly newWords: string },
): Brief {
  const { widthMm, heightMm, place, viewingDistanceMm, quantity, walkway, overhead, electrical } = brief;
  return {
    ...emptyBrief,
    widthMm,
    heightMm,
    place,
    viewingDistanceMm,
    lighting: sameClient || !carriesWords(brief.lighting, words) ? brief.lighting : "",
    quantity,
    walkway,
    overhead,
    electrical,
    ...(sameClient ? { about: brief.about, brandColours: brief.brandColours } : {}),
    words: newWords,
  };
}
