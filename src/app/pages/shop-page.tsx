import { LinkButton } from "@/components/ui/link-button.tsx";
import { ShopForm } from "@/features/shop/components/shop-form.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function ShopPage() {
  const shop = useShop();
  if (!shop.can.changeShop) return <NotFoundScreen />;
  return (
    <Page
      title="Shop"
      under={shop.demo ? "This is the demo shop: all of its clients and signs are invented." : undefined}
    >
      <ShopForm shop={shop} />
      <section aria-labelledby="limits" className="mt-12 max-w-md border-t border-rule pt-6">
        <h2 id="limits" className="font-serif text-lg font-bold text-ink">
          Limits of the dry fit
        </h2>
        <p className="mt-1 mb-4 text-base text-graphite">
          From how much overhang it warns, how thin a stroke may be, how large the bed is: what the checks of every
          mockup keep to.
        </p>
        <LinkButton to={paths.limits(shop.slug)}>Look at the limits</LinkButton>
      </section>
    </Page>
  );
}
