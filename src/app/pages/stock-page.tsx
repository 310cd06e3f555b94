import { useSearchParams } from "react-router-dom";
import { stockKind } from "#shared/contracts/stock-entry.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { kindWords, stockKinds } from "@/features/stock/components/kind-words.ts";
import { StockDesk } from "@/features/stock/components/stock-desk.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

/** What the shop makes signs of: all of it, a kind, or what a name has in it; the address keeps which. */
export function StockPage() {
  const { slug, unit, can } = useShop();
  const [search, setSearch] = useSearchParams();
  const q = search.get("q") ?? "";
  const only = stockKind.safeParse(search.get("kind"));
  if (!can.seeStock) return <NotFoundScreen />;
  const show = (next: { q: string; kind: string }) =>
    setSearch({ ...(next.q ? { q: next.q } : {}), ...(next.kind ? { kind: next.kind } : {}) });
  const kind = only.success ? only.data : "";
  return (
    <Page
      title="Stock"
      under={
        can.changeStock
          ? "What mockups may be made of. Colours on a screen are near the sheet's, never the same."
          : "What mockups may be made of. You may look; owners and makers keep it."
      }
    >
      <form
        className="mb-8 flex max-w-2xl flex-wrap items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          show({ q: String(new FormData(event.currentTarget).get("q") ?? "").trim(), kind });
        }}
      >
        <Field label="Find by name" type="search" name="q" className="min-w-48 flex-1" defaultValue={q} key={q} />
        <Button type="submit">Find</Button>
        <Select label="Show" className="w-44" value={kind} onChange={(event) => show({ q, kind: event.target.value })}>
          <option value="">Everything</option>
          {stockKinds.map((one) => (
            <option key={one} value={one}>
              {kindWords[one].title}
            </option>
          ))}
        </Select>
      </form>
      <StockDesk
        shop={slug}
        unit={unit}
        kinds={only.success ? [only.data] : stockKinds}
        q={q}
        mayChange={can.changeStock}
      />
    </Page>
  );
}
