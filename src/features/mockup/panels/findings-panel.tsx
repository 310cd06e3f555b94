import { useEffect, useRef, useState } from "react";
import type { Finding, Severity } from "#shared/dry-fit/finding.ts";
import type { Mend } from "#shared/dry-fit/mend.ts";
import { paths } from "@/app/paths.ts";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cx } from "@/lib/cx.ts";
import { counted } from "@/lib/format.ts";
import { useShop } from "@/lib/shop-context.ts";
import type { SettingAside } from "../editor/use-setting-aside.ts";
import type { DeskStanding, Standings } from "../editor/use-standings.ts";
import type { DryFit, Mends } from "../engine/picture-messages.ts";
import { keyedStandings } from "../model/keyed-standings.ts";
import { FindingItem } from "./finding-item.tsx";
import { FindingsList } from "./findings-list.tsx";
import { Fold } from "./fold.tsx";
import { SetAsideList } from "./set-aside-list.tsx";

type FindingsPanelProps = {
  /** null until the first run. */
  readonly dryFit: DryFit | null;
  /** What mends each finding, as far as it is known. */
  readonly mends?: Mends;
  readonly standings: Standings;
  /** Whether the findings are of the drawing as it is now. */
  readonly isCurrent: boolean;
  readonly shown?: Finding | null;
  readonly onShow?: (finding: Finding) => void;
  /** Missing where the mockup is only looked at. */
  readonly onMend?: (mend: Mend) => void;
  /** Missing where the mockup is only looked at. */
  readonly settingAside?: SettingAside;
  readonly className?: string;
};

/** What the dry fit found, worst first, each with the way to the spot; below it what was set aside. */
export function FindingsPanel(props: FindingsPanelProps) {
  const { dryFit, standings: known, isCurrent, shown = null, onShow, onMend, settingAside, className } = props;
  const { slug } = useShop();
  const landing = useLanding();
  const standings = known.standings ?? [];
  const open = keyedStandings(standings.filter(({ setAside }) => setAside === null));
  const of = (severity: Severity) => open.filter(({ finding }) => finding.severity === severity);
  const remarks = of("remark");
  const mends = new Map(dryFit?.findings.map((finding, index) => [finding, props.mends?.[index] ?? []]));
  const ready = dryFit !== null && known.standings !== null;

  const renderItem = (one: (typeof open)[number]) => (
    <FindingItem
      key={one.key}
      standing={one}
      isShown={one.finding === shown}
      onShow={onShow}
      mends={isCurrent ? (mends.get(one.finding) ?? []) : []}
      onMend={
        onMend &&
        ((mend) => {
          onMend(mend);
          landing.go("open");
        })
      }
      onSetAside={
        settingAside &&
        (async (finding, reason) => {
          const problem = await settingAside.setAside(finding, reason);
          if (problem === null) landing.go("aside");
          return problem;
        })
      }
    />
  );

  return (
    <section
      aria-label="Dry fit"
      data-desk-part
      aria-busy={!(isCurrent && ready)}
      className={cx("min-w-0 px-4 pt-2 pb-6", className)}
    >
      <h2 ref={landing.open} tabIndex={-1} className="font-serif text-base font-bold text-ink">
        Dry fit{" "}
        <span role="status" className="font-sans text-sm font-normal text-graphite">
          {ready ? summaryOf(standings, dryFit.fine) : "is running"}
        </span>
        {/* It takes no room: the list below must not jump at each change of the drawing. */}
        {ready && !isCurrent && (
          <span aria-hidden="true" className="absolute font-sans text-sm font-normal text-graphite">
            …
          </span>
        )}
      </h2>
      {known.failure !== null && (
        <ProblemNotice what="What was set aside could not be loaded." error={known.failure} onRetry={known.retry} />
      )}
      {isCurrent && ready && standings.length === 0 && (
        <p className="pt-2 text-sm text-graphite">Nothing found. Test on scrap all the same.</p>
      )}
      <div className="pt-1">
        <FindingsList label="Stops" standings={of("stop")} renderItem={renderItem} />
        <FindingsList label="Cautions" standings={of("caution")} renderItem={renderItem} />
        {remarks.length > 0 && (
          <Fold name="remarks" summary={counted(remarks.length, "remark")} className="pt-1">
            <FindingsList label="Remarks" standings={remarks} renderItem={renderItem} />
          </Fold>
        )}
      </div>
      <SetAsideList
        standings={standings}
        heading={landing.aside}
        onShow={onShow}
        onTakeBack={
          settingAside &&
          (async (setAside) => {
            const problem = await settingAside.takeBack(setAside);
            if (problem === null) landing.go("open");
            return problem;
          })
        }
      />
      <p className="pt-3 text-sm">
        <TextLink to={paths.howWeWorkItOut(slug)} target="_blank">
          How we work it out<span className="sr-only">, in a new tab</span>
        </TextLink>
      </p>
    </section>
  );
}

/** What was pressed has gone into the other list: the focus follows to that list's head, once the list is there. */
function useLanding() {
  const open = useRef<HTMLHeadingElement>(null);
  const aside = useRef<HTMLHeadingElement>(null);
  const [to, setTo] = useState<"open" | "aside" | null>(null);
  useEffect(() => {
    const head = to === "open" ? open.current : to === "aside" ? aside.current : null;
    if (head === null) return;
    head.focus();
    setTo(null);
  });
  return { open, aside, go: setTo };
}

function summaryOf(standings: readonly DeskStanding[], fine: number): string {
  const count = (severity: Severity) =>
    standings.filter(({ finding, setAside }) => setAside === null && finding.severity === severity).length;
  const aside = standings.filter(({ setAside }) => setAside !== null).length;
  const parts = [
    count("stop") > 0 && counted(count("stop"), "stop"),
    count("caution") > 0 && counted(count("caution"), "caution"),
    count("remark") > 0 && counted(count("remark"), "remark"),
    aside > 0 && `${aside} set aside`,
    `${fine} fine`,
  ];
  return parts.filter(Boolean).join(", ");
}
