import { useQuery } from "@tanstack/react-query";
import { useParams, useSearchParams } from "react-router-dom";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { compareQueries } from "@/features/compare/api/queries.ts";
import { ComparedPair } from "@/features/compare/components/compared-pair.tsx";
import { LetterChoice } from "@/features/compare/components/letter-choice.tsx";
import { jobQuery } from "@/features/jobs/api/queries.ts";
import { ApiProblem } from "@/lib/api-client.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { useReader } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { paths } from "../paths.ts";

/** Two letters of a job side by side. Without letters in the address it takes the two newest. */
export function ComparePage() {
  const { shop = "", jobId = "" } = useParams();
  const [search, setSearch] = useSearchParams();
  const { side } = useReader();
  const job = useQuery(jobQuery(shop, jobId));
  const revisions = useQuery(compareQueries.revisions(shop, jobId));
  // A draft and one being prepared have no drawing that could be looked at.
  const shown = (revisions.data ?? []).filter(({ state }) => state !== "draft" && state !== "preparing");
  const after = search.get("after") ?? shown[0]?.id ?? "";
  const before = search.get("before") ?? shown.find(({ id }) => id !== after)?.id ?? "";
  const pair = useQuery({
    ...compareQueries.pair(shop, jobId, before, after),
    enabled: before !== "" && after !== "" && before !== after,
  });
  usePageTitle(
    pair.data ? `${pair.data.before.revision.letter} and ${pair.data.after.revision.letter} compared` : "Compare",
  );

  const error = revisions.error ?? pair.error;
  if (error instanceof ApiProblem && error.code === "not_found") return <NotFoundScreen />;
  const choose = (next: { before: string; after: string }) => setSearch(next, { replace: true });

  return (
    <div className="lg:px-6">
      <div className="flex flex-wrap items-end gap-x-6 gap-y-3 px-4 pt-4 pb-3 lg:px-0">
        <div className="mr-auto">
          <h1 className="font-serif text-xl font-bold">Compare</h1>
          <p className="text-sm text-graphite">
            {job.data && <b className="font-semibold text-ink">{job.data.title}: </b>}
            two revisions at one scale, and what changed. <TextLink to={paths.job(shop, jobId)}>To the job</TextLink>
          </p>
        </div>
        {revisions.data && shown.length > 1 && (
          <div className="flex w-full gap-3 lg:w-[34rem]">
            <LetterChoice
              label="Before"
              side={side}
              revisions={shown}
              chosen={before}
              onChoose={(id) => choose({ before: id, after: id === after ? before : after })}
            />
            <LetterChoice
              label="After"
              side={side}
              revisions={shown}
              chosen={after}
              onChoose={(id) => choose({ before: id === before ? after : before, after: id })}
            />
          </div>
        )}
      </div>
      {error ? (
        <div className="px-4 lg:px-0">
          <ProblemNotice
            what="The two revisions could not be compared."
            error={error}
            onRetry={() => void Promise.all([revisions.refetch(), pair.refetch()])}
          />
        </div>
      ) : pair.data ? (
        <ComparedPair
          key={`${before} ${after}`}
          pair={pair.data}
          side={side}
          pathOfSheet={(revisionId) => paths.sheet(shop, revisionId)}
        />
      ) : revisions.data && (before === "" || before === after) ? (
        <div className="px-4 lg:px-0">
          <EmptyState title="There is one revision only so far">
            When the next revision is issued, the two can be laid side by side here.
          </EmptyState>
        </div>
      ) : (
        <div className="px-4 lg:px-0">
          <Skeleton label="Loading the two revisions" rows={1} rowClassName="h-[60dvh]" />
        </div>
      )}
    </div>
  );
}
