import { TextLink } from "@/components/ui/text-link.tsx";
import { useForgotPassword } from "@/features/sign-in/api/mutations.ts";
import { MailedAddressForm } from "@/features/sign-in/components/mailed-address-form.tsx";
import { usePageTitle } from "@/lib/page-title.ts";
import { paths } from "../paths.ts";

export function ForgotPasswordPage() {
  usePageTitle("Forgot the password");
  const forgot = useForgotPassword();
  return (
    <>
      <h1 className="font-serif text-2xl font-bold text-ink">Forgot the password</h1>
      <p className="mt-2 mb-6 text-base text-graphite">
        We mail you a link that sets a new one. The old password holds until then.
      </p>
      <MailedAddressForm
        action="Mail me a link"
        kind="primary"
        sent="a link for a new password"
        onSend={(email) => forgot.mutateAsync(email)}
      />
      <p className="mt-8 text-base">
        <TextLink to={paths.signIn()}>Back to sign-in</TextLink>
      </p>
    </>
  );
}
