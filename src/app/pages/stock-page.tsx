import { StockList } from "@/features/stock/components/stock-list.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

const kinds = [
  { kind: "acrylic", title: "Acrylic sheet" },
  { kind: "wood", title: "Wood" },
  { kind: "hardware", title: "Standoffs" },
  { kind: "adhesive", title: "Adhesives" },
] as const;

export function StockPage() {
  const { slug, unit, can } = useShop();
  if (!can.seeStock) return <NotFoundScreen />;
  return (
    <Page title="Stock" under="What mockups may be made of. Colours on a screen are near the sheet's, never the same.">
      <div className="space-y-10">
        {kinds.map(({ kind, title }) => (
          <StockList key={kind} shop={slug} kind={kind} title={title} unit={unit} />
        ))}
      </div>
    </Page>
  );
}
