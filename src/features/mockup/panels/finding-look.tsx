import type { Severity } from "#shared/dry-fit/finding.ts";
import { cx } from "@/lib/cx.ts";

const looks: Record<Severity, { word: string; text: string; mark: string }> = {
  stop: { word: "Stop", text: "text-oxblood", mark: "M5 1.5h6l3.5 3.5v6L11 14.5H5L1.5 11V5zM5 8h6" },
  caution: { word: "Caution", text: "text-ochre", mark: "M8 1.8L15 14H1zM8 6.2v4M8 11.6v1.2" },
  remark: { word: "Remark", text: "text-graphite", mark: "M8 1.5a6.5 6.5 0 110 13 6.5 6.5 0 010-13M8 7v4.5M8 4.4v1.2" },
};

/** How grave a finding is, in a word with its mark. Without colour it stands for nothing any more. */
export function SeverityWord({ severity, quiet = false }: { readonly severity: Severity; readonly quiet?: boolean }) {
  const look = looks[severity];
  return (
    <span className={cx("flex w-20 shrink-0 items-start gap-1.5 font-semibold", quiet ? "text-graphite" : look.text)}>
      <svg
        aria-hidden="true"
        viewBox="0 0 16 16"
        className="mt-0.5 size-3.5 shrink-0"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.4"
      >
        <path d={look.mark} />
      </svg>
      {look.word}
    </span>
  );
}
