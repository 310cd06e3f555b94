import { z } from "zod";
import * as contract from "#shared/contracts/outgoing-mail.ts";
import { sendMailAgain } from "../commands/send-mail-again.ts";
import { notFound } from "../http/app-error.ts";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import type { MailSink } from "../mail/sink.ts";
import { jobPolicy } from "../policies/job.ts";
import { shopPolicy } from "../policies/shop.ts";
import { presentJobMail, presentMail, presentMailRow } from "../presenters/outgoing-mail.ts";
import { findJob } from "../queries/find-job.ts";
import { listJobMails } from "../queries/list-job-mails.ts";
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

  read(routes, contract.listJobMails, async (context, { params, query }) => {
    const { job, facts } = await findJob(context, params.jobId);
    if (!jobPolicy.seeLog(context.actor, facts)) throw notFound("log");
    return pageOf(
      await listJobMails(context, job.id, query),
      query.limit,
      ({ mail, followed }) => presentJobMail(mail, { followed }),
      ({ mail }) => [mail.createdAt.toISOString(), mail.id],
    );
  });

  write(routes, contract.sendMailAgain, async (context, { params }) => {
    await sendMailAgain(context, params);
    return undefined;
  });
}

/** The page exists for the owner only, and only while mail goes to the local sink. */
function openSink(context: ReadContext): MailSink {
  const { mailSink } = context.services;
  const facts = { shopId: shopIdOf(context), keepsMail: mailSink !== null };
  if (!mailSink || !shopPolicy.seeOutgoingMail(context.actor, facts)) throw notFound("page");
  return mailSink;
}
