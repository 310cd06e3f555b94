import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { addClient } from "#shared/contracts/clients.ts";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useAddClient } from "../api/mutations.ts";

type AddClientDialogProps = {
  readonly shop: string;
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly onAdded: (clientId: string) => void;
};

export function AddClientDialog({ open, onOpenChange, ...rest }: AddClientDialogProps) {
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title="Add a client">
      <AddClientForm {...rest} />
    </Dialog>
  );
}

function AddClientForm({ shop, onAdded }: Pick<AddClientDialogProps, "shop" | "onAdded">) {
  const add = useAddClient(shop);
  const form = useForm({ resolver: zodResolver(addClient.body), defaultValues: { name: "", remarks: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["name", "remarks"], async (values) => {
    const added = await add.mutateAsync(values);
    onAdded(added.id);
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field label="Name of the company" autoComplete="off" error={errors.name?.message} {...form.register("name")} />
      <TextArea
        label="Remarks"
        hint="For the shop only; clients never see them."
        error={errors.remarks?.message}
        {...form.register("remarks")}
      />
      <Button type="submit" kind="primary" busy={busy}>
        Add the client
      </Button>
    </form>
  );
}
