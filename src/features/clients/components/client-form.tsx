import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { type Client, changeClient } from "#shared/contracts/clients.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useChangeClient } from "../api/mutations.ts";

/** Name and remarks of a client. */
export function ClientForm({ shop, client }: { readonly shop: string; readonly client: Client }) {
  const change = useChangeClient(shop, client.id);
  const form = useForm({
    resolver: zodResolver(changeClient.body),
    values: { name: client.name, remarks: client.remarks },
  });
  const { problem, busy, handleSubmit } = useSend(form, ["name", "remarks"], (values) => change.mutateAsync(values));
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="max-w-xl space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {change.isSuccess && !form.formState.isDirty && <Notice tone="done">Saved.</Notice>}
      <Field
        label="Name of the company"
        readOnly={!client.can.change}
        error={errors.name?.message}
        {...form.register("name")}
      />
      <TextArea
        label="Remarks"
        hint="For the shop only; clients never see them."
        readOnly={!client.can.change}
        error={errors.remarks?.message}
        {...form.register("remarks")}
      />
      {client.can.change && (
        <Button type="submit" busy={busy}>
          Save
        </Button>
      )}
    </form>
  );
}
