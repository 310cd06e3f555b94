import { readdir, readFile } from "node:fs/promises";
import { join } from "node:path";
import { type ParsedMail, simpleParser } from "mailparser";
import type { TestApp } from "./app.ts";

export type Caught = { to: string; subject: string; text: string; html: string; parsed: ParsedMail; source: string };

/** Every mail that the sink caught, of all shops, the newest first. */
export async function caughtMails({ services }: Pick<TestApp, "services">): Promise<Caught[]> {
  const dir = services.env.MAIL_SINK_DIR ?? "";
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

/** The secret of the one link in a mail. Throws when there is none, or more than one. */
export function tokenIn(text: string): string {
  const tokens = new Set([...text.matchAll(/\/link\/([A-Za-z0-9_-]{43})\b/g)].map(([, token]) => token));
  const [token, ...others] = tokens;
  if (token === undefined || others.length > 0) throw new Error(`Not one link in: ${text}`);
  return token;
}
