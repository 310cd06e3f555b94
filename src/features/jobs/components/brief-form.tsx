import { Controller } from "react-hook-form";
import type { Job } from "#shared/contracts/jobs.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { DistanceField } from "@/components/ui/distance-field.tsx";
import { Field } from "@/components/ui/field.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { UnsavedGuard } from "@/components/ui/unsaved-guard.tsx";
import { ApproverChoice } from "./approver-choice.tsx";
import { dayHint } from "./day-hint.ts";
import { useBriefForm } from "./use-brief-form.ts";

const emptyAsNull = { setValueAs: (text: string | null) => (text === "" ? null : text) };

/** What the sign is to be. Staff fill it in; a client fills in what was sent to them, without title, day and approvers. */
export function BriefForm({
  shop,
  unit,
  job,
  side,
}: {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly job: Job;
  readonly side: "shop" | "client";
}) {
  const { form, problem, busy, saved, handleSubmit } = useBriefForm(shop, job);
  const { register, control } = form;
  const { errors, isDirty } = form.formState;
  const inBrief = errors.brief;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      <UnsavedGuard when={isDirty && !busy} what="The brief" />
      {problem && <Notice tone="error">{problem}</Notice>}
      {side === "shop" && (
        <div className="grid gap-4 sm:grid-cols-[minmax(0,1fr)_12rem]">
          <Field label="What the sign is" error={errors.title?.message} {...register("title")} />
          <Field
            label="Due on"
            type="date"
            hint={dayHint(form.watch("dueOn"))}
            error={errors.dueOn?.message}
            {...register("dueOn", emptyAsNull)}
          />
        </div>
      )}
      <TextArea
        label="The words exactly as they shall read"
        hint="One line here for each line of the sign, with every comma and capital. The client reads them back when approving."
        error={inBrief?.words?.message}
        {...register("brief.words")}
      />
      <div className="grid gap-4 sm:grid-cols-3">
        <Controller
          control={control}
          name="brief.widthMm"
          render={({ field }) => (
            <LengthField
              label="Width"
              unit={unit}
              value={field.value ?? null}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={inBrief?.widthMm?.message}
            />
          )}
        />
        <Controller
          control={control}
          name="brief.heightMm"
          render={({ field }) => (
            <LengthField
              label="Height"
              unit={unit}
              value={field.value ?? null}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={inBrief?.heightMm?.message}
            />
          )}
        />
        <Field
          label="How many"
          type="number"
          min={1}
          max={1000}
          error={inBrief?.quantity?.message}
          {...register("brief.quantity", { valueAsNumber: true })}
        />
        <Select label="Place" error={inBrief?.place?.message} {...register("brief.place", emptyAsNull)}>
          <option value="">Not said yet</option>
          <option value="inside">Inside</option>
          <option value="outside">Outside</option>
        </Select>
        <Controller
          control={control}
          name="brief.viewingDistanceMm"
          render={({ field }) => (
            <DistanceField
              label="Read from how far"
              unit={unit}
              value={field.value ?? null}
              onChange={field.onChange}
              error={inBrief?.viewingDistanceMm?.message}
            />
          )}
        />
      </div>
      <fieldset>
        <legend className="text-sm font-semibold">What asks for more care</legend>
        <Checkbox
          label="People walk past it within reach"
          hint="How far it stands off the wall is then checked."
          {...register("brief.walkway")}
        />
        <Checkbox label="It hangs over where people stand or walk" {...register("brief.overhead")} />
        <Checkbox label="It has lights or other electrical parts" {...register("brief.electrical")} />
      </fieldset>
      <div className="grid gap-4 sm:grid-cols-2">
        <TextArea
          label="The wall"
          hint="What it is made of, and what is beside the sign."
          rows={2}
          error={inBrief?.wall?.message}
          {...register("brief.wall")}
        />
        <TextArea
          label="Lighting"
          hint="Daylight, spots, none at night."
          rows={2}
          error={inBrief?.lighting?.message}
          {...register("brief.lighting")}
        />
        <TextArea
          label="Brand colours"
          rows={2}
          error={inBrief?.brandColours?.message}
          {...register("brief.brandColours")}
        />
        <TextArea
          label="What the client is about"
          rows={2}
          error={inBrief?.about?.message}
          {...register("brief.about")}
        />
      </div>
      {side === "shop" && (
        <Controller
          control={control}
          name="approverIds"
          render={({ field }) => (
            <ApproverChoice shop={shop} clientId={job.client.id} value={field.value ?? []} onChange={field.onChange} />
          )}
        />
      )}
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" busy={busy} disabled={!isDirty && !busy}>
          Save the brief
        </Button>
        <p role="status" className="text-sm text-graphite">
          {saved ? "Saved." : isDirty ? "Not saved yet." : ""}
        </p>
      </div>
    </form>
  );
}
