import { useQuery } from "@tanstack/react-query";
import { useNavigate, useParams, useSearchParams } from "react-router-dom";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { ArtworkPart } from "@/features/artwork/components/artwork-part.tsx";
import { JobMailList } from "@/features/job-mails/components/job-mail-list.tsx";
import { RefusedMails } from "@/features/job-mails/components/refused-mails.tsx";
import { jobQuery } from "@/features/jobs/api/queries.ts";
import { AnotherLike } from "@/features/jobs/components/another-like.tsx";
import { BriefPart } from "@/features/jobs/components/brief-part.tsx";
import { ConsentPart } from "@/features/jobs/components/consent-part.tsx";
import { EventLog } from "@/features/jobs/components/event-log.tsx";
import { JobMoves } from "@/features/jobs/components/job-moves.tsx";
import { nextActionOf, wayToCutPlan, wayToMockup } from "@/features/jobs/components/next-action.ts";
import { NextStep } from "@/features/jobs/components/next-step.tsx";
import { OpenNotes } from "@/features/jobs/components/open-notes.tsx";
import { RevisionList } from "@/features/jobs/components/revision-list.tsx";
import { formatDay, formatDue } from "@/lib/format.ts";
import { useReader } from "@/lib/shop-context.ts";
import { useLiveJob } from "@/lib/use-live-job.ts";
import { LoadProblem } from "../load-problem.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function JobPage() {
  const { shop, side } = useReader();
  const { jobId = "" } = useParams();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const query = useQuery(jobQuery(shop.slug, jobId));
  useLiveJob(shop.slug, query.isSuccess ? jobId : null);
  if (query.isPending) {
    return (
      <Page title="Job">
        <Skeleton label="Loading the job" rows={3} rowClassName="h-24" />
      </Page>
    );
  }
  if (query.isError) {
    return <LoadProblem what="The job could not be loaded." error={query.error} onRetry={() => void query.refetch()} />;
  }
  const job = query.data;
  const slug = shop.slug;
  const staff = side === "shop";
  const mockup = staff ? wayToMockup(job, slug) : null;
  const next = nextActionOf(job, slug, side);
  const leadsToMockup = next?.kind === "go" && next.to === mockup?.to;
  // What is worked on now comes first.
  const brief = <BriefPart key="brief" shop={slug} unit={shop.unit} job={job} side={side} />;
  return (
    <Page
      title={`${job.number}, ${job.title}`}
      heading={job.title}
      under={
        <>
          <span className="font-serif font-bold text-ink tabular-nums">{job.number}</span> for{" "}
          {staff && shop.can.seeClients ? (
            <TextLink to={paths.client(slug, job.client.id)}>{job.client.name}</TextLink>
          ) : (
            job.client.name
          )}
          {job.dueOn &&
            `, ${staff ? formatDue(job.dueOn) : "planned for"} ${staff ? `(${formatDay(job.dueOn)})` : formatDay(job.dueOn)}`}
        </>
      }
    >
      <div className="space-y-9">
        {staff && <RefusedMails shop={slug} jobId={jobId} />}
        <NextStep job={job} shop={slug} side={side} />
        <div className="grid gap-10 lg:grid-cols-[minmax(0,1.9fr)_minmax(0,1fr)] lg:gap-14">
          <div className="min-w-0 space-y-10">
            {job.state === "brief" && brief}
            <RevisionList
              shop={slug}
              jobId={jobId}
              side={side}
              ways={[...(mockup && !leadsToMockup ? [mockup] : []), ...(mockup ? [wayToCutPlan(job, slug)] : [])]}
            />
            {/* A client sees artwork only while the brief is theirs to fill in. */}
            {(staff || job.can.editBrief) && (
              <ArtworkPart
                shop={slug}
                jobId={jobId}
                unit={shop.unit}
                tracing={search.get("trace")}
                mayAdd={staff ? job.can.editMockup : job.can.editBrief}
              />
            )}
            {job.state !== "brief" && brief}
          </div>
          <div className="min-w-0 space-y-8">
            <OpenNotes shop={slug} job={job} />
            {staff && <JobMoves shop={slug} job={job} />}
            {staff && (
              <AnotherLike
                key={jobId}
                shop={slug}
                job={job}
                onOpened={(openedId) => void navigate(paths.job(slug, openedId))}
              />
            )}
            <ConsentPart shop={slug} shopName={shop.name} job={job} side={side} />
            {staff && <JobMailList shop={slug} jobId={jobId} />}
            {staff && <EventLog shop={slug} jobId={jobId} />}
          </div>
        </div>
      </div>
    </Page>
  );
}
