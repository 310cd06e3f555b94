import { useQuery } from "@tanstack/react-query";
import { useParams } from "react-router-dom";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { shareQueries } from "@/features/share/api/queries.ts";
import { ClosedBook } from "@/features/share/components/closed-book.tsx";
import { PlateBook } from "@/features/share/components/plate-book.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { usePageTitle } from "@/lib/page-title.ts";

const closedCodes = new Set(["link_expired", "link_spent", "not_found", "validation_failed"]);

/** What a guest sees of a shop's work. */
export function SharePage() {
  const { token = "" } = useParams();
  const book = useQuery(shareQueries.book(token));
  usePageTitle(book.data?.shopName ?? "A book of signs");

  if (book.data) return <PlateBook book={book.data} />;
  const { error } = book;
  if (error instanceof ApiProblem && closedCodes.has(error.code)) {
    return <ClosedBook wasOpen={error.code === "link_expired" || error.code === "link_spent"} />;
  }
  return (
    <main className="mx-auto w-full max-w-5xl px-4 py-16 sm:px-8">
      {error ? (
        <ProblemNotice what="The plates could not be loaded." error={error} onRetry={() => void book.refetch()} />
      ) : (
        <Skeleton label="Loading the plates" rows={1} rowClassName="h-[60dvh]" />
      )}
    </main>
  );
}
