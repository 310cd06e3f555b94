import { useQuery } from "@tanstack/react-query";
import { useParams } from "react-router-dom";
import { isUnready, sheetQueries } from "@/features/sheet/api/queries.ts";
import { SheetSkeleton } from "@/features/sheet/components/sheet-skeleton.tsx";
import { UnreadySheet } from "@/features/sheet/components/unready-sheet.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { useLiveJob } from "@/lib/use-live-job.ts";
import { LoadProblem } from "../load-problem.tsx";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { paths } from "../paths.ts";
import { SheetScreen } from "./sheet-screen.tsx";

/** A revision as a drawing sheet, or what it is doing instead. */
export function SheetPage() {
  const { shop = "", revisionId = "" } = useParams();
  const revision = useQuery(sheetQueries.revision(shop, revisionId));
  const unready = revision.data !== undefined && isUnready(revision.data);
  // Both are asked for at once; only a revision known to be unready has no sheet to ask for.
  const sheet = useQuery({ ...sheetQueries.sheet(shop, revisionId), enabled: !unready });
  usePageTitle(sheet.data ? `${sheet.data.job.title}, revision ${sheet.data.revision.letter}` : "Sheet");

  useLiveJob(shop, revision.data?.jobId ?? null);

  const error = revision.error ?? (unready ? null : sheet.error);
  if (error instanceof ApiProblem && error.code === "not_found") return <NotFoundScreen />;
  if (unready) {
    const { jobId } = revision.data;
    return (
      <UnreadySheet revision={revision.data} jobPath={paths.job(shop, jobId)} mockupPath={paths.mockup(shop, jobId)} />
    );
  }
  if (revision.data && sheet.data) {
    return <SheetScreen key={revisionId} shop={shop} revision={revision.data} sheet={sheet.data} />;
  }
  if (error) {
    return (
      <LoadProblem
        what="The sheet could not be loaded."
        error={error}
        onRetry={() => void Promise.all([revision.refetch(), sheet.refetch()])}
      />
    );
  }
  return <SheetSkeleton />;
}
