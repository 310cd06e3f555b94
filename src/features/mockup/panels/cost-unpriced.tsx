import type { Unpriced } from "#shared/cost/priced-sign.ts";
import { TextLink } from "@/components/ui/text-link.tsx";

/** What has no price yet, and where to give it one. */
export function CostUnpriced({
  unpriced,
  pricesPath,
  mayChange,
}: {
  readonly unpriced: readonly Unpriced[];
  readonly pricesPath: string;
  readonly mayChange: boolean;
}) {
  if (unpriced.length === 0) return null;
  return (
    <div className="my-2 max-w-prose border-l-4 border-ochre pl-4 text-sm">
      <p className="font-semibold text-ochre">No price yet, and not in the sum:</p>
      <ul className="mt-1 list-disc pl-5 text-ink">
        {unpriced.map(({ group, id, name }) => (
          <li key={`${group} ${id}`}>{name}</li>
        ))}
      </ul>
      <p className="mt-1 text-graphite">
        {mayChange ? (
          <TextLink to={pricesPath}>Give them a price</TextLink>
        ) : (
          <>
            An owner writes the prices. <TextLink to={pricesPath}>Look at the prices</TextLink>
          </>
        )}
      </p>
    </div>
  );
}
