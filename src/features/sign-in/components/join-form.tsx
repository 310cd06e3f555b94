import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { password, personName } from "#shared/contracts/common.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useJoinShop } from "../api/mutations.ts";

const joinForm = z.strictObject({ name: personName, password });

/** Someone new joins: a name for the sheets and a password. */
export function JoinForm({
  token,
  shopName,
  onJoined,
}: {
  readonly token: string;
  readonly shopName: string;
  readonly onJoined: (shop: string) => void;
}) {
  const join = useJoinShop();
  const form = useForm({ resolver: zodResolver(joinForm), defaultValues: { name: "", password: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["name", "password"], async (values) => {
    const { shop } = await join.mutateAsync({ token, ...values });
    onJoined(shop);
  });
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field label="Your name" autoComplete="name" error={errors.name?.message} {...form.register("name")} />
      <Field
        label="Password"
        hint="At least 10 characters. A few plain words in a row are easy to keep."
        type="password"
        autoComplete="new-password"
        error={errors.password?.message}
        {...form.register("password")}
      />
      <Button type="submit" kind="primary" busy={busy}>
        Join {shopName}
      </Button>
    </form>
  );
}
