import { type Ref, useState } from "react";
import type { SetAside } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { formatDay } from "@/lib/format.ts";
import type { DeskStanding } from "../editor/use-standings.ts";
import { keyedStandings } from "../model/keyed-standings.ts";
import { titleAndLayer } from "../model/title-and-layer.ts";
import { WordButton } from "./cell-controls.tsx";
import { SeverityWord } from "./finding-look.tsx";
import { ShowFinding } from "./show-finding.tsx";

type SetAsideListProps = {
  readonly standings: readonly DeskStanding[];
  readonly heading: Ref<HTMLHeadingElement>;
  readonly onShow?: ((finding: Finding) => void) | undefined;
  /** Gives what stood in the way, or null; missing where the mockup is only looked at. */
  readonly onTakeBack?: ((setAside: SetAside) => Promise<string | null>) | undefined;
};

/** What stands no more, each with the reason and whose it was. */
export function SetAsideList({ standings, heading, onShow, onTakeBack }: SetAsideListProps) {
  const [problem, setProblem] = useState<string | null>(null);
  const aside = keyedStandings(standings).flatMap(({ key, finding, setAside }) =>
    setAside ? [{ key, finding, setAside }] : [],
  );
  if (aside.length === 0) return null;
  return (
    <section aria-label="Set aside" className="pt-4">
      <h3 ref={heading} tabIndex={-1} className="font-serif text-base font-bold text-ink">
        Set aside
      </h3>
      {problem && (
        <p role="alert" className="pt-1 text-sm text-oxblood">
          {problem}
        </p>
      )}
      <ul>
        {aside.map(({ key, finding, setAside }) => (
          <li key={key} className="flex gap-2 border-b border-rule py-2 text-sm">
            <SeverityWord quiet severity={finding.severity} />
            <div className="min-w-0 flex-1 wrap-anywhere">
              <p className="text-graphite">
                {finding.text} <ShowFinding finding={finding} onShow={onShow} />
              </p>
              <p className="text-ink">“{setAside.reason}”</p>
              <p className="text-fine text-graphite">
                {setAside.by}, {formatDay(setAside.at)}{" "}
                {setAside.can.takeBack && onTakeBack && (
                  <WordButton
                    inText
                    className="ml-1"
                    aria-label={`Take back: ${titleAndLayer(finding)}`}
                    onClick={() => void onTakeBack(setAside).then(setProblem)}
                  >
                    Take back
                  </WordButton>
                )}
              </p>
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
