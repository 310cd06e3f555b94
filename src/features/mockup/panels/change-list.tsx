import { useState } from "react";
import { type Change, listChanges } from "#shared/mockup/changes.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { counted } from "@/lib/format.ts";

/** How many are said before a press shows all. */
const fewChanges = 5;

/** Two changes can read the same, of other pieces. */
const keyOf = ({ kind, text, pieceIds }: Change): string => `${kind} ${text} ${pieceIds[0] ?? ""}`;

type ChangeListProps = {
  readonly before: MockupDocument;
  readonly after: MockupDocument;
  readonly unit: LengthUnit;
  /** What the list says, as "What it changes". */
  readonly title: string;
};

/** What is different in one document from another, in the words of compared revisions. */
export function ChangeList({ before, after, unit, title }: ChangeListProps) {
  const [isWhole, showWhole] = useState(false);
  const changes = listChanges(before, after, unit);
  const shown = isWhole ? changes : changes.slice(0, fewChanges);
  const more = changes.length - shown.length;
  if (changes.length === 0)
    return <p className="text-sm text-ink">{title}: nothing that can be seen or built differently.</p>;
  return (
    <div className="text-sm text-ink">
      <p className="font-semibold">{title}</p>
      <ul className="mt-1 max-h-48 list-disc space-y-0.5 overflow-y-auto pl-5" tabIndex={isWhole ? 0 : undefined}>
        {shown.map((change) => (
          <li key={keyOf(change)}>{change.text}</li>
        ))}
      </ul>
      {more > 0 && (
        <button
          type="button"
          className="mt-1 cursor-pointer rounded font-semibold underline underline-offset-4 hover:bg-linen"
          onClick={() => showWhole(true)}
        >
          and {counted(more, "more change")}
        </button>
      )}
    </div>
  );
}
