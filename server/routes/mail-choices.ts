import * as contract from "#shared/contracts/mail-choices.ts";
import { chooseMail } from "../commands/choose-mail.ts";
import { AppError, notFound } from "../http/app-error.ts";
import { shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { Shop } from "../models/shop.ts";
import { isInsider } from "../policies/actor.ts";
import { findMailChoices } from "../queries/find-mail-choices.ts";
import { findSubscriber } from "../queries/find-subscriber.ts";
import { addressHint } from "../queries/inspect-link.ts";
import { listMailChoices } from "../queries/list-mail-choices.ts";
import { ownSession } from "../queries/live-sessions.ts";

export function registerMailChoiceRoutes(routes: Routes): void {
  const anyone = { reach: "anyone" } as const;

  read(routes, contract.listMailChoices, async (context) => {
    const live = await ownSession(context);
    if (!live) throw new AppError("not_signed_in");
    return { items: await listMailChoices(live) };
  });

  write(routes, contract.changeMailChoices, async (context, { body }) => {
    const { actor, transaction } = context;
    const shop = await Shop.findByPk(shopIdOf(context), { transaction });
    if (!isInsider(actor) || !shop) throw notFound("page");
    const choices = await chooseMail(context, { personId: actor.personId, shopId: shop.id }, body);
    return { shop: shop.slug, shopName: shop.name, ...choices };
  });

  read(
    routes,
    contract.inspectUnsubscribe,
    async (context, { body }) => {
      const { person, shop } = await findSubscriber(context, body.token);
      const choices = await findMailChoices({ personId: person.id, shopId: shop.id }, context.transaction);
      return { shopName: shop.name, addressHint: addressHint(person.email), ...choices };
    },
    anyone,
  );

  write(
    routes,
    contract.unsubscribe,
    async (context, { params }) => {
      const { person, shop } = await findSubscriber(context, params.token);
      await chooseMail(context, { personId: person.id, shopId: shop.id }, { notes: false, reminders: false });
      return undefined;
    },
    anyone,
  );
}
