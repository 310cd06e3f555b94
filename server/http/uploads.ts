import { randomUUID } from "node:crypto";
import { rm } from "node:fs/promises";
import type { Request, Response } from "express";
import multer, { MulterError } from "multer";
import { AppError } from "./app-error.ts";

/** A file in quarantine: nothing about it is believed yet, its name least of all. */
export type ReceivedFile = { readonly path: string; readonly originalName: string; readonly byteSize: number };

/**
 * Takes exactly one file in the field `file` into `dir` under a generated name.
 * Refuses more than `maxBytes` (too_large), other fields, several files, none, or an empty one, and leaves nothing behind then.
 */
export async function receiveFile(
  request: Request,
  response: Response,
  { dir, maxBytes }: { dir: string; maxBytes: number },
): Promise<ReceivedFile> {
  const receive = multer({
    storage: multer.diskStorage({
      destination: dir,
      filename: (_request, _file, done) => done(null, `upload-${randomUUID()}`),
    }),
    limits: { fileSize: maxBytes, files: 1, fields: 0, parts: 2, headerPairs: 40, fieldNameSize: 40 },
    defParamCharset: "utf8",
  }).single("file");
  try {
    await new Promise<void>((resolve, reject) => {
      receive(request, response, (error: unknown) => (error ? reject(error) : resolve()));
    });
  } catch (error) {
    throw refusalOf(error, maxBytes);
  }
  const { file } = request;
  if (!file) throw new AppError("malformed_request", { detail: "No file came. Choose one file and try again." });
  if (file.size === 0) {
    await rm(file.path, { force: true });
    throw new AppError("unsupported_type", { detail: "The file is empty. Export it again and bring in the new one." });
  }
  return { path: file.path, originalName: plainName(file.originalname), byteSize: file.size };
}

function refusalOf(error: unknown, maxBytes: number): unknown {
  if (!(error instanceof MulterError)) {
    const cut =
      error instanceof Error && /Unexpected end of form|Multipart|Malformed|boundary|aborted/i.test(error.message);
    return cut
      ? new AppError("malformed_request", { detail: "The upload broke off. Nothing was kept; try again." })
      : error;
  }
  if (error.code === "LIMIT_FILE_SIZE") {
    return new AppError("too_large", { detail: `Files up to ${Math.floor(maxBytes / 1_000_000)} MB can be taken.` });
  }
  return new AppError("malformed_request", { detail: "Send one file at a time, and nothing beside it." });
}

/** The last part of the name, without control characters, for showing only. */
function plainName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? "";
  const plain = last.replace(/\p{C}/gu, "").trim();
  return [...plain].slice(-120).join("") || "artwork";
}
