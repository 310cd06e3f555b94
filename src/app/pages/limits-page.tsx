import { useQuery } from "@tanstack/react-query";
import { calculationOfRule } from "#shared/calculations/calculation-of-rule.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { LimitsForm } from "@/features/limits/components/limits-form.tsx";
import { LimitsToRead } from "@/features/limits/components/limits-to-read.tsx";
import { limitsQuery } from "@/lib/limits-query.ts";
import { useReader } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function LimitsPage() {
  return useReader().side === "shop" ? <Limits /> : <NotFoundScreen />;
}

function Limits() {
  const { slug, unit } = useReader().shop;
  const limits = useQuery(limitsQuery(slug));
  const explanationOf = (rule: number): string | null => {
    const calculation = calculationOfRule[rule];
    return calculation === undefined ? null : paths.howWeWorkItOut(slug, calculation);
  };
  return (
    <Page
      title="Limits of the dry fit"
      under="What the checks of every mockup keep to. A figure that the shop does not set follows the default."
    >
      <Notice tone="caution" title="Estimates for planning" className="mb-6 max-w-3xl">
        A limit is the shop’s own judgment. Local codes and licensed practice come first, then the maker’s sheet, then a
        trial on scrap.
      </Notice>
      {limits.data === undefined && limits.isError ? (
        <ProblemNotice
          what="The limits could not be loaded."
          error={limits.error}
          onRetry={() => void limits.refetch()}
        />
      ) : limits.data === undefined ? (
        <Skeleton label="Loading the limits" rows={8} rowClassName="h-20" />
      ) : limits.data.can.change ? (
        <LimitsForm shop={slug} unit={unit} set={limits.data} explanationOf={explanationOf} />
      ) : (
        <LimitsToRead unit={unit} set={limits.data} explanationOf={explanationOf} />
      )}
    </Page>
  );
}
