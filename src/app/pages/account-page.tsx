import { useQuery } from "@tanstack/react-query";
import { Navigate } from "react-router-dom";
import { Button } from "@/components/ui/button.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { NameForm } from "@/features/account/components/name-form.tsx";
import { PasswordForm } from "@/features/account/components/password-form.tsx";
import { SessionList } from "@/features/account/components/session-list.tsx";
import { MailChoiceList } from "@/features/mail-choices/components/mail-choice-list.tsx";
import { meQuery } from "@/lib/me.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { paths, signInTo } from "../paths.ts";
import { useSignOut } from "../use-sign-out.ts";

const headingClass = "mb-4 font-serif text-lg font-bold text-ink";

export function AccountPage() {
  usePageTitle("Account");
  const me = useQuery(meQuery);
  const signOut = useSignOut();
  if (me.isPending) return <Skeleton label="Loading your account" />;
  if (me.isError) {
    return (
      <ProblemNotice what="Your account could not be loaded." error={me.error} onRetry={() => void me.refetch()} />
    );
  }
  const { person } = me.data;
  if (person === null) return <Navigate replace to={signInTo(paths.account())} />;
  return (
    <div className="space-y-10">
      <header>
        <p className="mb-2">
          <TextLink to={paths.home()}>Back to the shop</TextLink>
        </p>
        <h1 className="font-serif text-2xl font-bold text-ink">Account</h1>
        <p className="mt-1 text-base text-graphite">{person.email}</p>
      </header>
      <section>
        <h2 className={headingClass}>Name</h2>
        <NameForm name={person.name} />
      </section>
      <section>
        <h2 className={headingClass}>Password</h2>
        {person.hasPassword ? (
          <PasswordForm />
        ) : (
          <p className="text-base text-graphite">
            You sign in by mailed links and need no password.{" "}
            <TextLink to={paths.forgotPassword()}>Set one all the same</TextLink>
          </p>
        )}
      </section>
      <section>
        <h2 className={headingClass}>Mail</h2>
        <MailChoiceList />
      </section>
      <section>
        <h2 className={headingClass}>Where you are signed in</h2>
        <SessionList />
      </section>
      <Button busy={signOut.isPending} onClick={() => signOut.mutate()}>
        Sign out here
      </Button>
    </div>
  );
}
