import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { sha256Hex } from "../files/sha256.ts";
import { wrongState } from "../http/app-error.ts";
import type { Revision } from "../models/revision.ts";

/** What a revision froze, its hash checked over the very text that is stored. */
export function snapshotOf({ id, letter, snapshot, snapshotSha256 }: Revision): Snapshot {
  if (!snapshot) throw wrongState(`Revision ${letter} has not been issued.`);
  if (sha256Hex(Buffer.from(snapshot)) !== snapshotSha256)
    throw new Error(`The frozen text of revision ${id} does not match its hash.`);
  return JSON.parse(snapshot) as Snapshot;
}
