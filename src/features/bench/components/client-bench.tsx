import { useInfiniteQuery } from "@tanstack/react-query";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { jobsQuery } from "../api/queries.ts";
import { MoveGroup } from "./move-group.tsx";
import { SignCard } from "./sign-card.tsx";

const groups = [
  { whoseMove: "client", title: "Your move" },
  { whoseMove: "ours", title: "The shop's move" },
  { whoseMove: "nobody", title: "Done or resting" },
] as const;

/** A client's own signs: theirs first. */
export function ClientBench({ shop, shopName }: { readonly shop: string; readonly shopName: string }) {
  const first = useInfiniteQuery(jobsQuery(shop, { whoseMove: "client" }));
  const counts = first.data?.pages[0]?.counts;
  if (counts && counts.ours + counts.client + counts.nobody === 0) {
    return (
      <EmptyState title="No signs yet">
        As soon as {shopName} opens a job for you it stands here. If you were told to look at a drawing, open the link
        in that mail.
      </EmptyState>
    );
  }
  return (
    <div className="max-w-3xl space-y-9">
      {groups.map((group) => (
        <MoveGroup key={group.whoseMove} shop={shop} noun="sign" filter={{}} {...group}>
          {(job) => <SignCard key={job.id} job={job} shop={shop} />}
        </MoveGroup>
      ))}
    </div>
  );
}
