import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { password } from "#shared/contracts/common.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useResetPassword } from "../api/mutations.ts";

const newPasswordForm = z.strictObject({ password });

/** Spends a mailed link by setting a new password. */
export function NewPasswordForm({ token, onSet }: { readonly token: string; readonly onSet: () => void }) {
  const reset = useResetPassword();
  const form = useForm({ resolver: zodResolver(newPasswordForm), defaultValues: { password: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["password"], async (values) => {
    await reset.mutateAsync({ token, ...values });
    onSet();
  });
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field
        label="New password"
        hint="At least 10 characters. You are signed out everywhere else."
        type="password"
        autoComplete="new-password"
        error={form.formState.errors.password?.message}
        {...form.register("password")}
      />
      <Button type="submit" kind="primary" busy={busy}>
        Set the password
      </Button>
    </form>
  );
}
