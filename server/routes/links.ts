import * as contract from "#shared/contracts/account.ts";
import { acceptInvitation } from "../commands/accept-invitation.ts";
import { mailFreshLink, mailPasswordLink, mailSignInLinks } from "../commands/mail-links.ts";
import { registerShop } from "../commands/register-shop.ts";
import { resetPassword } from "../commands/set-password.ts";
import { type Routes, read, write } from "../http/route.ts";
import { inspectLink } from "../queries/inspect-link.ts";

/** Ways in for those who are not signed in. Answers never tell whether an address is known. */
export function registerLinkRoutes(routes: Routes): void {
  const anyone = { reach: "anyone" } as const;

  write(
    routes,
    contract.registerShop,
    async (context, { body }) => ({ shop: (await registerShop(context, body)).slug }),
    anyone,
  );

  read(routes, contract.inspectLink, async (context, { body }) => inspectLink(context, body.token), anyone);

  write(
    routes,
    contract.sendFreshLink,
    async (context, { body }) => {
      await mailFreshLink(context, body.token);
      return undefined;
    },
    anyone,
  );

  write(
    routes,
    contract.requestLink,
    async (context, { body }) => {
      await mailSignInLinks(context, body.email);
      return undefined;
    },
    anyone,
  );

  write(
    routes,
    contract.forgotPassword,
    async (context, { body }) => {
      await mailPasswordLink(context, body.email);
      return undefined;
    },
    anyone,
  );

  write(
    routes,
    contract.resetPassword,
    async (context, { body }) => ({ email: (await resetPassword(context, body)).email }),
    anyone,
  );

  write(
    routes,
    contract.acceptInvitation,
    async (context, { body }) => {
      const { shop, email } = await acceptInvitation(context, body);
      return { shop: shop.slug, email };
    },
    anyone,
  );
}
