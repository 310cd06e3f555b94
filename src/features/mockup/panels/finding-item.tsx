import { useEffect, useRef, useState } from "react";
import { calculationOfRule } from "#shared/calculations/calculation-of-rule.ts";
import type { Role } from "#shared/contracts/account.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import type { Mend } from "#shared/dry-fit/mend.ts";
import { maySetAside } from "#shared/dry-fit/set-aside.ts";
import { wakingWords } from "#shared/dry-fit/waking-words.ts";
import { paths } from "@/app/paths.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cx } from "@/lib/cx.ts";
import { formatDay } from "@/lib/format.ts";
import { useReader } from "@/lib/shop-context.ts";
import type { DeskStanding } from "../editor/use-standings.ts";
import { shortAndRest } from "../model/short-text.ts";
import { titleAndLayer } from "../model/title-and-layer.ts";
import { WordButton } from "./cell-controls.tsx";
import { SeverityWord } from "./finding-look.tsx";
import { SetAsideForm } from "./set-aside-form.tsx";
import { ShowFinding } from "./show-finding.tsx";

type FindingItemProps = {
  readonly standing: DeskStanding;
  readonly isShown: boolean;
  /** Missing where there is nothing to show it on. */
  readonly onShow?: ((finding: Finding) => void) | undefined;
  /** What a press would change about the drawing. */
  readonly mends: readonly Mend[];
  readonly onMend?: ((mend: Mend) => void) | undefined;
  /** Sets it aside and gives what stood in the way, or null; missing where the mockup is only looked at. */
  readonly onSetAside?: ((finding: Finding, reason: string) => Promise<string | null>) | undefined;
};

/** A finding that stands: what, where, and what can be done about it. */
export function FindingItem({
  standing: { finding, woken },
  isShown,
  onShow,
  mends,
  onMend,
  onSetAside,
}: FindingItemProps) {
  const { role, shop } = useReader();
  const calculation = calculationOfRule[finding.rule];
  return (
    <li className={cx("flex gap-2 border-b border-rule py-2 text-sm", isShown && "bg-indigo/8")}>
      <SeverityWord severity={finding.severity} />
      <div className="min-w-0 flex-1 wrap-anywhere text-ink">
        {finding.severity === "remark" ? <ShortText {...finding} /> : finding.text}{" "}
        <ShowFinding finding={finding} onShow={onShow} />
        <span className="block text-fine text-graphite">
          {calculation === undefined ? (
            finding.title
          ) : (
            <TextLink
              to={paths.howWeWorkItOut(shop.slug, calculation)}
              target="_blank"
              title="How it is worked out, in a new tab"
            >
              {finding.title}
              <span className="sr-only">: how it is worked out, in a new tab</span>
            </TextLink>
          )}
          , {finding.source}
        </span>
        {woken && (
          <p className="mt-1 border-l-2 border-ochre pl-2 text-fine text-graphite">
            {woken.by} set this aside on {formatDay(woken.at)}: “{woken.reason}”.{" "}
            <span className="text-ink">{wakingWords(woken.finding, finding, shop.unit)}</span>
          </p>
        )}
        <div className="flex flex-wrap items-center gap-x-3">
          {onMend &&
            mends.map((mend) => (
              <WordButton
                key={mend.label}
                className="-ml-1"
                aria-label={`${mend.label}: ${titleAndLayer(finding)}`}
                onClick={() => onMend(mend)}
              >
                {mend.label}
              </WordButton>
            ))}
          {onSetAside && (
            <WaysToSetAside finding={finding} role={role} onSend={(reason) => onSetAside(finding, reason)} />
          )}
        </div>
      </div>
    </li>
  );
}

/** What a remark says first, and the rest of it when it is wanted. */
function ShortText({ title, text }: Pick<Finding, "title" | "text">) {
  const [isWhole, setWhole] = useState(false);
  const { short, rest } = shortAndRest(text);
  if (rest === "") return text;
  return (
    <>
      {short} {isWhole && `${rest} `}
      <WordButton
        inText
        aria-expanded={isWhole}
        aria-label={isWhole ? `Less of this: ${title}` : `More of this: ${title}`}
        onClick={() => setWhole(!isWhole)}
      >
        {isWhole ? "Less" : "More"}
      </WordButton>
    </>
  );
}

type WaysProps = {
  readonly finding: Finding;
  readonly role: Role | null;
  readonly onSend: (reason: string) => Promise<string | null>;
};

/** The word to press, the form that it opens, or whose it is. */
function WaysToSetAside({ finding, role, onSend }: WaysProps) {
  const [isAsking, setAsking] = useState(false);
  const opener = useRef<HTMLButtonElement>(null);
  const wasAsking = useRef(false);
  useEffect(() => {
    if (wasAsking.current && !isAsking) opener.current?.focus();
    wasAsking.current = isAsking;
  }, [isAsking]);

  if (role === null || role === "rep") return null;
  if (!maySetAside(role, finding))
    return <p className="basis-full text-fine text-graphite">A stop about safety: only an owner can set it aside.</p>;
  if (isAsking)
    return (
      <div className="basis-full">
        <SetAsideForm finding={finding} onSend={onSend} onCancel={() => setAsking(false)} />
      </div>
    );
  return (
    <WordButton
      ref={opener}
      className="-ml-1"
      aria-label={`Set aside: ${titleAndLayer(finding)}`}
      onClick={() => setAsking(true)}
    >
      Set aside …
    </WordButton>
  );
}
