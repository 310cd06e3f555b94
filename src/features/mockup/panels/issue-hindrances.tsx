import { Notice } from "@/components/ui/notice.tsx";
import { counted } from "@/lib/format.ts";
import type { DeskStanding } from "../editor/use-standings.ts";
import { keyedStandings } from "../model/keyed-standings.ts";

type IssueHindrancesProps = {
  readonly standings: readonly DeskStanding[];
};

/** What keeps a revision from being issued, and what would if it were not set aside. */
export function IssueHindrances({ standings }: IssueHindrancesProps) {
  const all = keyedStandings(standings);
  const stops = all.filter(({ finding, setAside }) => setAside === null && finding.severity === "stop");
  const aside = all.flatMap(({ key, finding, setAside }) => (setAside ? [{ key, finding, setAside }] : []));
  return (
    <>
      {stops.length > 0 && (
        <Notice tone="error" title={`${counted(stops.length, "stop")} in the way`}>
          <ul className="space-y-1 text-sm">
            {stops.map(({ key, finding }) => (
              <li key={key}>{finding.text}</li>
            ))}
          </ul>
        </Notice>
      )}
      {aside.length > 0 && (
        <Notice tone="caution" title={`${counted(aside.length, "finding")} set aside`}>
          <ul className="space-y-2 text-sm">
            {aside.map(({ key, finding, setAside }) => (
              <li key={key}>
                {finding.text}
                <span className="block text-graphite">
                  “{setAside.reason}”, {setAside.by}
                </span>
              </li>
            ))}
          </ul>
          <p className="mt-2 text-fine text-graphite">
            They are kept with the revision, for the shop only. The client’s sheet does not show them.
          </p>
        </Notice>
      )}
    </>
  );
}
