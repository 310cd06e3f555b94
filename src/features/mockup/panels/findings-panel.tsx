import type { Finding, Severity } from "#shared/dry-fit/finding.ts";
import { paths } from "@/app/paths.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cx } from "@/lib/cx.ts";
import { counted } from "@/lib/format.ts";
import { useShop } from "@/lib/shop-context.ts";
import type { DryFit } from "../engine/picture-messages.ts";
import { WordButton } from "./cell-controls.tsx";

const looks: Record<Severity, { word: string; text: string; mark: string }> = {
  stop: { word: "Stop", text: "text-oxblood", mark: "M5 1.5h6l3.5 3.5v6L11 14.5H5L1.5 11V5zM5 8h6" },
  caution: { word: "Caution", text: "text-ochre", mark: "M8 1.8L15 14H1zM8 6.2v4M8 11.6v1.2" },
  remark: { word: "Remark", text: "text-graphite", mark: "M8 1.5a6.5 6.5 0 110 13 6.5 6.5 0 010-13M8 7v4.5M8 4.4v1.2" },
};

type FindingsPanelProps = {
  /** null until the first run. */
  readonly dryFit: DryFit | null;
  /** Whether the findings are of the drawing as it is now. */
  readonly isCurrent: boolean;
  readonly shown: Finding | null;
  readonly onShow: (finding: Finding) => void;
};

/** What the dry fit found, worst first, each with the way to the spot. */
export function FindingsPanel({ dryFit, isCurrent, shown, onShow }: FindingsPanelProps) {
  const { slug } = useShop();
  return (
    <section
      aria-label="Dry fit"
      aria-busy={!isCurrent}
      className="min-w-0 border-rule px-4 pt-2 pb-6 max-[1200px]:border-t min-[1200px]:border-l"
    >
      <h2 className="font-serif text-base font-bold text-ink">
        Dry fit{" "}
        <span role="status" className="font-sans text-sm font-normal text-graphite">
          {dryFit === null ? "is running" : summaryOf(dryFit)}
        </span>
        {dryFit !== null && !isCurrent && (
          <span aria-hidden="true" className="font-sans text-sm font-normal text-graphite">
            , looking again …
          </span>
        )}
      </h2>
      {isCurrent && dryFit?.findings.length === 0 && (
        <p className="pt-2 text-sm text-graphite">Nothing found. Test on scrap all the same.</p>
      )}
      <ul className="pt-1">
        {dryFit?.findings.map((finding) => {
          const look = looks[finding.severity];
          return (
            <li
              key={keyOf(finding)}
              className={cx("flex gap-3 border-b border-rule py-2 text-sm", finding === shown && "bg-indigo/8")}
            >
              <span className={cx("flex w-20 shrink-0 items-start gap-1.5 font-semibold", look.text)}>
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
              <span className="min-w-0 wrap-anywhere text-ink">
                {finding.text}{" "}
                {(finding.where !== null || finding.layerKey !== null) && (
                  <WordButton inText aria-label={`Show: ${finding.title}`} onClick={() => onShow(finding)}>
                    Show
                  </WordButton>
                )}
                <span className="block text-fine text-graphite">
                  {finding.title}, {finding.source}
                </span>
              </span>
            </li>
          );
        })}
      </ul>
      <p className="pt-3 text-sm">
        <TextLink to={paths.howWeWorkItOut(slug)} target="_blank">
          How we work it out<span className="sr-only">, in a new tab</span>
        </TextLink>
      </p>
    </section>
  );
}

function summaryOf({ findings, fine }: DryFit): string {
  const count = (severity: Severity) => findings.filter((finding) => finding.severity === severity).length;
  const parts = [
    count("stop") > 0 && counted(count("stop"), "stop"),
    count("caution") > 0 && counted(count("caution"), "caution"),
    count("remark") > 0 && counted(count("remark"), "remark"),
    `${fine} fine`,
  ];
  return parts.filter(Boolean).join(", ");
}

/** What tells a finding from all others of the same run. */
function keyOf({ rule, layerKey, pieceIds, holeId, where, text }: Finding): string {
  return [rule, layerKey, pieceIds.join(" "), holeId, where?.x, where?.y, text].join("|");
}
