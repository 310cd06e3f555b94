import { cx } from "@/lib/cx.ts";
import type { Standing, StandingTone } from "../model/standing.ts";

const looks: Readonly<Record<StandingTone, { readonly text: string; readonly mark: string }>> = {
  waiting: { text: "text-ochre", mark: "M4 2.5h8M4 13.5h8M5 2.5c0 4 6 7 6 11M11 2.5c0 4-6 7-6 11" },
  ours: { text: "text-madder", mark: "M8 2.2L14.4 13.4H1.6Z" },
  settled: { text: "text-verdigris", mark: "M2.6 8.6l3.6 3.6L13.4 4.4" },
  quiet: { text: "text-graphite", mark: "M2.5 8h11" },
};

/** Where the revision stands, as a word and a drawn mark. */
export function StandingWords({
  standing,
  isAlone = false,
}: {
  readonly standing: Standing;
  /** Nothing beside it says "Approved by". */
  readonly isAlone?: boolean;
}) {
  const { text, mark } = looks[standing.tone];
  return (
    <span className={cx("font-semibold", text)}>
      <svg aria-hidden="true" viewBox="0 0 16 16" className="mr-1.5 inline-block size-3.5 align-[-0.1em]">
        <path d={mark} fill="none" stroke="currentColor" strokeWidth="1.7" strokeLinejoin="round" />
      </svg>
      {isAlone ? standing.alone : standing.words}
    </span>
  );
}
