import { readdir, readFile } from "node:fs/promises";
import { join } from "node:path";
import { type ParsedMail, simpleParser } from "mailparser";
import type { TestApp } from "./app.ts";
import { runSql } from "./run-sql.ts";

export type Caught = { to: string; subject: string; text: string; html: string; parsed: ParsedMail; source: string };

/** Every mail that the sink caught, of all shops, the newest first. */
export const caughtMails = ({ services }: Pick<TestApp, "services">): Promise<Caught[]> =>
  mailsIn(services.env.MAIL_SINK_DIR ?? "");

/** Every mail that lies in a sink's folder, the newest first. */
export async function mailsIn(dir: string): Promise<Caught[]> {
  const names = (await readdir(dir))
    .filter((name) => name.endsWith(".eml"))
    .sort()
    .reverse();
  return Promise.all(
    names.map(async (name) => {
      const source = await readFile(join(dir, name), "utf8");
      const parsed = await simpleParser(source);
      return {
        to: [parsed.to ?? []]
          .flat()
          .map(({ text }) => text)
          .join(", "),
        subject: parsed.subject ?? "",
        text: parsed.text ?? "",
        html: parsed.html || "",
        parsed,
        source,
      };
    }),
  );
}

/** Lets the time pass that mails gather in, and sends them. */
export async function sendGathered(app: Pick<TestApp, "database" | "runJobs">): Promise<void> {
  await runSql(app.database.ownerUrl, "update graphile_worker._private_jobs set run_at = now() where run_at > now()");
  await app.runJobs();
}

/** The secret of the one link in a mail. Throws when there is none, or more than one. */
export function tokenIn(text: string): string {
  const tokens = new Set([...text.matchAll(/\/link\/([A-Za-z0-9_-]{43})\b/g)].map(([, token]) => token));
  const [token, ...others] = tokens;
  if (token === undefined || others.length > 0) throw new Error(`Not one link in: ${text}`);
  return token;
}
