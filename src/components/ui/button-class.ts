import { cx } from "@/lib/cx.ts";

/** `primary` is the one main action of a screen, `approve` belongs to the title block, `bare` is an underlined word. */
export type ButtonKind = "primary" | "approve" | "outline" | "danger" | "bare";
export type ButtonSize = "normal" | "small";

const kinds: Record<ButtonKind, string> = {
  primary: "border-madder bg-madder text-sheet hover:bg-oxblood hover:border-oxblood",
  approve: "border-verdigris bg-verdigris text-sheet hover:bg-ink hover:border-ink",
  outline: "border-ink bg-sheet text-ink hover:bg-linen",
  danger: "border-oxblood bg-sheet text-oxblood hover:bg-oxblood hover:text-sheet",
  bare: "border-transparent bg-transparent text-indigo underline underline-offset-4 hover:bg-linen",
};

const sizes: Record<ButtonSize, string> = {
  normal: "min-h-11 px-4 py-2 text-base",
  small: "min-h-9 px-3 py-1 text-sm pointer-coarse:min-h-11",
};

export const buttonClass = (kind: ButtonKind, size: ButtonSize): string =>
  cx(
    "inline-flex cursor-pointer items-center justify-center gap-2 rounded border text-center font-sans font-semibold",
    "disabled:cursor-not-allowed disabled:border-rule disabled:bg-linen disabled:text-graphite disabled:no-underline",
    "aria-disabled:cursor-progress",
    kinds[kind],
    sizes[size],
    kind === "bare" && "-mx-1 px-1",
  );
