import { cp, mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { vi } from "vitest";
import { loadDemo } from "#server/db/demo/load-demo.ts";
import { runQueue } from "#server/jobs/run-queue.ts";
import { startTestApp, type TestApp } from "./app.ts";
import { type Caught, caughtMails, tokenIn } from "./mail.ts";

export type ServedApp = Pick<TestApp, "baseUrl" | "services" | "logged" | "visitor" | "stop"> & {
  /** Waits for the newest mail to an address with these words in its subject. */
  mailTo: (address: string, subject: RegExp) => Promise<Caught>;
  /** The page that the one link in such a mail leads to. */
  linkMailedTo: (address: string, subject: RegExp) => Promise<string>;
};

/** As long as anything may take on a machine that is busy with other tests. */
export const patienceMs = 45_000;

/**
 * The application as people meet it: the built client, the server on a free port, and the queue at work. With `demo` the
 * demo shop is in it.
 */
export async function startServedApp({ demo = false }: { demo?: boolean } = {}): Promise<ServedApp> {
  // Pages fetch their parts when they are first opened: a build that begins meanwhile must not take them away.
  const clientDir = await mkdtemp(join(tmpdir(), "standproud-client-"));
  await cp("dist/client", clientDir, { recursive: true });
  const app = await startTestApp({ poolMax: 8, env: { CLIENT_DIR: clientDir } });
  if (demo) await loadDemo(app.services);
  const queue = await runQueue(app.services);
  const mailTo = (address: string, subject: RegExp): Promise<Caught> =>
    vi.waitFor(
      async () => {
        const mails = await caughtMails(app);
        const mail = mails.find((one) => one.to === address && subject.test(one.subject));
        if (mail) return mail;
        throw new Error(
          `No mail to ${address} about ${subject}; caught: ${mails.map((one) => `${one.to}: ${one.subject}`).join("; ")}`,
        );
      },
      { timeout: patienceMs, interval: 100 },
    );
  return {
    baseUrl: app.baseUrl,
    services: app.services,
    logged: app.logged,
    visitor: app.visitor,
    mailTo,
    linkMailedTo: async (address, subject) => {
      const { text } = await mailTo(address, subject);
      return `/link/${tokenIn(text)}`;
    },
    async stop() {
      await queue.stop();
      await app.stop();
      await rm(clientDir, { recursive: true, force: true });
    },
  };
}
