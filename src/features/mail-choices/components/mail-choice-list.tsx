import { useQuery } from "@tanstack/react-query";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useChangeMailChoices } from "../api/mutations.ts";
import { mailChoicesQuery } from "../api/queries.ts";

/** Which mails one gets from each shop. What is needed comes in any case and can't be chosen. */
export function MailChoiceList() {
  const choices = useQuery(mailChoicesQuery);
  const change = useChangeMailChoices();
  if (choices.isPending) return <Skeleton label="Loading which mails you get" rows={2} />;
  if (choices.isError) {
    return (
      <ProblemNotice
        what="Which mails you get could not be loaded."
        error={choices.error}
        onRetry={() => void choices.refetch()}
      />
    );
  }
  const { items } = choices.data;
  return (
    <>
      {change.isError && (
        <Notice tone="error" className="mb-3">
          {messageOf(change.error)}
        </Notice>
      )}
      <p className="mb-4 text-base text-graphite">
        {items.length === 0
          ? "No shop writes to you yet."
          : "Proofs, decisions and links come in any case: without them nobody could go on."}
      </p>
      {items.map(({ shop, shopName, notes, reminders }) => (
        <fieldset key={shop} className="mb-4" disabled={change.isPending && change.variables.shop === shop}>
          <legend className="mb-1 text-base font-semibold">From {shopName}</legend>
          <Checkbox
            label="What was said about notes"
            hint="One mail for all of it, at most every ten minutes a job."
            checked={notes}
            onChange={(event) => change.mutate({ shop, notes: event.target.checked })}
          />
          <Checkbox
            label="Reminders that a yes is needed"
            hint="Two days before the day, and the day after it."
            checked={reminders}
            onChange={(event) => change.mutate({ shop, reminders: event.target.checked })}
          />
        </fieldset>
      ))}
    </>
  );
}
