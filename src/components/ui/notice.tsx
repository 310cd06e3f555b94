import type { ReactNode } from "react";
import { cx } from "@/lib/cx.ts";

export type NoticeTone = "info" | "caution" | "error" | "done";

const tones: Record<NoticeTone, { text: string; mark: string; word: string }> = {
  info: { text: "border-indigo text-indigo", mark: "M8 7v5M8 4v1.4", word: "Note" },
  caution: { text: "border-ochre text-ochre", mark: "M8 3.5v6M8 11.2v1.4", word: "Caution" },
  error: { text: "border-oxblood text-oxblood", mark: "M4.6 4.6l6.8 6.8M11.4 4.6l-6.8 6.8", word: "Problem" },
  done: { text: "border-verdigris text-verdigris", mark: "M4 8.4l2.8 2.8L12 5.4", word: "Done" },
};

/** A word to the reader, with a drawn mark. Errors are read out at once, the rest when there is a pause. */
export function Notice({
  tone = "info",
  title,
  children,
  className,
}: {
  readonly tone?: NoticeTone;
  readonly title?: string;
  readonly children?: ReactNode;
  readonly className?: string;
}) {
  const look = tones[tone];
  return (
    <div
      role={tone === "error" ? "alert" : "status"}
      className={cx("flex gap-3 border-l-4 bg-sheet px-4 py-3", look.text, className)}
    >
      <svg aria-hidden="true" viewBox="0 0 16 16" className="mt-1 size-4 shrink-0" fill="none" stroke="currentColor">
        <circle cx="8" cy="8" r="7.25" strokeWidth="1.25" />
        <path d={look.mark} strokeWidth="1.6" />
      </svg>
      <span className="sr-only">{look.word}:</span>
      <div className="min-w-0 flex-1 text-base text-ink">
        {title && <p className={cx("font-semibold", look.text)}>{title}</p>}
        {children}
      </div>
    </div>
  );
}
