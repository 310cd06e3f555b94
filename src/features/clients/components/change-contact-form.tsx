import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { type Client, changeContact } from "#shared/contracts/clients.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useChangeContact } from "../api/mutations.ts";

type Contact = Client["contacts"][number];

/** Name and address of a contact. What a new address brings about is said before it is saved. */
export function ChangeContactForm({
  shop,
  clientId,
  contact,
  onChanged,
}: {
  readonly shop: string;
  readonly clientId: string;
  readonly contact: Contact;
  readonly onChanged: (words: string) => void;
}) {
  const change = useChangeContact(shop, clientId, contact.id);
  const form = useForm({
    resolver: zodResolver(changeContact.body),
    defaultValues: { name: contact.name, email: contact.email },
  });
  const moves = (form.watch("email") ?? "").trim().toLowerCase() !== contact.email;
  const { problem, busy, handleSubmit } = useSend(form, ["name", "email"], async ({ name, email }) => {
    await change.mutateAsync({ ...(name ? { name } : {}), ...(email && email !== contact.email ? { email } : {}) });
    onChanged(moves ? `${name ?? contact.name} is now reached at ${email}.` : "Saved.");
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field label="Name" autoComplete="off" error={errors.name?.message} {...form.register("name")} />
      <Field
        label="E-mail address"
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...form.register("email")}
      />
      {moves && (
        <Notice tone="caution" title="A new address changes who can get in">
          <ul className="list-disc space-y-1 pl-5">
            <li>{contact.name} is signed out everywhere.</li>
            <li>Links already mailed to {contact.email} open nothing any more.</li>
            <li>{contact.email} is told of the change, and the log keeps it.</li>
          </ul>
        </Notice>
      )}
      <Button type="submit" kind="primary" busy={busy}>
        {moves ? "Change the address" : "Save"}
      </Button>
    </form>
  );
}
