import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { email } from "#shared/contracts/common.ts";
import { paths } from "@/app/paths.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useSignIn } from "../api/mutations.ts";

const signInForm = z.strictObject({ email, password: z.string().min(1, "Write the password.") });

/** Sign-in for those who chose a password. */
export function PasswordSignIn({ onSignedIn }: { readonly onSignedIn: () => void }) {
  const signIn = useSignIn();
  const form = useForm({ resolver: zodResolver(signInForm), defaultValues: { email: "", password: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["email", "password"], async (values) => {
    await signIn.mutateAsync(values);
    onSignedIn();
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register("email")}
      />
      <Field
        label="Password"
        type="password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register("password")}
      />
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <Button type="submit" kind="primary" busy={busy}>
          Sign in
        </Button>
        <TextLink to={paths.forgotPassword()}>Forgot the password?</TextLink>
      </div>
    </form>
  );
}
