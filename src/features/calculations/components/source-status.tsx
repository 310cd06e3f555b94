import type { SourceStatus } from "#shared/calculations/calculation.ts";
import { cx } from "@/lib/cx.ts";

type Look = { readonly word: string; readonly meaning: string; readonly text: string; readonly mark: string };

/** From the surest to the least sure. Each has a word and a drawn mark, so that colour says nothing alone. */
const looks: Readonly<Record<SourceStatus, Look>> = {
  published: {
    word: "Published",
    meaning: "printed in a text that can be looked up",
    text: "text-verdigris",
    mark: "M2.5 2.5h7l4 4v7h-11zM9.5 2.5v4h4M5 9h6M5 11.5h6",
  },
  calculated: {
    word: "Calculated",
    meaning: "follows from geometry, counting or statics alone",
    text: "text-indigo",
    mark: "M2 14L14 2v12zM10.5 14v-3.5H14",
  },
  "common practice": {
    word: "Common practice",
    meaning: "handed down among those who build signs, without a text to cite",
    text: "text-graphite",
    mark: "M2 10.5l8-8 3.5 3.5-8 8H2zM8 4.5L11.5 8",
  },
  "from memory": {
    word: "From memory",
    meaning: "recalled from a text that was not at hand; look it up before you rely on it",
    text: "text-ochre",
    mark: "M8 1.8L15 14H1zM8 6.2v4M8 11.6v1.2",
  },
  "our choice": {
    word: "Our choice",
    meaning: "decided by us, for want of a rule",
    text: "text-madder",
    mark: "M8 1.5a6.5 6.5 0 110 13 6.5 6.5 0 010-13M8 5.5a2.5 2.5 0 110 5 2.5 2.5 0 010-5",
  },
};

const statuses = Object.keys(looks).filter((key): key is SourceStatus => key in looks);

/** Whether a source's text says no more than its status. */
export const saysOnly = (text: string, status: SourceStatus): boolean => text === looks[status].word;

/** How sure a rule is, in a word with its mark. */
export function StatusMark({ status }: { readonly status: SourceStatus }) {
  const { word, text, mark } = looks[status];
  return (
    <span className={cx("inline-flex items-center gap-1.5 whitespace-nowrap font-semibold", text)}>
      <svg
        aria-hidden="true"
        viewBox="0 0 16 16"
        className="size-3.5 shrink-0"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.4"
      >
        <path d={mark} />
      </svg>
      {word}
    </span>
  );
}

/** What the marks mean, and how many calculations rest on each. */
export function StatusKey({ counts }: { readonly counts: Readonly<Record<SourceStatus, number>> }) {
  return (
    <dl className="border-t border-ink text-sm">
      {statuses.map((status) => (
        <div key={status} className="grid grid-cols-[9.5rem_1fr_2rem] gap-x-3 border-b border-rule py-1.5">
          <dt>
            <StatusMark status={status} />
          </dt>
          <dd className="text-graphite">{looks[status].meaning}</dd>
          <dd className="text-right font-serif tabular-nums text-ink">
            {counts[status]}
            <span className="sr-only"> of them</span>
          </dd>
        </div>
      ))}
    </dl>
  );
}
