import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { email } from "#shared/contracts/common.ts";
import { Button } from "@/components/ui/button.tsx";
import type { ButtonKind } from "@/components/ui/button-class.ts";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";

const addressForm = z.strictObject({ email });

/** Asks for an address and mails something there. The answer is the same whether the address is known or not. */
export function MailedAddressForm({
  action,
  sent,
  kind = "outline",
  onSend,
}: {
  readonly action: string;
  /** What was mailed, as "a sign-in link". */
  readonly sent: string;
  readonly kind?: ButtonKind;
  readonly onSend: (email: string) => Promise<unknown>;
}) {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(addressForm), defaultValues: { email: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["email"], async (values) => {
    await onSend(values.email);
    setSentTo(values.email);
  });
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {sentTo !== null && (
        <Notice tone="done" title="Look in your mail">
          If {sentTo} is known here, {sent} is on its way. It may take a minute; look among unwanted mail too.
        </Notice>
      )}
      <Field
        label="E-mail address"
        type="email"
        autoComplete="email"
        error={form.formState.errors.email?.message}
        {...form.register("email")}
      />
      <Button type="submit" kind={kind} busy={busy}>
        {sentTo === null ? action : "Send it again"}
      </Button>
    </form>
  );
}
