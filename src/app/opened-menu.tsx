import { useQuery } from "@tanstack/react-query";
import { useNavigate } from "react-router-dom";
import { Menu, MenuItem, MenuLabel, MenuRule } from "@/components/ui/menu.tsx";
import { meQuery } from "@/lib/me.ts";
import type { Reader } from "@/lib/shop-context.ts";
import { MenuButton } from "./menu-button.tsx";
import { paths } from "./paths.ts";
import type { Place } from "./shop-header.tsx";
import { useSignOut } from "./use-sign-out.ts";

export type OpenedMenuProps = { readonly reader: Reader; readonly places: readonly Place[] };

/** The menu of the header, open when it comes: it is fetched when it is asked for. */
export function OpenedMenu({ reader, places }: OpenedMenuProps) {
  const navigate = useNavigate();
  const signOut = useSignOut();
  const me = useQuery(meQuery).data;
  const hasOtherPlaces = me !== undefined && me.memberOf.length + me.contactOf.length > 1;
  return (
    <Menu isOpenAtFirst trigger={<MenuButton name={reader.person.name} />}>
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
        <MenuItem onSelect={() => void navigate(paths.howWeWorkItOut(reader.shop.slug))}>How we work it out</MenuItem>
      )}
      <MenuItem onSelect={() => void navigate(paths.account())}>Account</MenuItem>
      {hasOtherPlaces && (
        <MenuItem onSelect={() => void navigate(paths.home(), { state: { choose: true } })}>Other places</MenuItem>
      )}
      <MenuItem onSelect={() => signOut.mutate()}>Sign out</MenuItem>
    </Menu>
  );
}
