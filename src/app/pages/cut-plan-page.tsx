import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { useParams } from "react-router-dom";
import type { Job } from "#shared/contracts/jobs.ts";
import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import { Button } from "@/components/ui/button.tsx";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cutPlanQueries, type PlannedFrom } from "@/features/cut-plan/api/queries.ts";
import { CutPlanSheet } from "@/features/cut-plan/components/cut-plan-sheet.tsx";
import { SawsPart } from "@/features/cut-plan/components/saws-part.tsx";
import { limitsQuery } from "@/lib/limits-query.ts";
import { sawsQuery } from "@/lib/saws-query.ts";
import { useReader } from "@/lib/shop-context.ts";
import { stockQuery } from "@/lib/stock-query.ts";
import { LoadProblem } from "../load-problem.tsx";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function CutPlanPage() {
  return useReader().side === "shop" ? <CutPlanOfJob /> : <NotFoundScreen />;
}

/** What is cut from what, in which order, for one job. */
function CutPlanOfJob() {
  const { slug } = useReader().shop;
  const { jobId = "" } = useParams();
  const job = useQuery(cutPlanQueries.job(slug, jobId));
  if (job.isError && job.data === undefined)
    return <LoadProblem what="The job could not be loaded." error={job.error} onRetry={() => void job.refetch()} />;
  if (!job.data)
    return (
      <Page title="Cut plan">
        <Skeleton label="Loading the cut plan" rows={6} rowClassName="h-16" />
      </Page>
    );
  return <CutPlan job={job.data} />;
}

function CutPlan({ job }: { readonly job: Job }) {
  const { slug, unit } = useReader().shop;
  const from = useQuery(cutPlanQueries.plannedFrom(slug, job));
  const saws = useQuery(sawsQuery(slug));
  const stock = useQuery(stockQuery(slug));
  const limits = useQuery(limitsQuery(slug));
  const queries = [from, saws, stock, limits];
  const failed = queries.find(({ isError, data }) => isError && data === undefined);
  const input = useMemo(
    () =>
      from.data && saws.data && stock.data && limits.data
        ? {
            document: from.data.document,
            stock: stockOfItems(stock.data),
            limits: limits.data.limits,
            saws: saws.data.saws,
            unit,
          }
        : null,
    [from.data, saws.data, stock.data, limits.data, unit],
  );

  if (failed)
    return (
      <LoadProblem
        what="What the plan is made of could not be loaded."
        error={failed.error}
        onRetry={() => void failed.refetch()}
      />
    );
  return (
    <Page
      title={`${job.number}, cut plan`}
      heading={`Cut plan of ${job.title}`}
      under={
        <>
          <span className="font-serif font-bold text-ink tabular-nums">{job.number}</span> for {job.client.name}.{" "}
          <TextLink to={paths.job(slug, job.id)} className="print:hidden">
            To the job
          </TextLink>
        </>
      }
      actions={
        from.data &&
        !isEmpty(from.data) && (
          <Button className="print:hidden" onClick={() => window.print()}>
            Print
          </Button>
        )
      }
    >
      {input === null || !from.data || !saws.data || !stock.data ? (
        <Skeleton label="Loading the cut plan" rows={6} rowClassName="h-16" />
      ) : (
        <>
          <FromNotice job={job} from={from.data} />
          {isEmpty(from.data) ? (
            <EmptyState
              title="Nothing to cut yet"
              action={<LinkButton to={paths.mockup(slug, job.id)}>To the mockup</LinkButton>}
            >
              The mockup has no pieces, no slats and no frame. Bring artwork in first; what is saved there is planned
              here.
            </EmptyState>
          ) : (
            <CutPlanSheet input={input} items={stock.data} />
          )}
          <SawsPart shop={slug} unit={unit} set={saws.data} />
        </>
      )}
    </Page>
  );
}

/** What the plan is made from, and whether that may be cut. */
function FromNotice({ job, from }: { readonly job: Job; readonly from: PlannedFrom }) {
  const { slug } = useReader().shop;
  if (from.kind === "draft")
    return (
      <Notice tone="caution" className="mb-5 max-w-3xl">
        {from.version === 0
          ? "No draft is saved yet: this is an empty board. Nothing is agreed, do not cut."
          : `From the draft of version ${from.version}: nothing is agreed yet, do not cut.`}
      </Notice>
    );
  const { latest } = job;
  const isOvertaken = latest !== null && latest.letter !== from.letter && latest.state !== "withdrawn";
  return isOvertaken ? (
    <Notice tone="caution" title={`Do not cut: revision ${latest.letter} is out.`} className="mb-5 max-w-3xl">
      This plan is of revision {from.letter}, which the client approved before.{" "}
      <TextLink to={paths.sheet(slug, latest.revisionId)}>Look at {latest.letter}</TextLink>
    </Notice>
  ) : (
    <Notice tone="done" className="mb-5 max-w-3xl">
      From revision {from.letter}, as the client approved it.
    </Notice>
  );
}

const isEmpty = ({ document: { layers, backer, frame } }: PlannedFrom): boolean =>
  layers.every(({ pieces }) => pieces.length === 0) && backer.slats === null && frame === null;
