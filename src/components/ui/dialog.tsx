import { Dialog as Primitive } from "radix-ui";
import type { ReactNode } from "react";
import { cx } from "@/lib/cx.ts";
import { useReturnFocus } from "./use-return-focus.ts";

type DialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  readonly description?: ReactNode;
  /** Wide for a form beside a drawing; desk for a table beside one. */
  readonly size?: "normal" | "wide" | "desk";
  /** Its changes are the page's own, and so are the keys that undo them. */
  readonly undoes?: boolean;
  readonly children?: ReactNode;
};

/** A sheet laid over the page. Traps the focus and gives it back; Escape and the ground behind it close it. */
export function Dialog({
  open,
  onOpenChange,
  title,
  description,
  size = "normal",
  undoes = false,
  children,
}: DialogProps) {
  const focus = useReturnFocus();
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-ink/40" />
        <Primitive.Content
          {...focus}
          {...(description ? {} : { "aria-describedby": undefined })}
          data-undoes={undoes || undefined}
          className={cx(
            "fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] -translate-x-1/2 -translate-y-1/2 overflow-y-auto border border-ink bg-sheet p-5 sm:p-6",
            { normal: "max-w-xl", wide: "max-w-4xl", desk: "max-w-[100rem]" }[size],
          )}
        >
          <div className="flex items-start justify-between gap-4">
            <Primitive.Title className="font-serif text-xl font-bold text-ink">{title}</Primitive.Title>
            <Primitive.Close
              aria-label="Close"
              className="-m-1 inline-flex size-11 shrink-0 cursor-pointer items-center justify-center rounded border border-transparent text-ink hover:border-ink hover:bg-linen"
            >
              <svg aria-hidden="true" viewBox="0 0 16 16" className="size-4">
                <path d="M2 2l12 12M14 2L2 14" stroke="currentColor" strokeWidth="1.5" fill="none" />
              </svg>
            </Primitive.Close>
          </div>
          {description && (
            <Primitive.Description asChild>
              <div className="mt-2 text-base text-graphite">{description}</div>
            </Primitive.Description>
          )}
          {children && <div className="mt-4">{children}</div>}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
