import { useCallback } from "react";
import { useNavigate, useSearchParams } from "react-router-dom";
import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { useRequestLink } from "@/features/sign-in/api/mutations.ts";
import { MailedAddressForm } from "@/features/sign-in/components/mailed-address-form.tsx";
import { PasswordSignIn } from "@/features/sign-in/components/password-sign-in.tsx";
import { usePageTitle } from "@/lib/page-title.ts";
import { localPath, paths } from "../paths.ts";
import { useSignedInAgain } from "../use-signed-in-again.ts";

export function SignInPage() {
  usePageTitle("Sign in");
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const requestLink = useRequestLink();
  const next = localPath(search.get("next"));
  const goOn = useCallback(() => void navigate(next ?? paths.home(), { replace: true }), [navigate, next]);
  useSignedInAgain(next !== null, goOn);
  return (
    <>
      <h1 className="mb-5 font-serif text-2xl font-bold text-ink">Sign in</h1>
      {next !== null && (
        <Notice title="Sign in to go on" className="mb-6">
          Then this tab goes on where it was. Anything you typed there is still in it.
        </Notice>
      )}
      <PasswordSignIn onSignedIn={goOn} />
      <section className="mt-10 border-t border-rule pt-6">
        <h2 className="font-serif text-lg font-bold text-ink">You are a client and have no password?</h2>
        <p className="mt-1 mb-4 text-base text-graphite">
          We mail you a link that signs you in.{next !== null && " Open it, then come back to this tab."}
        </p>
        <MailedAddressForm
          action="Mail me a link"
          sent="a sign-in link"
          onSend={(email) => requestLink.mutateAsync(email)}
        />
      </section>
      <p className="mt-10 border-t border-rule pt-6 text-base">
        You run a sign shop and are new here? <TextLink to={paths.register()}>Register your shop</TextLink>
      </p>
    </>
  );
}
