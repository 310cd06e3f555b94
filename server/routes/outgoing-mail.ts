import { z } from "zod";
import * as contract from "#shared/contracts/outgoing-mail.ts";
import { notFound } from "../http/app-error.ts";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { type Routes, read } from "../http/route.ts";
import type { MailSink } from "../mail/sink.ts";
import { shopPolicy } from "../policies/shop.ts";
import { presentMail, presentMailRow } from "../presenters/outgoing-mail.ts";
import { pageOf, places, readCursor } from "../queries/page.ts";

export function registerOutgoingMailRoutes(routes: Routes): void {
  read(routes, contract.listOutgoingMail, async (context, { query }) => {
    const before = readCursor(query.cursor, z.tuple([places.text]))?.[0] ?? null;
    const page = { shopId: shopIdOf(context), limit: query.limit + 1, before };
    return pageOf(await openSink(context).list(page), query.limit, presentMailRow, ({ id }) => [id]);
  });

  read(routes, contract.getOutgoingMail, async (context, { params }) => {
    const mail = await openSink(context).find({ shopId: shopIdOf(context), id: params.mailId });
    if (!mail) throw notFound("mail");
    return presentMail(mail, { publicUrl: context.services.env.PUBLIC_URL });
  });
}

/** The page exists for the owner only, and only while mail goes to the local sink. */
function openSink(context: ReadContext): MailSink {
  const { mailSink } = context.services;
  const facts = { shopId: shopIdOf(context), keepsMail: mailSink !== null };
  if (!mailSink || !shopPolicy.seeOutgoingMail(context.actor, facts)) throw notFound("page");
  return mailSink;
}
