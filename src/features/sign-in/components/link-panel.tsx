import { useQuery } from "@tanstack/react-query";
import { useNavigate } from "react-router-dom";
import { localPath, paths, signInTo } from "@/app/paths.ts";
import { Button } from "@/components/ui/button.tsx";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { meQuery } from "@/lib/me.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { useAcceptInvitation, useSignOutHere, useSpendLink } from "../api/mutations.ts";
import { linkQuery } from "../api/queries.ts";
import { FreshLink } from "./fresh-link.tsx";
import { JoinForm } from "./join-form.tsx";
import { NewPasswordForm } from "./new-password-form.tsx";

const Heading = ({ children }: { readonly children: string }) => {
  usePageTitle(children);
  return <h1 className="mb-3 font-serif text-2xl font-bold text-ink">{children}</h1>;
};

/** Where mailed links lead. Nothing is spent until a button is pressed, since mail scanners open links too. */
export function LinkPanel({ token }: { readonly token: string }) {
  const navigate = useNavigate();
  const link = useQuery(linkQuery(token));
  const me = useQuery(meQuery);
  const spend = useSpendLink();
  const accept = useAcceptInvitation();
  const leave = useSignOutHere();
  const go = (path: string | null) => void navigate(localPath(path) ?? paths.home(), { replace: true });

  if (link.error instanceof ApiProblem && link.error.code === "validation_failed") return <UnknownLink />;
  if (link.isPending || me.isPending) return <Skeleton label="Reading the link" rows={2} />;
  if (link.isError || me.isError) {
    return (
      <>
        <Heading>This link could not be read</Heading>
        <ProblemNotice
          what="The link is not spent."
          error={link.error ?? me.error}
          onRetry={() => void Promise.all([link.refetch(), me.refetch()])}
        />
      </>
    );
  }
  const { state, purpose, shopName, addressHint, knownPerson, role, goTo } = link.data;
  const shop = shopName ?? "the shop";

  if (state === "unknown") return <UnknownLink />;
  if (state !== "open") {
    const mayGoOn = purpose === "sign in" && me.data.person !== null;
    return (
      <>
        <Heading>{state === "spent" ? "This link has been used" : "This link has run out"}</Heading>
        <p className="mb-5 text-base text-graphite">
          Each link opens the door once and for a limited time, so that an old mail opens nothing. Nothing is lost.
        </p>
        {mayGoOn && (
          <div className="mb-6">
            <p className="mb-3 text-base">You are still signed in here as {me.data.person?.email}.</p>
            <Button kind="primary" onClick={() => go(goTo)}>
              Go on
            </Button>
          </div>
        )}
        <FreshLink token={token} addressHint={addressHint} isOnlyWay={!mayGoOn} />
      </>
    );
  }
  if (purpose === "new password") {
    return (
      <>
        <Heading>Choose a new password</Heading>
        <NewPasswordForm token={token} onSet={() => go(goTo)} />
      </>
    );
  }
  if (purpose === "join shop") {
    return (
      <>
        <Heading>{`Join ${shop}`}</Heading>
        <p className="mb-5 text-base text-graphite">
          You are invited{role ? ` as ${role}` : ""}
          {addressHint ? `, at ${addressHint}` : ""}.
        </p>
        {!knownPerson ? (
          <JoinForm token={token} shopName={shop} onJoined={(slug) => go(paths.bench(slug))} />
        ) : me.data.person === null || me.data.session !== "password" ? (
          <>
            <p className="mb-4 text-base">This address has a password already. Sign in with it to accept.</p>
            <LinkButton kind="primary" to={signInTo(paths.link(token))}>
              Sign in to accept
            </LinkButton>
          </>
        ) : (
          <>
            {accept.isError && (
              <Notice tone="error" className="mb-4">
                {messageOf(accept.error)}
              </Notice>
            )}
            <p className="mb-4 text-base">You are signed in as {me.data.person.email}.</p>
            <div className="flex flex-wrap gap-3">
              <Button
                kind="primary"
                busy={accept.isPending}
                onClick={() => accept.mutate(token, { onSuccess: (joined) => go(paths.bench(joined.shop)) })}
              >
                Join {shop}
              </Button>
              <Button busy={leave.isPending} onClick={() => leave.mutate()}>
                That is not me
              </Button>
            </div>
          </>
        )}
      </>
    );
  }
  return (
    <>
      <Heading>{`Sign in to ${shop}`}</Heading>
      <p className="mb-5 text-base text-graphite">
        {addressHint ? `This link was mailed to ${addressHint}. ` : ""}Press the button to go on; no password is needed.
      </p>
      {spend.isError && (
        <Notice tone="error" className="mb-4">
          {messageOf(spend.error)}
        </Notice>
      )}
      {spend.isError ? (
        <FreshLink token={token} addressHint={addressHint} />
      ) : (
        <Button
          kind="primary"
          busy={spend.isPending}
          onClick={() => spend.mutate(token, { onSuccess: () => go(goTo) })}
        >
          Open {shop}
        </Button>
      )}
    </>
  );
}

/** A link that nobody made, or only a part of one. */
function UnknownLink() {
  return (
    <>
      <Heading>This link is not known</Heading>
      <p className="text-base text-graphite">
        It may have been cut short on its way. Open it from the mail again, or ask for a new one on the sign-in page.
      </p>
      <LinkButton className="mt-5" kind="primary" to={paths.signIn()}>
        Go to sign-in
      </LinkButton>
    </>
  );
}
