import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { Artwork } from "#shared/contracts/artworks.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { mockupQueries } from "../api/queries.ts";
import { useDesk } from "../editor/desk-context.ts";
import { ColourChoices } from "./colour-choices.tsx";

type BringInDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly shop: string;
  readonly jobId: string;
  /** The job's page, where artwork is added. */
  readonly jobPath: string;
};

/** The job's artwork, to bring in as a layer of each colour that is chosen. */
export function BringInDialog({ open, onOpenChange, ...job }: BringInDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Bring in artwork"
      description="Each colour becomes a layer. The nearest stock is proposed; choose another where you want one."
    >
      <ArtworkChoice {...job} onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function ArtworkChoice({
  shop,
  jobId,
  jobPath,
  onDone,
}: Omit<BringInDialogProps, "open" | "onOpenChange"> & { onDone: () => void }) {
  const artworks = useQuery(mockupQueries.artworks(shop, jobId));
  const { stock, unit } = useDesk();
  const [chosen, setChosen] = useState<string | null>(null);

  if (artworks.isPending) return <Skeleton label="Loading the artwork" />;
  if (artworks.isError)
    return (
      <ProblemNotice
        what="The artwork could not be loaded."
        error={artworks.error}
        onRetry={() => void artworks.refetch()}
      />
    );
  const ready = artworks.data.filter(({ state }) => state === "ready");
  const artwork = ready.find(({ id }) => id === chosen) ?? ready[0];
  if (artwork === undefined)
    return (
      <p className="text-base text-ink">
        {artworks.data.some(({ state }) => state === "importing")
          ? "The artwork of this job is still being turned into pieces. Close this and try again in a moment."
          : "This job has no artwork that can be used yet. "}
        <TextLink to={jobPath}>Add a file on the job’s page.</TextLink>
      </p>
    );
  if (stock.acrylics.length === 0)
    return (
      <Notice tone="caution">
        The stock list has no acrylic. A layer needs a sheet to be cut from: ask for one to be added.
      </Notice>
    );
  return (
    <div className="space-y-4">
      {ready.length > 1 && (
        <Select label="Artwork" value={artwork.id} onChange={(event) => setChosen(event.target.value)}>
          {ready.map((one) => (
            <option key={one.id} value={one.id}>
              {nameOf(one, unit)}
            </option>
          ))}
        </Select>
      )}
      {ready.length === 1 && <p className="text-base font-semibold">{nameOf(artwork, unit)}</p>}
      <ColourChoices key={artwork.id} shop={shop} artwork={artwork} onDone={onDone} />
    </div>
  );
}

function nameOf({ name, widthMm, heightMm }: Artwork, unit: LengthUnit): string {
  if (widthMm === null || heightMm === null) return name;
  return `${name}, ${formatSize(widthMm, heightMm, unit)}`;
}
