import { TextLink } from "@/components/ui/text-link.tsx";
import { groupWords } from "../model/group-words.ts";
import { priceGroups } from "../model/price-fields.ts";

export const groupAnchor = (group: string): string => `prices-${group}`;

/** The headings of the price book, to go to. */
export function PriceIndex() {
  return (
    <nav aria-label="Kinds of prices" className="border-y border-rule py-3">
      <ul className="columns-2 gap-x-6 lg:columns-4">
        {priceGroups.map((group) => (
          <li key={group} className="break-inside-avoid">
            <TextLink to={{ hash: groupAnchor(group) }} className="inline-block py-1.5 text-sm">
              {groupWords[group].title}
            </TextLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
