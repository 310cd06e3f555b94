import { Op, QueryTypes } from "sequelize";
import { addDays, needsYesBy } from "#shared/lifecycle/needs-yes-by.ts";
import { clockIn, type Reminder, reminderDue } from "#shared/lifecycle/reminder-due.ts";
import type { Context } from "../http/context.ts";
import { Job } from "../models/job.ts";
import { MailChoices } from "../models/mail-choices.ts";
import { type MailKind, OutgoingMail } from "../models/outgoing-mail.ts";
import { loadJobs } from "../queries/load-jobs.ts";
import { approversToMail } from "../queries/mail-readers.ts";
import { queueMail } from "./queue-mail.ts";

const kinds: Readonly<Record<Reminder, MailKind>> = { before: "yes needed soon", after: "yes was needed" };

type Waiting = {
  readonly jobId: string;
  readonly shopId: string;
  readonly dueOn: string;
  readonly revisionId: string;
  readonly issuedAt: Date;
  readonly dryingHours: number;
  readonly timeZone: string;
  readonly buildDays: number;
  readonly freightDays: number;
};

/**
 * Queues the reminders that are due at `now`: to each approver of a revision that is out, undecided and waits for the client, once before
 * and once after the day a yes is needed by. Called as often as one likes; a reminder that was made is never made again. Each revision is a
 * change of its own, so that no job is held while others are looked at. Returns how many mails it queued.
 */
export async function queueReminders({ services, now }: Pick<Context, "services" | "now">): Promise<number> {
  let queued = 0;
  for (const waiting of await listWaiting({ services, now })) {
    const { day: today, hour } = clockIn(waiting.timeZone, now);
    const { day: issuedOn } = clockIn(waiting.timeZone, waiting.issuedAt);
    const due = reminderDue({ yesBy: needsYesBy(waiting.dueOn, waiting), issuedOn, today, hour });
    if (!due) continue;
    queued += await services.sequelize.transaction((transaction) =>
      remindApprovers({ transaction, now }, waiting, kinds[due]),
    );
  }
  return queued;
}

/** Issued revisions whose client is to decide, of jobs that are still due or were a few days ago. */
function listWaiting({ services, now }: Pick<Context, "services" | "now">): Promise<Waiting[]> {
  return services.sequelize.query<Waiting>(
    `select job.id as "jobId", job.shop_id as "shopId", job.due_on::text as "dueOn", revision.id as "revisionId",
       revision.issued_at as "issuedAt", revision.drying_hours as "dryingHours",
       shop.time_zone as "timeZone", shop.build_days as "buildDays", shop.freight_days as "freightDays"
     from jobs job join revisions revision on revision.job_id = job.id join shops shop on shop.id = job.shop_id
     where job.whose_move = 'client' and revision.state = 'issued' and job.due_on >= $1::date
     order by job.id`,
    { bind: [addDays(now.toISOString().slice(0, 10), -5)], type: QueryTypes.SELECT },
  );
}

async function remindApprovers(
  context: Pick<Context, "transaction" | "now">,
  { jobId, shopId, revisionId }: Waiting,
  kind: MailKind,
): Promise<number> {
  const { transaction } = context;
  // Two processes at once, or a clock that jumped: the second waits here and then finds what the first has made.
  const job = await Job.findOne({ where: { id: jobId, whoseMove: "client" }, lock: true, transaction });
  const [loaded] = job ? await loadJobs(context, [job]) : [];
  if (loaded?.revisions.find(({ id }) => id === revisionId)?.state !== "issued") return 0;
  const readers = await approversToMail(context, loaded);
  const personId = { [Op.in]: readers.map((reader) => reader.personId) };
  const stopped = await MailChoices.findAll({ where: { shopId, reminders: false, personId }, transaction });
  const made = await OutgoingMail.findAll({ where: { shopId, jobId, kind }, transaction });
  const left = readers.filter(
    (reader) =>
      !stopped.some((one) => one.personId === reader.personId) &&
      !made.some(({ recipientId, data }) => recipientId === reader.personId && data.revisionId === revisionId),
  );
  for (const { personId: recipientId, address, contactId } of left) {
    const data = { revisionId, ...(contactId ? { contactId } : {}) };
    await queueMail(context, { kind, data, address, shopId, jobId, recipientId });
  }
  return left.length;
}
