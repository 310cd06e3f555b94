import { type ReactNode, useId } from "react";
import { cx } from "@/lib/cx.ts";
import { useSessionDraft } from "@/lib/session-draft.ts";

type FoldProps = {
  /** What it is kept open under while this tab lives. */
  readonly name: string;
  readonly summary: string;
  readonly className?: string;
  readonly children: ReactNode;
};

const isOpenDraft = (stored: unknown): true | null => (stored === true ? true : null);

/** What can wait, behind its count. Whether it is open is remembered in this tab. */
export function Fold({ name, summary, className, children }: FoldProps) {
  const [open, setOpen] = useSessionDraft(`standproud:fold:${name}`, isOpenDraft);
  const id = useId();
  return (
    <div className={className}>
      <button
        type="button"
        aria-expanded={open === true}
        aria-controls={id}
        onClick={() => setOpen(open ? null : true)}
        className="flex min-h-9 w-full cursor-pointer items-center gap-2 rounded text-left text-sm font-semibold text-graphite underline decoration-dotted underline-offset-4 hover:bg-linen hover:text-ink"
      >
        <svg aria-hidden="true" viewBox="0 0 16 16" className={cx("size-3 shrink-0", open && "rotate-90")}>
          <path d="M5 2l6 6-6 6" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
        {summary}
      </button>
      <div id={id} hidden={!open}>
        {children}
      </div>
    </div>
  );
}
