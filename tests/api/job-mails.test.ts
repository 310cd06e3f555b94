import type { AddressInfo } from "node:net";
import { SMTPServer } from "smtp-server";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { mailApprovers } from "#server/commands/mail-the-other-side.ts";
import type { Services } from "#server/http/context.ts";
import { sendMail } from "#server/jobs/send-mail.ts";
import { Job } from "#server/models/job.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { loadJobs } from "#server/queries/load-jobs.ts";
import { changeContact, removeContact } from "#shared/contracts/clients.ts";
import { listEvents } from "#shared/contracts/jobs.ts";
import { listJobMails, sendMailAgain } from "#shared/contracts/outgoing-mail.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { caughtMails } from "../support/mail.ts";

let app: TestApp;
let world: World;
let revisionId: string;
/** Takes nothing: what it says is in `answer`. */
let refusing: SMTPServer;
let answer = { responseCode: 550, words: "No such mailbox here" };
let refusingServices: Services;
beforeAll(async () => {
  refusing = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS"],
    onRcptTo: (_address, _session, done) =>
      done(Object.assign(new Error(answer.words), { responseCode: answer.responseCode })),
  });
  await new Promise<void>((resolve) => refusing.listen(0, "127.0.0.1", resolve));
  app = await startTestApp({ poolMax: 10 });
  world = await buildWorld(app);
  revisionId = (await buildRevision(app, world)).id;
  const { port } = refusing.server.address() as AddressInfo;
  refusingServices = { ...app.services, env: { ...app.services.env, SMTP_URL: `smtp://127.0.0.1:${port}` } };
}, 60_000);
afterAll(async () => {
  await app.stop();
  await new Promise<void>((resolve) => refusing.close(() => resolve()));
});

const of = () => ({ ...world.params, jobId: world.job.id });
const list = (only?: "refused") =>
  world.visitors.rep.get(listJobMails, { params: of(), query: { ...(only ? { only } : {}) } });
const logOf = async (): Promise<string[]> =>
  (await world.visitors.owner.get(listEvents, { params: of() })).items.map(({ text }) => text);

/** A proof mail of which the mail server wants nothing. */
async function refusedProof(attempt?: { isLast: boolean }): Promise<OutgoingMail> {
  await app.services.sequelize.transaction(async (transaction) => {
    const job = await Job.findByPk(world.job.id, { transaction, rejectOnEmpty: true });
    const [loaded] = await loadJobs({ transaction }, [job]);
    if (!loaded) throw new Error("The job is there.");
    await mailApprovers({ transaction, now: new Date() }, loaded, { kind: "proof issued", data: { revisionId } });
  });
  const where = { jobId: world.job.id, state: "queued" as const };
  const mail = await OutgoingMail.findOne({ where, rejectOnEmpty: true });
  const sent = sendMail(refusingServices, { mailId: mail.id }, attempt);
  if (answer.responseCode >= 500 || attempt?.isLast) await sent;
  else await expect(sent).rejects.toThrow();
  return mail.reload();
}

describe("the mails about a job", () => {
  it("are listed for the shop with their state, newest first", async () => {
    const { items, next } = await list();
    expect(items.map(({ kind, to, state, reason, can }) => [kind, to, state, reason, can.sendAgain])).toEqual([
      ["proof issued", world.approver.email, "sent", null, false],
    ]);
    expect(items[0]?.sentAt).not.toBeNull();
    expect(next).toBeNull();
    expect((await list("refused")).items).toEqual([]);
  });

  it("show a refusal with the server's words, in the list and in the log, to the shop alone", async () => {
    const mail = await refusedProof();
    const [first] = (await list("refused")).items;
    expect(first).toMatchObject({ id: mail.id, state: "refused", can: { sendAgain: true } });
    expect(first?.reason).toBe("550 No such mailbox here");
    expect((await logOf())[0]).toMatch(/^Mail to .+ was refused \(proof issued\): .*No such mailbox here/);
    expect((await world.visitors.approver.refusal(listJobMails, { params: of() })).code).toBe("not_found");
    // Whoever has the job's page open is told to look again, but no client.
    const [told] = await app.services.sequelize.query(
      `select open_number from job_signals where job_id = '${world.job.id}' order by number desc limit 1`,
    );
    expect(told).toEqual([{ open_number: null }]);
  });

  it("send a refused one again, once however often and by however many it is asked, and it then needs no hand", async () => {
    const [refused] = (await list("refused")).items;
    const params = { ...of(), mailId: refused?.id ?? "" };
    const { owner, maker, rep } = world.visitors;
    const answers = await Promise.all(
      [owner, maker, rep, owner].map((visitor) => visitor.ask(sendMailAgain, { params })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 409, 409, 409]);
    const before = (await caughtMails(app)).length;
    await app.runJobs();
    const caught = await caughtMails(app);
    expect(caught).toHaveLength(before + 1);
    expect(caught[0]?.subject).toMatch(/^Revision A of /);
    expect((await list("refused")).items).toEqual([]);
    const { items } = await list();
    expect(items.map(({ state, can }) => [state, can.sendAgain])).toEqual([
      ["sent", false],
      ["refused", false],
      ["sent", false],
    ]);
    expect((await logOf()).some((line) => line.startsWith("Sent a refused mail once more"))).toBe(true);
  });

  it("that the server would not take until the last try are refused too, so that nobody waits for them", async () => {
    answer = { responseCode: 451, words: "Come back later" };
    const waiting = await refusedProof();
    expect(waiting.state).toBe("queued");
    expect(waiting.lastError).toContain("Come back later");
    await sendMail(refusingServices, { mailId: waiting.id }, { isLast: true });
    answer = { responseCode: 550, words: "No such mailbox here" };
    await waiting.reload();
    expect(waiting.state).toBe("refused");
    const [job] = (await app.queuedJobs()).filter(({ payload }) => payload.mailId === waiting.id);
    expect(job?.task).toBe("send-mail");
    await app.runJobs();
    await waiting.reload();
    expect(waiting.state).toBe("refused");
  });

  it("go to the address that the contact has by then, and not to one who is no contact any more", async () => {
    const mail = await refusedProof();
    const contactId = world.approver.contact.id;
    const email = "put.right@people.example";
    await world.visitors.rep.get(changeContact, { params: { ...world.params, contactId }, body: { email } });
    const params = { ...of(), mailId: mail.id };
    await world.visitors.rep.get(sendMailAgain, { params });
    await app.runJobs();
    const proof = (await caughtMails(app)).find(({ subject }) => subject.startsWith("Revision A of "));
    expect(proof?.to).toBe(email);

    const second = await refusedProof();
    await world.visitors.rep.ask(removeContact, { params: { ...world.params, contactId } });
    const problem = await world.visitors.rep.refusal(sendMailAgain, { params: { ...of(), mailId: second.id } });
    expect(problem).toMatchObject({ code: "wrong_state" });
  });

  it("are not sent again when they were not refused, or are of no such job", async () => {
    const sent = (await list()).items.find(({ state }) => state === "sent");
    const { owner } = world.visitors;
    const again = await owner.refusal(sendMailAgain, { params: { ...of(), mailId: sent?.id ?? "" } });
    expect(again.code).toBe("wrong_state");
    const unknown = "11111111-1111-4111-8111-111111111111";
    expect((await owner.refusal(sendMailAgain, { params: { ...of(), mailId: unknown } })).code).toBe("not_found");
  });
});
