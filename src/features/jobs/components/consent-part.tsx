import type { Job } from "#shared/contracts/jobs.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { formatDay } from "@/lib/format.ts";
import { useSetConsent } from "../api/mutations.ts";

/** Whether the piece may be shown in the shop's portfolio. Only the client gives and takes back. */
export function ConsentPart({
  shop,
  shopName,
  job,
  side,
}: {
  readonly shop: string;
  readonly shopName: string;
  readonly job: Job;
  readonly side: "shop" | "client";
}) {
  const set = useSetConsent(shop, job.id);
  const { given, at } = job.consent;
  const since = at ? ` since ${formatDay(at)}` : "";
  return (
    <section aria-labelledby="portfolio">
      <h2 id="portfolio" className="mb-2 font-serif text-lg font-bold">
        Portfolio
      </h2>
      {set.isError && <Notice tone="error">{messageOf(set.error)}</Notice>}
      {side === "client" ? (
        <p className="text-base">
          {given
            ? `${shopName} may show this sign to others${since}.`
            : `${shopName} may not show this sign to others. You can allow it; your notes and contacts are never shown.`}
        </p>
      ) : (
        <p className="text-base">
          {given
            ? `The client agreed${since}: the approved piece may be shown.`
            : "The client has not agreed yet. They are asked when they approve, and can agree on their page of this job."}
        </p>
      )}
      {job.can.giveConsent && (
        <Button size="small" className="mt-3" busy={set.isPending} onClick={() => set.mutate(!given)}>
          {given ? "Take it back" : "Allow it"}
        </Button>
      )}
    </section>
  );
}
