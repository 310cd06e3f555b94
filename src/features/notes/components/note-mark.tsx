import { cx } from "@/lib/cx.ts";
import type { NoteTone } from "../model/note-words.ts";

const shapes: Readonly<Record<NoteTone, string>> = {
  must: "M8 2.2L14.4 13.4H1.6Z",
  question: "M5.2 5.6a2.8 2.8 0 1 1 3.9 2.6c-.8.4-1.1.9-1.1 1.9M8 12.4v1.2",
  fine: "M3 6.2h10M3 10h10",
  settled: "M2.6 8.6l3.6 3.6L13.4 4.4",
};

export const toneText: Readonly<Record<NoteTone, string>> = {
  must: "text-madder",
  question: "text-ochre",
  fine: "text-graphite",
  settled: "text-verdigris",
};

/** The drawn mark of a note's kind, or the tick of a settled one; the word stands beside it. */
export function NoteMark({ tone, className }: { readonly tone: NoteTone; readonly className?: string | false }) {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 16 16"
      className={cx("inline-block size-3.5 shrink-0", className || toneText[tone])}
    >
      <path d={shapes[tone]} fill="none" stroke="currentColor" strokeWidth="1.8" strokeLinejoin="round" />
    </svg>
  );
}
