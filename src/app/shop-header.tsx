import type { ReactNode, RefCallback } from "react";
import { NavLink } from "react-router-dom";
import { cx } from "@/lib/cx.ts";
import type { Reader } from "@/lib/shop-context.ts";
import { HeaderMenu } from "./header-menu.tsx";
import { paths } from "./paths.ts";
import { Wordmark } from "./wordmark.tsx";

export type Place = { readonly label: string; readonly to: string };

/** Where this reader may go in the shop, in the order of a day's work. */
export function placesOf({ shop, side }: Pick<Reader, "shop" | "side">): readonly Place[] {
  if (side === "client") return [{ label: "Your signs", to: paths.bench(shop.slug) }];
  const { can, slug } = shop;
  return [
    { label: "Bench", to: paths.bench(slug), shown: true },
    { label: "Clients", to: paths.clients(slug), shown: can.seeClients },
    { label: "Stock", to: paths.stock(slug), shown: can.seeStock },
    { label: "Prices", to: paths.prices(slug), shown: can.seePrices },
    { label: "Portfolio", to: paths.portfolio(slug), shown: can.seePortfolio },
    { label: "Team", to: paths.team(slug), shown: can.manageTeam },
    { label: "Shop", to: paths.shop(slug), shown: can.changeShop },
    { label: "Outgoing mail", to: paths.outgoingMail(slug), shown: can.seeOutgoingMail },
  ].filter(({ shown }) => shown);
}

const linkClass = ({ isActive }: { isActive: boolean }) =>
  cx(
    "inline-flex min-h-11 items-center border-b-2 px-0.5 font-sans text-sm hover:border-graphite",
    isActive ? "border-madder font-semibold text-ink" : "border-transparent text-graphite",
  );

export function ShopHeader({
  reader,
  slotRef,
}: {
  readonly reader: Reader;
  readonly slotRef: RefCallback<HTMLElement>;
}) {
  const places = placesOf(reader);
  return (
    <header className="flex flex-wrap items-center gap-x-6 border-b border-rule px-4 py-1 sm:px-6 print:hidden">
      <Wordmark />
      <nav aria-label="Shop" className="hidden gap-5 lg:flex">
        {places.map(({ label, to }) => (
          <NavLink key={to} to={to} className={linkClass}>
            {label}
          </NavLink>
        ))}
      </nav>
      <div className="ml-auto flex items-center lg:order-last lg:ml-0">
        <HeaderMenu reader={reader} places={places} />
      </div>
      <div
        ref={slotRef}
        className="flex w-full flex-wrap items-center gap-3 pb-2 empty:hidden lg:ml-auto lg:w-auto lg:pb-0 lg:empty:flex"
      />
    </header>
  );
}

/** The header while nobody knows yet whose shop this is. */
export function PlainHeader({ children }: { readonly children: ReactNode }) {
  return (
    <>
      <header className="border-b border-rule px-4 py-1 sm:px-6">
        <Wordmark />
      </header>
      <main className="mx-auto w-full max-w-6xl px-4 py-8 sm:px-6">{children}</main>
    </>
  );
}
