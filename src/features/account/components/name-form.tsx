import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { changeAccount } from "#shared/contracts/account.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useChangeName } from "../api/mutations.ts";

export function NameForm({ name }: { readonly name: string }) {
  const change = useChangeName();
  const form = useForm({ resolver: zodResolver(changeAccount.body), values: { name } });
  const { problem, busy, handleSubmit } = useSend(form, ["name"], (values) => change.mutateAsync(values));
  return (
    <form noValidate onSubmit={handleSubmit} className="max-w-md space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {change.isSuccess && <Notice tone="done">Your name is changed. What you signed before keeps the old one.</Notice>}
      <Field
        label="Your name"
        autoComplete="name"
        error={form.formState.errors.name?.message}
        {...form.register("name")}
      />
      <Button type="submit" busy={busy}>
        Save the name
      </Button>
    </form>
  );
}
