import { DropdownMenu } from "radix-ui";
import type { ComponentProps, ReactNode } from "react";
import { cx } from "@/lib/cx.ts";

/** A button that opens a list of things to do or places to go. Arrow keys move, Escape closes. */
export function Menu({
  trigger,
  children,
  align = "end",
  isOpenAtFirst = false,
}: {
  readonly trigger: ReactNode;
  readonly children: ReactNode;
  readonly align?: "start" | "end";
  readonly isOpenAtFirst?: boolean;
}) {
  return (
    <DropdownMenu.Root modal={false} defaultOpen={isOpenAtFirst}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          className="z-40 max-h-(--radix-dropdown-menu-content-available-height) max-w-[calc(100vw-1rem)] min-w-52 overflow-y-auto border border-ink bg-sheet py-1"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

const itemClass =
  "flex min-h-11 cursor-pointer items-center px-4 py-2 text-base text-ink outline-none data-highlighted:bg-linen data-highlighted:underline data-disabled:cursor-not-allowed data-disabled:text-graphite";

export function MenuItem({ className, ...rest }: ComponentProps<typeof DropdownMenu.Item>) {
  return <DropdownMenu.Item {...rest} className={cx(itemClass, className)} />;
}

export function MenuLabel({ children }: { readonly children: ReactNode }) {
  return <DropdownMenu.Label className="px-4 py-2 text-fine text-graphite">{children}</DropdownMenu.Label>;
}

export function MenuRule() {
  return <DropdownMenu.Separator className="my-1 h-px bg-rule" />;
}
