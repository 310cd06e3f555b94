import { zodResolver } from "@hookform/resolvers/zod";
import { Controller, useForm } from "react-hook-form";
import { type Artwork, setTrueSize } from "#shared/contracts/artworks.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useSetTrueSize } from "../api/mutations.ts";

/** One dimension sets the scale; the other follows, so that nothing is stretched. */
export function TrueSizeForm({
  shop,
  jobId,
  unit,
  artwork,
  onDone,
}: {
  readonly shop: string;
  readonly jobId: string;
  readonly unit: LengthUnit;
  readonly artwork: Artwork;
  readonly onDone: () => void;
}) {
  const set = useSetTrueSize(shop, jobId, artwork.id);
  const widthMm = artwork.widthMm ?? 1;
  const heightMm = artwork.heightMm ?? 1;
  const form = useForm({
    resolver: zodResolver(setTrueSize.body),
    defaultValues: { side: "width" as "width" | "height", lengthMm: widthMm },
  });
  const { problem, busy, handleSubmit } = useSend(form, ["side", "lengthMm"], async (values) => {
    await set.mutateAsync(values);
    onDone();
  });
  const [side, lengthMm] = form.watch(["side", "lengthMm"]);
  const factor = lengthMm / (side === "width" ? widthMm : heightMm);
  return (
    <form noValidate onSubmit={handleSubmit} className="mt-3 space-y-3 border-l-2 border-rule pl-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <div className="flex flex-wrap items-start gap-3">
        <Select
          label="Known side"
          className="w-52"
          {...form.register("side", {
            onChange: (event: { target: { value: string } }) =>
              form.setValue("lengthMm", event.target.value === "width" ? widthMm : heightMm),
          })}
        >
          <option value="width">Width of the page</option>
          <option value="height">Height of the page</option>
        </Select>
        <Controller
          control={form.control}
          name="lengthMm"
          render={({ field }) => (
            <LengthField
              label="True length"
              unit={unit}
              value={field.value}
              onChange={(mm) => field.onChange(mm ?? Number.NaN)}
              onBlur={field.onBlur}
              error={form.formState.errors.lengthMm?.message}
            />
          )}
        />
      </div>
      {Number.isFinite(factor) && factor > 0 && (
        <p className="text-sm text-graphite">
          The page becomes {formatSize(widthMm * factor, heightMm * factor, unit)}, with what is empty round the
          drawing. To go by the drawing itself or by one of its pieces, set the size where it is brought into the
          mockup.
        </p>
      )}
      <div className="flex gap-2">
        <Button type="submit" size="small" busy={busy}>
          Set the true size
        </Button>
        <Button size="small" kind="bare" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
