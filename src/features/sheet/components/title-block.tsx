import type { ReactNode } from "react";
import type { Revision, SheetView } from "#shared/contracts/revisions.ts";
import { formatSize } from "#shared/units/format-length.ts";
import { cx } from "@/lib/cx.ts";
import { formatDay } from "@/lib/format.ts";
import { standingOf } from "../model/standing.ts";
import { StandingWords } from "./standing-words.tsx";

type TitleBlockProps = {
  readonly sheet: Pick<SheetView, "job" | "reader" | "board">;
  readonly revision: Revision;
  /** Notes that wait on the shop. */
  readonly toAnswer: number;
};

/** The drawing's title block, with the fields of ISO 7200. */
export function TitleBlock({ sheet, revision, toAnswer }: TitleBlockProps) {
  const { job, board, reader } = sheet;
  const decision = revision.decision;
  return (
    <dl aria-label="Title block" className="grid grid-cols-6 border-ink text-sm">
      <Cell name="Title" wide={4} className="font-serif font-bold">
        {job.title}
      </Cell>
      <Cell name="Revision" className="font-serif text-base font-bold">
        {revision.letter}
      </Cell>
      <Cell name="Number" className="font-serif font-bold tabular-nums">
        {job.number}
      </Cell>
      <Cell name="Date of issue" className="tabular-nums">
        {revision.issuedAt === null ? "not issued" : formatDay(revision.issuedAt)}
      </Cell>
      <Cell name="Size" className="tabular-nums">
        {formatSize(board.widthMm, board.heightMm, job.unit)}
      </Cell>
      <Cell name="Created by" wide={3}>
        {revision.issuedBy}, {job.shopName}
      </Cell>
      <Cell name="Approved by" wide={3}>
        <StandingWords standing={standingOf(revision, reader, toAnswer)} />
        {revision.state === "approved" && decision && <span className="block">{formatDay(decision.at)}</span>}
      </Cell>
    </dl>
  );
}

type CellProps = {
  readonly name: string;
  readonly wide?: 2 | 3 | 4;
  readonly className?: string;
  readonly children: ReactNode;
};

const spans = { 2: "col-span-2", 3: "col-span-3", 4: "col-span-4" } as const;

function Cell({ name, wide = 2, className, children }: CellProps) {
  return (
    <div className={cx("min-w-0 border-t border-l border-ink px-2.5 py-1.5", spans[wide])}>
      <dt className="text-fine text-graphite">{name}</dt>
      <dd className={cx("break-words", className)}>{children}</dd>
    </div>
  );
}
