import type { z } from "zod";
import type { eventSchema } from "#shared/contracts/jobs.ts";
import { sawFields } from "#shared/cut-plan/saw-fields.ts";
import { describeLimit, limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import { formatLimit } from "#shared/dry-fit/limit-units.ts";
import type { Event, EventFacts, EventKind } from "../models/event.ts";

/** What happened, in words. One line a kind, so that none is forgotten. */
const words: { readonly [K in EventKind]: (data: EventFacts[K]) => string } = {
  "shop opened": ({ name }) => `Opened the shop ${name}`,
  "member invited": ({ email, role }) => `Invited ${email} as ${role}`,
  "invitation taken back": ({ email }) => `Took back the invitation to ${email}`,
  "member joined": ({ role }) => `Joined as ${role}`,
  "member removed": ({ name }) => `Removed ${name} from the team`,
  "role changed": ({ name, from, to }) => `Changed ${name} from ${from} to ${to}`,
  "shop changed": ({ fields }) => `Changed the shop's ${fields.join(", ")}`,
  "limits changed": ({ changes }) => `Changed limits of the dry fit: ${changes.map(limitChange).join("; ")}`,
  "saws changed": ({ changes }) => `Changed how the shop cuts: ${changes.map(sawChange).join("; ")}`,
  "prices changed": ({ entries }) => `Changed prices: ${entriesWords(entries)}`,
  "stock added": ({ name }) => `Added ${name} to the stock`,
  "stock changed": ({ name }) => `Changed ${name} in the stock`,
  "stock counted": ({ name, from, to }) => `Counted ${name}: ${countedAs(to)}, ${countedAs(from)} before`,
  "stock taken out": ({ name }) => `Took ${name} out of the stock`,
  "stock brought back": ({ name }) => `Brought ${name} back into the stock`,
  "usual stock added": ({ count }) => `Added ${count} of the usual stock list`,
  "client added": ({ name }) => `Added the client ${name}`,
  "client changed": ({ name }) => `Changed the client ${name}`,
  "contact added": ({ name, email }) => `Added the contact ${name}, ${email}`,
  "contact changed": ({ name }) => `Changed the contact ${name}`,
  "contact address changed": ({ name, from, to }) => `Changed the address of ${name} from ${from} to ${to}`,
  "contact removed": ({ name }) => `Removed the contact ${name}`,
  "contact sent a link": ({ name }) => `Sent ${name} a link`,
  "job opened": ({ title }) => `Opened the job ${title}`,
  "job opened like another": ({ like, artwork }) =>
    `Took over format, stack and hardware of job ${like}${artwork ? ", with its artwork" : ""}`,
  "job changed": ({ fields }) => `Changed ${fields.join(", ")}`,
  "job moved": ({ from, to, reason }) => `Moved the job from ${from} to ${to}${reason ? `: ${reason}` : ""}`,
  "consent given": () => "Agreed that the piece may be shown in the portfolio",
  "consent taken back": () => "Took back the consent to show the piece",
  "artwork added": ({ name }) => `Brought in the artwork ${name}`,
  "artwork ready": ({ name, pieces }) => `${name} became ${pieces} ${pieces === 1 ? "piece" : "pieces"}`,
  "artwork refused": ({ name, reason }) => `${name} could not be taken: ${reason}`,
  "artwork removed": ({ name }) => `Took the artwork ${name} off the job`,
  "wall photo added": ({ name }) => `Brought in the photo ${name} of the wall`,
  "wall photo removed": ({ name }) => `Took the photo ${name} of the wall off the job`,
  "mockup begun": () => "Began the mockup",
  "draft kept": ({ name }) => `Kept the mockup as the draft “${name}”`,
  "draft renamed": ({ from, to }) => `Renamed the draft “${from}” to “${to}”`,
  "draft removed": ({ name }) => `Removed the draft “${name}”`,
  "finding set aside": ({ finding, reason }) => `Set aside the ${finding}: ${reason}`,
  "set-aside taken back": ({ finding }) => `Took back the setting aside of the ${finding}`,
  "revision preparing": ({ letter }) => `Sent revision ${letter} to be drawn`,
  "revision issued": ({ letter }) => `Revision ${letter} is out`,
  "revision failed": ({ letter, reason }) => `The PDF of revision ${letter} failed: ${reason}`,
  "revision withdrawn": ({ letter, reason }) => `Withdrew revision ${letter}: ${reason}`,
  "revision opened": ({ letter }) => `Opened revision ${letter}`,
  "revision asked": ({ letter, summary }) => `Asked for a revision of ${letter}${summary ? `: ${summary}` : ""}`,
  "revision approved": ({ letter, typedName }) => `Approved revision ${letter}, signed ${typedName}`,
  "certificate made": ({ letter }) => `The certificate of revision ${letter} is ready`,
  "note added": ({ number, letter }) => `Left note ${number} on revision ${letter}`,
  "note answered": ({ number }) => `Answered note ${number}`,
  "note put right": ({ number }) => `Put note ${number} right`,
  "note settled": ({ number }) => `Settled note ${number}`,
  "note opened again": ({ number }) => `Opened note ${number} again`,
  "share link made": ({ label }) => `Made the portfolio link ${label}`,
  "share link revoked": ({ label }) => `Closed the portfolio link ${label}`,
  "share link opened": ({ label }) => `Opened the portfolio link ${label}`,
  "mail sent": ({ kind, to }) => `Mail went to ${to}: ${kind}`,
  "mail refused": ({ kind, to, reason }) => `Mail to ${to} was refused (${kind}): ${reason}`,
  "mail dropped": ({ kind, to, reason }) => `Mail to ${to} did not go out (${kind}): ${reason}`,
  "mail sent again": ({ kind, to }) => `Sent a refused mail once more, to ${to}: ${kind}`,
  "signed in": ({ by }) => `Signed in by ${by}`,
};

/** How many entries a line of the log names before it only counts. */
const mostNamed = 12;

function entriesWords(entries: readonly string[]): string {
  const more = entries.length - mostNamed;
  return more > 0 ? `${entries.slice(0, mostNamed).join("; ")} and ${more} more` : entries.join("; ");
}

const countedAs = (quantity: number | null): string => (quantity === null ? "not counted" : String(quantity));

/** A limit that there is no more keeps the name it was stored under. */
function limitChange({ limit, from, to }: EventFacts["limits changed"]["changes"][number]): string {
  const key = limitKeys.find((known) => known === limit);
  if (key === undefined) return `${limit} from ${from} to ${to}`;
  const { label, unit } = describeLimit(key);
  return `${label} from ${formatLimit(from, unit, "mm")} to ${formatLimit(to, unit, "mm")}`;
}

/** Likewise a figure of how the shop cuts. */
function sawChange({ field, from, to }: EventFacts["saws changed"]["changes"][number]): string {
  const known = sawFields.find(({ key }) => key === field);
  if (known === undefined) return `${field} from ${from} to ${to}`;
  const { label, unit } = known;
  return `${label} from ${formatLimit(from, unit, "mm")} to ${formatLimit(to, unit, "mm")}`;
}

export function eventText<K extends EventKind>(kind: K, data: EventFacts[K]): string {
  return words[kind](data);
}

export function presentEvent(event: Event): z.input<typeof eventSchema> {
  return {
    id: String(event.id),
    at: event.at.toISOString(),
    who: event.who,
    kind: event.kind,
    text: eventText(event.kind, event.data as EventFacts[typeof event.kind]),
  };
}
