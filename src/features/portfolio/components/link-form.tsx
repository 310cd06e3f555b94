import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { makeShareLink } from "#shared/contracts/portfolio.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { counted } from "@/lib/format.ts";
import { useSend } from "@/lib/use-send.ts";
import { useMakeShareLink } from "../api/mutations.ts";

const linkForm = makeShareLink.body.omit({ jobIds: true });
const periods = [7, 30, 90, 365] as const;

/** Makes a link to the chosen pieces. */
export function LinkForm({
  shop,
  jobIds,
  onMade,
  onGiveUp,
}: {
  readonly shop: string;
  readonly jobIds: readonly string[];
  readonly onMade: (url: string) => void;
  readonly onGiveUp: () => void;
}) {
  const make = useMakeShareLink(shop);
  const form = useForm({ resolver: zodResolver(linkForm), defaultValues: { label: "", days: 30 } });
  const { problem, busy, handleSubmit } = useSend(form, ["label", "days"], async (values) => {
    const { url } = await make.mutateAsync({ ...values, jobIds: [...jobIds] });
    onMade(url);
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="mb-6 space-y-4 border border-ink bg-sheet px-5 py-4">
      <h2 className="font-serif text-lg font-bold">New link</h2>
      {problem && <Notice tone="error">{problem}</Notice>}
      <div className="grid gap-4 sm:grid-cols-[minmax(0,1fr)_12rem]">
        <Field
          label="Whom is it for?"
          hint="Only the shop sees this."
          autoComplete="off"
          error={errors.label?.message}
          {...form.register("label")}
        />
        <Select label="Open for" error={errors.days?.message} {...form.register("days", { valueAsNumber: true })}>
          {periods.map((days) => (
            <option key={days} value={days}>
              {days === 365 ? "A year" : `${days} days`}
            </option>
          ))}
        </Select>
      </div>
      <p role="status" className="text-base">
        {jobIds.length === 0 ? "Choose the pieces below." : `${counted(jobIds.length, "piece")} chosen.`}
      </p>
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary" busy={busy} disabled={jobIds.length === 0}>
          Make the link
        </Button>
        <Button onClick={onGiveUp}>Leave it</Button>
      </div>
    </form>
  );
}
