import { limitGroups } from "#shared/dry-fit/limit-descriptions.ts";
import { TextLink } from "@/components/ui/text-link.tsx";

export const groupAnchor = (id: string): string => `limits-${id}`;

/** The headings of the limits, to go to. */
export function LimitIndex() {
  return (
    <nav aria-label="Kinds of limits" className="mt-4 border-y border-rule py-3">
      <ul className="columns-2 gap-x-6 lg:columns-4">
        {limitGroups.map(({ id, title }) => (
          <li key={id} className="break-inside-avoid">
            <TextLink to={{ hash: groupAnchor(id) }} className="inline-block py-1.5 text-sm">
              {title}
            </TextLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
