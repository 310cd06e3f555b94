import type { ReadContext } from "../http/context.ts";
import { FileAnswer } from "../http/file-answer.ts";
import type { StoredFile } from "../models/stored-file.ts";

/** A stored file as an answer, with the type it was stored under. */
export async function answerFile(
  { services }: ReadContext,
  file: StoredFile,
  { fileName, disposition }: { fileName: string; disposition: "inline" | "attachment" },
): Promise<FileAnswer> {
  return new FileAnswer({
    stream: await services.storage.stream(file.storageKey),
    byteSize: file.byteSize,
    mediaType: file.mediaType,
    fileName,
    disposition,
  });
}
