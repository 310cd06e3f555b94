import { useState } from "react";
import { useNavigate, useSearchParams } from "react-router-dom";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { AddClientDialog } from "@/features/clients/components/add-client-dialog.tsx";
import { ClientList } from "@/features/clients/components/client-list.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function ClientsPage() {
  const shop = useShop();
  const navigate = useNavigate();
  const [adding, setAdding] = useState(false);
  const [search, setSearch] = useSearchParams();
  const q = search.get("q") ?? "";
  if (!shop.can.seeClients) return <NotFoundScreen />;
  const addButton = (
    <Button kind="primary" onClick={() => setAdding(true)}>
      Add a client
    </Button>
  );
  return (
    <Page title="Clients" actions={addButton}>
      <form
        className="mb-5 flex max-w-md items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          const text = String(new FormData(event.currentTarget).get("q") ?? "").trim();
          setSearch(text === "" ? {} : { q: text });
        }}
      >
        <Field label="Find a client or contact" type="search" name="q" className="flex-1" defaultValue={q} key={q} />
        <Button type="submit">Find</Button>
      </form>
      <ClientList
        shop={shop.slug}
        q={q}
        firstStep={<Button onClick={() => setAdding(true)}>Add the first client</Button>}
      />
      <AddClientDialog
        shop={shop.slug}
        open={adding}
        onOpenChange={setAdding}
        onAdded={(id) => void navigate(paths.client(shop.slug, id))}
      />
    </Page>
  );
}
