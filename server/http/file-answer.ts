import type { Readable } from "node:stream";

/** Bytes as an answer, always with a fixed type and nosniff. `inline` only for types that can't carry script. */
export class FileAnswer {
  readonly stream: Readable;
  readonly byteSize: number;
  readonly mediaType: string;
  readonly fileName: string;
  readonly disposition: "inline" | "attachment";

  constructor(answer: {
    stream: Readable;
    byteSize: number;
    mediaType: string;
    fileName: string;
    disposition: "inline" | "attachment";
  }) {
    this.stream = answer.stream;
    this.byteSize = answer.byteSize;
    this.mediaType = answer.mediaType;
    this.fileName = answer.fileName;
    this.disposition = answer.disposition;
  }
}
