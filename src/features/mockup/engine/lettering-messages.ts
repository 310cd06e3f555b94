import type { LayOutcome, Setting } from "#shared/lettering/lay-words.ts";
import type { AskPort } from "./use-asked.ts";

/** Words to be set in a face, by its key. */
export type WordsAsked = { readonly face: string; readonly setting: Setting };
type Said =
  | { readonly ok: true; readonly outcome: LayOutcome; readonly fontSha256: string }
  | { readonly ok: false; readonly reason: string };

export type WordsQuestion = { readonly sequence: number } & WordsAsked;
export type WordsAnswer = { readonly sequence: number } & Said;
export type WordsPort = AskPort<WordsAsked, Said>;
