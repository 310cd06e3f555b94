import { Event } from "#server/models/event.ts";
import { eventText } from "#server/presenters/event.ts";

/** The kinds of a job's log in the order they were written. */
export async function logKinds(jobId: string): Promise<string[]> {
  return (await Event.findAll({ where: { jobId }, order: ["id"] })).map(({ kind }) => kind);
}

/** The newest line of a job's log with its author, as it reads on screen; mails that went out are left out. */
export async function lastLogLine(jobId: string): Promise<string> {
  const events = await Event.findAll({ where: { jobId }, order: [["id", "desc"]] });
  const event = events.find(({ kind }) => kind !== "mail sent");
  return event ? `${event.who}: ${eventText(event.kind, event.data as never)}` : "";
}
