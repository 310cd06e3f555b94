import { lazy, Suspense, useState } from "react";
import { MenuButton } from "./menu-button.tsx";
import type { OpenedMenuProps } from "./opened-menu.tsx";

// Few open it on a sheet: the list, and all that keeps it in the window, is fetched when someone does.
const OpenedMenu = lazy(() => import("./opened-menu.tsx").then((module) => ({ default: module.OpenedMenu })));

/** The reader's name with what is behind it: places of the shop on a phone, account, sign out. */
export function HeaderMenu(props: OpenedMenuProps) {
  const [isWanted, setWanted] = useState(false);
  const button = (
    <MenuButton
      name={props.reader.person.name}
      aria-haspopup="menu"
      aria-expanded={false}
      aria-busy={isWanted || undefined}
      onClick={() => setWanted(true)}
    />
  );
  return isWanted ? (
    <Suspense fallback={button}>
      <OpenedMenu {...props} />
    </Suspense>
  ) : (
    button
  );
}
