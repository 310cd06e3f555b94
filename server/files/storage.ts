import type { Readable } from "node:stream";

/**
 * Where files are kept, under generated names. A stored file is never changed; `keep` returns once the bytes are safe
 * (flushed to disk), so that a row written after it never points at nothing.
 */
export type Storage = {
  /** Moves a finished file into the store under `key`. Keeping the same key again is allowed and changes nothing. */
  readonly keepFile: (key: string, temporaryPath: string) => Promise<void>;
  readonly keepBytes: (key: string, bytes: Uint8Array) => Promise<void>;
  readonly read: (key: string) => Promise<Uint8Array>;
  readonly stream: (key: string) => Promise<Readable>;
  readonly remove: (key: string) => Promise<void>;
  /** A folder on the same disk for files not yet accepted. Emptied of leftovers at start. */
  readonly quarantineDir: string;
};
