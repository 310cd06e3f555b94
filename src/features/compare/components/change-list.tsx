import type { Change } from "#shared/mockup/changes.ts";
import { cx } from "@/lib/cx.ts";

type ChangeListProps = {
  readonly changes: readonly Change[];
  readonly before: string;
  readonly after: string;
  /** Place in the list of the change that shows on the pictures. */
  readonly chosen: number | null;
  readonly onChoose: (place: number | null) => void;
};

/** What changed, in words; a change that has a spot shows it on both pictures. */
export function ChangeList({ changes, before, after, chosen, onChoose }: ChangeListProps) {
  return (
    <section aria-labelledby="changes-heading">
      <h2 id="changes-heading" className="px-4 pt-3 pb-2 font-serif text-base font-bold">
        From {before} to {after}{" "}
        <span className="font-sans text-fine font-normal text-graphite">
          {changes.length === 1 ? "1 change" : `${changes.length} changes`}
        </span>
      </h2>
      {changes.length === 0 ? (
        <p className="px-4 pb-4 text-sm text-graphite">
          Nothing about the sign changed between these two revisions. Notes and the message that came along may have.
        </p>
      ) : (
        <ol className="border-t border-rule">
          {changes.map((change, place) => (
            <li key={`${change.kind} ${change.text}`} className="border-b border-rule">
              <button
                type="button"
                aria-pressed={place === chosen}
                disabled={change.where === null}
                onClick={() => onChoose(place === chosen ? null : place)}
                className={cx(
                  "flex w-full gap-3 px-4 py-3 text-left",
                  change.where !== null && "cursor-pointer hover:bg-linen",
                  place === chosen && "bg-linen",
                )}
              >
                <span
                  className={cx(
                    "mt-0.5 flex size-6 shrink-0 items-center justify-center border font-serif text-fine font-bold",
                    place === chosen ? "border-indigo bg-indigo text-sheet" : "border-graphite text-ink",
                  )}
                >
                  {place + 1}
                </span>
                <span className="min-w-0">
                  <span className="block text-ink">{change.text}</span>
                  <span className="block text-fine text-graphite">
                    {change.where === null ? (
                      "no one spot on the drawing"
                    ) : (
                      <span className="text-indigo underline underline-offset-2">
                        {place === chosen ? "shown on both" : "show on both"}
                      </span>
                    )}
                  </span>
                </span>
              </button>
            </li>
          ))}
        </ol>
      )}
    </section>
  );
}
