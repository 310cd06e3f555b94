import { useQuery } from "@tanstack/react-query";
import { paths } from "@/app/paths.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { jobClientQuery } from "../api/queries.ts";

/** Which of the client's contacts may approve this job. */
export function ApproverChoice({
  shop,
  clientId,
  value,
  onChange,
}: {
  readonly shop: string;
  readonly clientId: string;
  readonly value: readonly string[];
  readonly onChange: (contactIds: string[]) => void;
}) {
  const client = useQuery(jobClientQuery(shop, clientId));
  return (
    <fieldset>
      <legend className="text-sm font-semibold">Who approves</legend>
      {client.isPending && <Skeleton label="Loading the contacts" rows={1} />}
      {client.isError && (
        <ProblemNotice
          what="The contacts could not be loaded."
          error={client.error}
          onRetry={() => void client.refetch()}
        />
      )}
      {client.data?.contacts.map((contact) => (
        <Checkbox
          key={contact.id}
          label={contact.name}
          hint={contact.email}
          checked={value.includes(contact.id)}
          onChange={(event) =>
            onChange(
              event.target.checked ? [...value, contact.id] : value.filter((contactId) => contactId !== contact.id),
            )
          }
        />
      ))}
      {client.data && (
        <p className="text-fine text-graphite">
          {client.data.contacts.length === 0 ? "The client has no contact yet. " : "Somebody missing? "}
          <TextLink to={paths.client(shop, clientId)}>Add a contact of {client.data.name}</TextLink>
        </p>
      )}
    </fieldset>
  );
}
