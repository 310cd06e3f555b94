import { useQuery } from "@tanstack/react-query";
import type { ReactNode, RefCallback } from "react";
import { NavLink, useNavigate } from "react-router-dom";
import { Button } from "@/components/ui/button.tsx";
import { Menu, MenuItem, MenuLabel, MenuRule } from "@/components/ui/menu.tsx";
import { cx } from "@/lib/cx.ts";
import { meQuery } from "@/lib/me.ts";
import type { Reader } from "@/lib/shop-context.ts";
import { paths } from "./paths.ts";
import { useSignOut } from "./use-sign-out.ts";
import { Wordmark } from "./wordmark.tsx";

type Place = { readonly label: string; readonly to: string };

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
  const navigate = useNavigate();
  const signOut = useSignOut();
  const places = placesOf(reader);
  const me = useQuery(meQuery).data;
  const hasOtherPlaces = me !== undefined && me.memberOf.length + me.contactOf.length > 1;
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
        <Menu
          trigger={
            <Button kind="bare" size="small" className="min-h-11 max-w-[60vw]">
              <span className="hidden truncate lg:inline">{reader.person.name}</span>
              <span className="lg:hidden">Menu</span>
              <svg aria-hidden="true" viewBox="0 0 16 16" className="size-3 shrink-0">
                <path d="M2 5l6 6 6-6" fill="none" stroke="currentColor" strokeWidth="2" />
              </svg>
            </Button>
          }
        >
          <MenuLabel>
            {reader.side === "client"
              ? `${reader.person.name} for ${reader.client}, at ${reader.shop.name}`
              : `${reader.person.name}, ${reader.role} of ${reader.shop.name}`}
          </MenuLabel>
          {places.map(({ label, to }) => (
            <MenuItem key={to} className="lg:hidden" onSelect={() => void navigate(to)}>
              {label}
            </MenuItem>
          ))}
          <MenuRule />
          {reader.side === "shop" && (
            <MenuItem onSelect={() => void navigate(paths.howWeWorkItOut(reader.shop.slug))}>
              How we work it out
            </MenuItem>
          )}
          <MenuItem onSelect={() => void navigate(paths.account())}>Account</MenuItem>
          {hasOtherPlaces && (
            <MenuItem onSelect={() => void navigate(paths.home(), { state: { choose: true } })}>Other places</MenuItem>
          )}
          <MenuItem onSelect={() => signOut.mutate()}>Sign out</MenuItem>
        </Menu>
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
