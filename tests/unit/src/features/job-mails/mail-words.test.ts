import { expect, it } from "vitest";
import type { JobMail } from "#shared/contracts/outgoing-mail.ts";
import { mailName, mailState } from "@/features/job-mails/components/mail-words.ts";

const mail: JobMail = {
  id: "11111111-1111-4111-8111-111111111111",
  kind: "proof issued",
  to: "ada@orrery.example",
  state: "queued",
  reason: null,
  queuedAt: "2020-05-06T09:00:00.000Z",
  dueAt: null,
  sentAt: null,
  can: { sendAgain: false },
};

it.each<{ change: Partial<JobMail>; words: RegExp }>([
  { change: {}, words: /^is about to leave$/ },
  { change: { dueAt: "2020-05-06T09:10:00.000Z" }, words: /^gathers until 6 May 2020$/ },
  { change: { reason: "451 Later" }, words: /^waits for the next try: 451 Later$/ },
  { change: { state: "sent", sentAt: "2020-05-07T09:00:00.000Z" }, words: /^sent 7 May 2020$/ },
  { change: { state: "refused", reason: "550 No such mailbox" }, words: /^refused: 550 No such mailbox$/ },
  { change: { state: "dropped", reason: "Nothing left." }, words: /^not sent: Nothing left\.$/ },
])("a mail of $change says $words", ({ change, words }) => {
  expect(mailState({ ...mail, ...change })).toMatch(words);
});

it("is called by what it is about, even when a later version made it", () => {
  expect([mailName(mail), mailName({ kind: "something new" })]).toEqual(["The proof mail", "The mail"]);
});
