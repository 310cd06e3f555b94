import { TextLink } from "@/components/ui/text-link.tsx";
import { counted } from "@/lib/format.ts";
import type { NumberedGroup } from "../model/find-calculations.ts";

/** The groups with everything in them; on a phone the groups alone, so that the first entry is not pages away. */
export function CalculationIndex({ groups }: { readonly groups: readonly NumberedGroup[] }) {
  return (
    <nav
      id={indexAnchor}
      tabIndex={-1}
      aria-label="Index"
      className="scroll-mt-4 border-t border-ink pt-3 sm:columns-2 sm:gap-10 lg:columns-3 xl:columns-4"
    >
      {groups.map(({ number, title, entries }) => (
        <div key={number} className="break-inside-avoid border-b border-rule py-1.5 sm:border-0 sm:pt-0 sm:pb-5">
          <p className="flex items-baseline gap-3 font-serif text-base font-bold">
            <span className="w-8 shrink-0 tabular-nums text-graphite">{number}</span>
            <TextLink to={{ hash: groupAnchor(number) }} className="max-sm:py-1.5">
              {title}
            </TextLink>
            <span className="ml-auto font-normal tabular-nums text-graphite sm:hidden">
              <span aria-hidden="true">{entries.length}</span>
              <span className="sr-only">{counted(entries.length, "calculation")}</span>
            </span>
          </p>
          <ul className="hidden sm:block">
            {entries.map(({ number: place, calculation: { id, title: name } }) => (
              <li key={id} className="flex gap-3 py-0.5 text-sm">
                <span className="w-8 shrink-0 tabular-nums text-graphite">{place}</span>
                <TextLink to={{ hash: id }} className="min-w-0 decoration-rule">
                  {name}
                </TextLink>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </nav>
  );
}

/** Where the index stands on the page. */
export const indexAnchor = "index";

/** Where a group begins on the page. */
export const groupAnchor = (number: string): string => `group-${number}`;
