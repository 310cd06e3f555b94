import { useQuery } from "@tanstack/react-query";
import { useParams } from "react-router-dom";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { clientQuery } from "@/features/clients/api/queries.ts";
import { ClientForm } from "@/features/clients/components/client-form.tsx";
import { ClientJobs } from "@/features/clients/components/client-jobs.tsx";
import { ContactList } from "@/features/clients/components/contact-list.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { LoadProblem } from "../load-problem.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function ClientPage() {
  const shop = useShop();
  const { clientId = "" } = useParams();
  const client = useQuery(clientQuery(shop.slug, clientId));
  if (client.isPending) {
    return (
      <Page title="Client">
        <Skeleton label="Loading the client" />
      </Page>
    );
  }
  if (client.isError) {
    return (
      <LoadProblem what="The client could not be loaded." error={client.error} onRetry={() => void client.refetch()} />
    );
  }
  return (
    <Page title={client.data.name} under={<TextLink to={paths.clients(shop.slug)}>All clients</TextLink>}>
      <div className="grid gap-10 lg:grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)] lg:gap-14">
        <div className="space-y-10">
          <ContactList shop={shop.slug} client={client.data} />
          <ClientJobs shop={shop.slug} clientId={clientId} />
        </div>
        <section aria-labelledby="client-details">
          <h2 id="client-details" className="mb-3 font-serif text-lg font-bold">
            Details
          </h2>
          <ClientForm shop={shop.slug} client={client.data} />
        </section>
      </div>
    </Page>
  );
}
