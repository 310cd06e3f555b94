import type { Finding, Severity } from "../dry-fit/finding.ts";
import type { FrozenNote } from "../mockup/snapshot.ts";
import type { Colour } from "./display-list.ts";
import { type FlowLine, headingLines, numberedBlock, paragraph, spaceLine } from "./flow.ts";
import { graphite, madder, ochre, oxblood, verdigris } from "./palette.ts";

/** Stands on every sheet: what the figures are, and whose word comes first. */
export const planningCaution =
  "Figures are estimates for planning. Local codes and a licensed professional’s judgment come first.";

const noteColours: Readonly<Record<FrozenNote["kind"], Colour>> = {
  "must change": madder,
  question: ochre,
  "fine as is": verdigris,
};

const severityWords: Readonly<Record<Severity, { readonly word: string; readonly colour: Colour }>> = {
  stop: { word: "Stop", colour: oxblood },
  caution: { word: "Caution", colour: ochre },
  remark: { word: "Remark", colour: graphite },
};

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function noteLines(note: FrozenNote, widthMm: number): FlowLine[] {
  const zone = note.zone === null ? "" : `, zone ${note.zone}`;
  const meta = `${capital(note.kind)}${zone}, from revision ${note.fromRevision}; ${note.state}. ${note.author}`;
  return numberedBlock({ number: note.number, colour: noteColours[note.kind], text: note.text, meta }, widthMm);
}

function countWords(notes: readonly FrozenNote[]): string {
  const states = ["open", "answered", "settled"] as const;
  const counts = states.map((state) => ({ state, count: notes.filter((note) => note.state === state).length }));
  return counts
    .filter(({ count }) => count > 0)
    .map(({ state, count }) => `${count} ${state}`)
    .join(", ");
}

function findingLines(finding: Finding, widthMm: number): FlowLine[] {
  const { word, colour } = severityWords[finding.severity];
  return [
    ...paragraph(`${word}: ${finding.title}`, { widthMm, font: "sans-semibold", colour, keepsWithNext: true }),
    ...paragraph(finding.text, { widthMm }),
    spaceLine(2),
  ];
}

export type SheetText = {
  readonly words: string;
  readonly notes: readonly FrozenNote[];
  readonly findings: readonly Finding[];
};

/** What a sheet says in sentences: the words as they shall read, the notes as carried over at issue, the dry fit at issue. */
export function sheetTextLines({ words, notes, findings }: SheetText, widthMm: number): FlowLine[] {
  const wording =
    words.trim() === ""
      ? []
      : [
          ...headingLines("Words as they shall read", "", widthMm),
          ...paragraph(words, { widthMm, font: "serif", sizeMm: 4.2 }),
          spaceLine(4),
        ];
  const noteText =
    notes.length === 0
      ? [...headingLines("Notes", "None carried over", widthMm), spaceLine(3)]
      : [
          ...headingLines("Notes", `As carried over at issue: ${countWords(notes)}`, widthMm),
          ...notes.flatMap((note) => noteLines(note, widthMm)),
          spaceLine(2),
        ];
  const fit =
    findings.length === 0
      ? headingLines("Dry fit at issue", "Nothing open on the sign itself", widthMm)
      : [
          ...headingLines("Dry fit at issue", "", widthMm),
          ...findings.flatMap((finding) => findingLines(finding, widthMm)),
        ];
  return [...wording, ...noteText, ...fit];
}
