import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { type Role, role } from "#shared/contracts/account.ts";
import { inviteMember } from "#shared/contracts/shop.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useInvite } from "../api/mutations.ts";
import { roleWords } from "./role-words.ts";

/** Mails an invitation to the shop. */
export function InviteForm({ shop }: { readonly shop: string }) {
  const invite = useInvite(shop);
  const form = useForm({
    resolver: zodResolver(inviteMember.body),
    defaultValues: { email: "", role: "maker" as Role },
  });
  const { problem, busy, handleSubmit } = useSend(form, ["email", "role"], async (values) => {
    await invite.mutateAsync(values);
    form.reset();
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {invite.isSuccess && <Notice tone="done">An invitation is on its way to {invite.data.email}.</Notice>}
      <Field
        label="E-mail address"
        hint="Inviting the same address again sends a fresh link."
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...form.register("email")}
      />
      <Select label="Role" error={errors.role?.message} {...form.register("role")}>
        {role.options.map((name) => (
          <option key={name} value={name}>
            {roleWords[name]}
          </option>
        ))}
      </Select>
      <Button type="submit" kind="primary" busy={busy}>
        Send the invitation
      </Button>
    </form>
  );
}
