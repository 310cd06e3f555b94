import { ShopForm } from "@/features/shop/components/shop-form.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

export function ShopPage() {
  const shop = useShop();
  if (!shop.can.changeShop) return <NotFoundScreen />;
  return (
    <Page
      title="Shop"
      under={shop.demo ? "This is the demo shop: all of its clients and signs are invented." : undefined}
    >
      <ShopForm shop={shop} />
    </Page>
  );
}
