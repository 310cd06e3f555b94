import { useInfiniteQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { paths } from "@/app/paths.ts";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { counted } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { clientsQuery } from "../api/queries.ts";

/** Clients by name, with who speaks for each. */
export function ClientList({
  shop,
  q,
  firstStep,
}: {
  readonly shop: string;
  readonly q: string;
  readonly firstStep: ReactNode;
}) {
  const clients = useInfiniteQuery(clientsQuery(shop, q));
  if (clients.isPending) return <Skeleton label="Loading the clients" rowClassName="h-16" />;
  if (clients.isError) {
    return (
      <ProblemNotice
        what="The clients could not be loaded."
        error={clients.error}
        onRetry={() => void clients.refetch()}
      />
    );
  }
  const rows = itemsOf(clients.data);
  if (rows.length === 0) {
    return q === "" ? (
      <EmptyState title="No clients yet" action={firstStep}>
        Add the company you make signs for, then its contacts: they get the proofs and approve them.
      </EmptyState>
    ) : (
      <EmptyState title={`No client matches “${q}”`}>Try a part of the name or of a contact's address.</EmptyState>
    );
  }
  return (
    <>
      <ul className="border-t border-rule">
        {rows.map((client) => (
          <li
            key={client.id}
            className="relative grid gap-x-6 gap-y-1 border-b border-rule py-4 hover:bg-linen sm:grid-cols-[minmax(0,1.2fr)_minmax(0,1.5fr)_7rem] sm:px-1"
          >
            <TextLink to={paths.client(shop, client.id)} className="font-semibold after:absolute after:inset-0">
              {client.name}
            </TextLink>
            <span className="text-base text-graphite sm:text-sm">
              {client.contacts.length === 0
                ? "no contact yet: add one"
                : client.contacts.map((contact) => contact.name).join(", ")}
            </span>
            <span className="text-sm text-graphite">{counted(client.openJobs, "open job")}</span>
          </li>
        ))}
      </ul>
      <ShowMore query={clients} what="clients" />
    </>
  );
}
