import type { Readable } from "node:stream";

/** Bytes as an answer, always with a fixed type and nosniff, in a sandbox without scripts. */
export class FileAnswer {
  readonly stream: Readable;
  readonly byteSize: number;
  readonly mediaType: string;
  readonly fileName: string;
  readonly disposition: "inline" | "attachment";
  /** What never changes under its address may be kept by the reader's own browser; a later refusal then shows an hour late at most. */
  readonly keepForSeconds: number;

  constructor(answer: {
    stream: Readable;
    byteSize: number;
    mediaType: string;
    fileName: string;
    disposition: "inline" | "attachment";
    keepForSeconds?: number;
  }) {
    this.stream = answer.stream;
    this.byteSize = answer.byteSize;
    this.mediaType = answer.mediaType;
    this.fileName = answer.fileName;
    this.disposition = answer.disposition;
    this.keepForSeconds = answer.keepForSeconds ?? 0;
  }
}
