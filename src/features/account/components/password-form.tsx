import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { changePassword } from "#shared/contracts/account.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useChangePassword } from "../api/mutations.ts";

export function PasswordForm() {
  const change = useChangePassword();
  const form = useForm({
    resolver: zodResolver(changePassword.body),
    defaultValues: { current: "", password: "" },
  });
  const { problem, busy, handleSubmit } = useSend(form, ["current", "password"], async (values) => {
    await change.mutateAsync(values);
    form.reset();
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="max-w-md space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {change.isSuccess && <Notice tone="done">The new password holds. You are signed out everywhere else.</Notice>}
      <Field
        label="Present password"
        type="password"
        autoComplete="current-password"
        error={errors.current?.message}
        {...form.register("current")}
      />
      <Field
        label="New password"
        hint="At least 10 characters."
        type="password"
        autoComplete="new-password"
        error={errors.password?.message}
        {...form.register("password")}
      />
      <Button type="submit" busy={busy}>
        Change the password
      </Button>
    </form>
  );
}
