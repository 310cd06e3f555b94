import { useQuery } from "@tanstack/react-query";
import { Navigate, useLocation } from "react-router-dom";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { meQuery } from "@/lib/me.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { paths } from "../paths.ts";

const isChoosing = (state: unknown): boolean => typeof state === "object" && state !== null && "choose" in state;

/** One place: straight there. Several: a choice. None: how to start. */
export function HomePage() {
  usePageTitle("Where to");
  const { state } = useLocation();
  const me = useQuery(meQuery);
  if (me.isPending) return <Skeleton label="Finding your places" rows={3} />;
  if (me.isError) {
    return <ProblemNotice what="Your places could not be loaded." error={me.error} onRetry={() => void me.refetch()} />;
  }
  const { person, memberOf, contactOf, session } = me.data;
  if (person === null) return <Navigate replace to={paths.signIn()} />;

  const places = [
    ...(session === "password" ? memberOf.map(({ shop, shopName, role }) => ({ shop, shopName, as: role })) : []),
    ...contactOf.map(({ shop, shopName, client }) => ({ shop, shopName, as: `for ${client}` })),
  ];
  const [only] = places;
  if (only && places.length === 1 && !isChoosing(state)) return <Navigate replace to={paths.bench(only.shop)} />;

  if (places.length === 0) {
    return (
      <>
        <h1 className="font-serif text-2xl font-bold text-ink">You belong to no shop yet</h1>
        <p className="mt-3 text-base text-graphite">
          You are signed in as {person.email}. Ask the owner of your shop to invite this address, or register a shop of
          your own. A client's jobs appear once the shop has named you as a contact.
        </p>
        <LinkButton className="mt-5" kind="primary" to={paths.register()}>
          Register a shop
        </LinkButton>
        <p className="mt-6">
          <TextLink to={paths.account()}>Your account</TextLink>
        </p>
      </>
    );
  }
  return (
    <>
      <h1 className="mb-5 font-serif text-2xl font-bold text-ink">Where to?</h1>
      <ul className="border-t border-rule">
        {places.map(({ shop, shopName, as }) => (
          <li key={`${shop} ${as}`} className="flex flex-wrap items-baseline gap-x-3 border-b border-rule py-4">
            <TextLink to={paths.bench(shop)} className="font-serif text-lg font-bold">
              {shopName}
            </TextLink>
            <span className="text-base text-graphite">{as}</span>
          </li>
        ))}
      </ul>
      {session === "link" && memberOf.length > 0 && (
        <p className="mt-5 text-base text-graphite">
          A mailed link signs you in as a client only.{" "}
          <TextLink to={paths.signIn()}>Sign in with your password</TextLink> to work for a shop.
        </p>
      )}
      <p className="mt-6">
        <TextLink to={paths.account()}>Your account</TextLink>
      </p>
    </>
  );
}
