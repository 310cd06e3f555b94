import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useNavigate, useParams } from "react-router-dom";
import type { Role } from "#shared/contracts/account.ts";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { Unpriced } from "#shared/cost/priced-sign.ts";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { mockupQueries } from "@/features/mockup/api/queries.ts";
import { useIsSaveLeft } from "@/features/mockup/editor/saves-left.ts";
import { MockupDesk } from "@/features/mockup/panels/mockup-desk.tsx";
import { MockupReadOnly } from "@/features/mockup/panels/mockup-read-only.tsx";
import { limitsQuery } from "@/lib/limits-query.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { useReader } from "@/lib/shop-context.ts";
import { stockQuery } from "@/lib/stock-query.ts";
import { useMedia } from "@/lib/use-media.ts";
import { HeaderTools } from "../header-tools.tsx";
import { LoadProblem } from "../load-problem.tsx";
import { paths } from "../paths.ts";

/** The mockup of a job: the desk where there is room for it and the right to change it, else a picture to look at. */
export function MockupPage() {
  const { jobId = "" } = useParams();
  const { shop, person, role } = useReader();
  const navigate = useNavigate();
  const client = useQueryClient();
  const isWide = useMedia("(min-width: 900px)");
  const job = useQuery(mockupQueries.job(shop.slug, jobId));
  const isSaveLeft = useIsSaveLeft({ shop: shop.slug, jobId });
  // Asked before a save is answered that was on its way when the desk was left, the server might tell the version before.
  const mockup = useQuery({ ...mockupQueries.ofJob(shop.slug, jobId), enabled: !isSaveLeft });
  const stock = useQuery(stockQuery(shop.slug));
  const limits = useQuery(limitsQuery(shop.slug));
  usePageTitle(job.data ? `${job.data.title}, mockup` : "Mockup");

  /** A window that is made narrow and wide again goes on from what was saved last. After the page was left, the server is asked. */
  function noteSaved(saved: Mockup) {
    const { queryKey } = mockupQueries.ofJob(shop.slug, jobId);
    const isOpen = client.getQueryCache().find({ queryKey })?.getObserversCount();
    if (isOpen) client.setQueryData(queryKey, saved);
  }

  const failed = [job, mockup, stock, limits].find((query) => query.isError && query.data === undefined);
  if (failed)
    return (
      <LoadProblem what="The mockup could not be loaded." error={failed.error} onRetry={() => void failed.refetch()} />
    );
  if (isSaveLeft && isWide)
    return (
      <p role="status" className="px-4 py-8 text-graphite sm:px-6">
        The last changes are being saved. The mockup opens as soon as that is done.
      </p>
    );
  if (!job.data || !mockup.data || !stock.data || !limits.data)
    return (
      <div className="px-4 py-8 sm:px-6">
        <Skeleton label="Loading the mockup" />
      </div>
    );
  const pricesPath = shop.can.seePrices ? (wanted: readonly Unpriced[]) => paths.prices(shop.slug, wanted) : null;
  if (!mockup.data.can.edit || !isWide)
    return (
      <MockupReadOnly
        shop={shop.slug}
        unit={shop.unit}
        job={job.data}
        jobPath={paths.job(shop.slug, jobId)}
        mockup={mockup.data}
        limits={limits.data.limits}
        stock={stock.data}
        pricesPath={pricesPath}
        why={whyNotToChange({ mayEdit: mockup.data.can.edit, role })}
      />
    );
  return (
    <MockupDesk
      key={jobId}
      shop={shop.slug}
      unit={shop.unit}
      personId={person.id}
      job={job.data}
      mockup={mockup.data}
      stock={stock.data}
      limits={limits.data.limits}
      jobPath={paths.job(shop.slug, jobId)}
      pricesPath={pricesPath}
      cutPlanPath={paths.cutPlan(shop.slug, jobId)}
      onSaved={noteSaved}
      onIssued={(revisionId) => void navigate(paths.sheet(shop.slug, revisionId))}
      renderTools={(tools) => <HeaderTools>{tools}</HeaderTools>}
    />
  );
}

function whyNotToChange({ mayEdit, role }: { mayEdit: boolean; role: Role | null }): string {
  if (mayEdit) return "To change the mockup, open it in a window at least 900 px wide. Here it can be looked at.";
  if (role === "owner" || role === "maker")
    return "The job’s state lets nobody change the mockup now. It can be looked at.";
  return "You may look at this mockup. Owners and makers change it.";
}
