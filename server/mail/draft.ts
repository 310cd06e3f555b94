import type { OneTimeLink } from "../models/one-time-link.ts";
import type { Letter } from "./letter.ts";

/** A link that signs in, joins or sets a password: whom it is for and how long it holds. */
export type LinkOrder = Pick<OneTimeLink, "purpose"> & {
  readonly hours: number;
  readonly contactId?: string;
  readonly personId?: string;
  readonly invitationId?: string;
  readonly goTo: string | null;
};

/** A mail with all its words, but with the link still to be made. */
export type Draft = {
  readonly greeting: string;
  readonly sender: string | null;
  readonly letter: Omit<Letter, "button" | "stop">;
  /** Where the button leads: to a link of its own, to a page of the application, or there is no button. */
  readonly button: { readonly label: string; readonly leadsTo: LinkOrder | string } | null;
};

/** Why nobody is sent this mail any more, for the log. */
export type NotSent = { readonly notSent: string };

export const notSent = {
  gone: { notSent: "There is nobody any more whom it could go to under this address." },
  withdrawn: { notSent: "The revision it was about was withdrawn." },
  missing: { notSent: "What it was about is not there any more." },
  seen: { notSent: "Its reader has seen all of it on the sheet." },
  nothing: { notSent: "There was nothing left to tell." },
  decided: { notSent: "Nobody waits for the client's yes any more." },
  stopped: { notSent: "Its reader has stopped these mails." },
} as const satisfies Record<string, NotSent>;

/** How long each kind of link holds, in hours. */
export const linkHours = { "sign in": 14 * 24, "join shop": 7 * 24, "new password": 1 } as const;

export const linkRemarks = {
  "sign in":
    "The link signs you in without a password. It works once and holds for 14 days; after that its page sends you a fresh one.",
  "join shop": "The link works once and holds for 7 days.",
  "new password":
    "The link works once and holds for one hour. If you did not ask for it, leave it be: your password stays as it is.",
} as const;
