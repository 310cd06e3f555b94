import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { registerShop } from "#shared/contracts/account.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useRegisterShop } from "../api/mutations.ts";

/** Opens a shop. Whoever fills this in owns it. */
export function RegisterForm({ onOpened }: { readonly onOpened: (shop: string) => void }) {
  const register = useRegisterShop();
  const form = useForm({
    resolver: zodResolver(registerShop.body),
    defaultValues: { shopName: "", name: "", email: "", password: "" },
  });
  const { problem, busy, handleSubmit } = useSend(form, ["shopName", "name", "email", "password"], async (values) => {
    const { shop } = await register.mutateAsync(values);
    onOpened(shop);
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field
        label="Name of the shop"
        hint="As your clients shall read it on every sheet."
        autoComplete="organization"
        error={errors.shopName?.message}
        {...form.register("shopName")}
      />
      <Field label="Your name" autoComplete="name" error={errors.name?.message} {...form.register("name")} />
      <Field
        label="Your e-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register("email")}
      />
      <Field
        label="Password"
        hint="At least 10 characters. A few plain words in a row are easy to keep."
        type="password"
        autoComplete="new-password"
        error={errors.password?.message}
        {...form.register("password")}
      />
      <Button type="submit" kind="primary" busy={busy}>
        Open the shop
      </Button>
    </form>
  );
}
