import { randomBytes } from "node:crypto";
import { mkdir, readdir, readFile, rename, rm, writeFile } from "node:fs/promises";
import type { AddressInfo } from "node:net";
import { join } from "node:path";
import { type AddressObject, type ParsedMail, simpleParser } from "mailparser";
import type { Logger } from "pino";
import { SMTPServer } from "smtp-server";
import { type CaughtMail, type MailSink, shopHeader } from "./sink.ts";

const kept = 500;
const longestMail = 1_000_000;
const idForm = /^\d{13}-(?:[0-9a-f-]{36}|none)-[0-9a-f]{8}$/;

/**
 * Opens the sink on a free port of loopback. Each mail is a file named by time and shop, so that several processes can
 * share the folder and a list needs no index. The newest 500 are kept.
 */
export async function openLocalSink({ dir, log }: { dir: string; log: Logger }): Promise<MailSink> {
  await mkdir(dir, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    disableReverseLookup: true,
    size: longestMail,
    onData(stream, _session, done) {
      keep(dir, stream).then(
        () => done(),
        (error: unknown) => {
          log.error({ err: error }, "The mail sink could not keep a mail");
          done(new Error("The mail could not be kept"));
        },
      );
    },
  });
  server.on("error", (error) => log.warn({ err: error }, "The mail sink had trouble with a connection"));
  await new Promise<void>((resolve, reject) => {
    server.server.once("error", reject);
    server.listen(0, "127.0.0.1", resolve);
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    async list({ shopId, limit, before }) {
      const ids = (await idsNewestFirst(dir)).filter((id) => shopOf(id) === shopId && (before === null || id < before));
      const mails = await Promise.all(ids.slice(0, limit).map((id) => load(dir, id)));
      return mails.filter((mail) => mail !== null);
    },
    find: async ({ shopId, id }) => (idForm.test(id) && shopOf(id) === shopId ? load(dir, id) : null),
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

const fileOf = (dir: string, id: string): string => join(dir, `${id}.eml`);
const shopOf = (id: string): string => id.slice(14, -9);

async function idsNewestFirst(dir: string): Promise<string[]> {
  const names = await readdir(dir);
  return names
    .filter((name) => name.endsWith(".eml"))
    .map((name) => name.slice(0, -4))
    .filter((id) => idForm.test(id))
    .sort()
    .reverse();
}

async function keep(dir: string, stream: AsyncIterable<Buffer>): Promise<void> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk);
  const bytes = Buffer.concat(chunks);
  const shop = String((await simpleParser(bytes)).headers.get(shopHeader) ?? "");
  const id = `${Date.now()}-${/^[0-9a-f-]{36}$/.test(shop) ? shop : "none"}-${randomBytes(4).toString("hex")}`;
  const unfinished = join(dir, `${id}.part`);
  await writeFile(unfinished, bytes, { mode: 0o600 });
  await rename(unfinished, fileOf(dir, id));
  for (const old of (await idsNewestFirst(dir)).slice(kept)) await rm(fileOf(dir, old), { force: true });
}

/** Null when the mail has just been cleared away. */
async function load(dir: string, id: string): Promise<CaughtMail | null> {
  const bytes = await readFile(fileOf(dir, id)).catch((error: NodeJS.ErrnoException) => {
    if (error.code === "ENOENT") return null;
    throw error;
  });
  if (!bytes) return null;
  const mail: ParsedMail = await simpleParser(bytes, { skipHtmlToText: true, skipTextToHtml: true });
  return {
    id,
    from: mail.from?.text ?? "",
    to: addressesOf(mail.to),
    subject: mail.subject ?? "",
    at: new Date(Number(id.slice(0, 13))),
    text: mail.text ?? "",
  };
}

function addressesOf(to: AddressObject | AddressObject[] | undefined): string {
  return [to ?? []]
    .flat()
    .map(({ text }) => text)
    .join(", ");
}
