import type { ComponentProps } from "react";
import { Button } from "@/components/ui/button.tsx";

/** What the menu of the header hangs on. */
export function MenuButton({ name, ...rest }: ComponentProps<typeof Button> & { readonly name: string }) {
  return (
    <Button {...rest} kind="bare" size="small" className="min-h-11 max-w-[60vw]">
      <span className="hidden truncate lg:inline">{name}</span>
      <span className="lg:hidden">Menu</span>
      <svg aria-hidden="true" viewBox="0 0 16 16" className="size-3 shrink-0">
        <path d="M2 5l6 6 6-6" fill="none" stroke="currentColor" strokeWidth="2" />
      </svg>
    </Button>
  );
}
