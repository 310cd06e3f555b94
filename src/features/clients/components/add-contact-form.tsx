import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { addContact } from "#shared/contracts/clients.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useAddContact } from "../api/mutations.ts";

export function AddContactForm({
  shop,
  clientId,
  onAdded,
}: {
  readonly shop: string;
  readonly clientId: string;
  readonly onAdded: (name: string) => void;
}) {
  const add = useAddContact(shop, clientId);
  const form = useForm({ resolver: zodResolver(addContact.body), defaultValues: { name: "", email: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["name", "email"], async (values) => {
    await add.mutateAsync(values);
    onAdded(values.name);
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field label="Name" autoComplete="off" error={errors.name?.message} {...form.register("name")} />
      <Field
        label="E-mail address"
        hint="Proofs and sign-in links go here."
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...form.register("email")}
      />
      <Button type="submit" kind="primary" busy={busy}>
        Add the contact
      </Button>
    </form>
  );
}
