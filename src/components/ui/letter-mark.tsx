import { cx } from "@/lib/cx.ts";

export type MarkTone = "ours" | "client" | "settled" | "quiet";

const tones: Record<MarkTone, string> = {
  ours: "border-madder text-madder",
  client: "border-ochre text-ochre",
  settled: "border-verdigris text-verdigris",
  quiet: "border-graphite text-graphite",
};

/** A letter or number in a balloon, as on a drawing. A word that says the same always stands beside it. */
export function LetterMark({
  children,
  tone = "quiet",
  className,
}: {
  readonly children: string;
  readonly tone?: MarkTone;
  readonly className?: string;
}) {
  return (
    <span
      aria-hidden="true"
      className={cx(
        "inline-flex h-7 min-w-7 shrink-0 items-center justify-center rounded-full border bg-sheet px-1 font-serif text-fine font-bold",
        tones[tone],
        className,
      )}
    >
      {children}
    </span>
  );
}
