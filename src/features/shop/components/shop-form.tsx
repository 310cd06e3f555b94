import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { changeShop, type Shop } from "#shared/contracts/shop.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useChangeShop } from "../api/mutations.ts";

const fields = ["name", "unit", "jobPrefix", "paper", "buildDays", "freightDays", "timeZone"] as const;

/** Every zone that the browser knows, and the one the shop has. */
const zonesWith = (own: string): string[] =>
  [...new Set(["UTC", own, ...Intl.supportedValuesOf("timeZone")])].sort((a, b) => a.localeCompare(b));

/** What stands on every sheet of the shop, and how it counts and measures. */
export function ShopForm({ shop }: { readonly shop: Shop }) {
  const change = useChangeShop(shop.slug);
  const form = useForm({
    resolver: zodResolver(changeShop.body),
    values: {
      name: shop.name,
      unit: shop.unit,
      jobPrefix: shop.jobPrefix,
      paper: shop.paper,
      buildDays: shop.buildDays,
      freightDays: shop.freightDays,
      timeZone: shop.timeZone,
    },
  });
  const { problem, busy, handleSubmit } = useSend(form, fields, (values) => change.mutateAsync(values));
  const { errors, isDirty } = form.formState;
  const prefix = form.watch("jobPrefix") || shop.jobPrefix;
  return (
    <form noValidate onSubmit={handleSubmit} className="max-w-md space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {change.isSuccess && !isDirty && <Notice tone="done">Saved. Sheets already issued stay as they are.</Notice>}
      <Field
        label="Name of the shop"
        hint="Stands in the title block as the owner of the drawing."
        error={errors.name?.message}
        {...form.register("name")}
      />
      <Select
        label="Lengths in"
        hint="For reading and typing. Nothing is rounded: lengths are kept in millimetres."
        error={errors.unit?.message}
        {...form.register("unit")}
      >
        <option value="mm">Millimetres</option>
        <option value="in">Inches, as fractions to 1/16</option>
      </Select>
      <Field
        label="Letters before job numbers"
        hint={`As ${prefix}-0142. Numbers already given stay.`}
        maxLength={4}
        autoCapitalize="characters"
        error={errors.jobPrefix?.message}
        {...form.register("jobPrefix", { setValueAs: (text: string) => text.trim().toUpperCase() })}
      />
      <Select label="Paper for proofs" error={errors.paper?.message} {...form.register("paper")}>
        {changeShop.body.shape.paper.unwrap().options.map((size) => (
          <option key={size} value={size}>
            {size}
          </option>
        ))}
      </Select>
      <Field
        label="Working days from the yes to a finished sign"
        hint="Without what dries: that is counted from its finish and bonds."
        inputMode="numeric"
        error={errors.buildDays?.message}
        {...form.register("buildDays", { valueAsNumber: true })}
      />
      <Field
        label="Days on the road to the client"
        hint="With the due day they tell by when a yes is needed. The client is reminded two days before it."
        inputMode="numeric"
        error={errors.freightDays?.message}
        {...form.register("freightDays", { valueAsNumber: true })}
      />
      <Select
        label="Time zone"
        hint="Reminders leave at nine in the morning there."
        error={errors.timeZone?.message}
        {...form.register("timeZone")}
      >
        {zonesWith(shop.timeZone).map((zone) => (
          <option key={zone} value={zone}>
            {zone}
          </option>
        ))}
      </Select>
      <Button type="submit" kind="primary" busy={busy}>
        Save
      </Button>
    </form>
  );
}
