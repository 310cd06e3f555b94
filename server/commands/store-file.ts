import { newId } from "../db/new-id.ts";
import { sha256Hex } from "../files/sha256.ts";
import { sha256OfFile } from "../files/sha256-file.ts";
import type { Context } from "../http/context.ts";
import type { ReceivedFile } from "../http/uploads.ts";
import { StoredFile } from "../models/stored-file.ts";

type Storing = Pick<Context, "services" | "transaction" | "now">;

/** Keeps an accepted upload. The same bytes in the same shop are kept once; another shop's never count. */
export async function storeReceivedFile(
  context: Storing,
  { shopId, file, mediaType }: { shopId: string; file: ReceivedFile; mediaType: string },
): Promise<StoredFile> {
  const sha256 = await sha256OfFile(file.path);
  return store(context, { shopId, sha256, byteSize: file.byteSize, mediaType }, (key) =>
    context.services.storage.keepFile(key, file.path),
  );
}

/** Keeps bytes that we made. */
export async function storeBytes(
  context: Storing,
  { shopId, bytes, mediaType }: { shopId: string; bytes: Uint8Array; mediaType: string },
): Promise<StoredFile> {
  return store(context, { shopId, sha256: sha256Hex(bytes), byteSize: bytes.byteLength, mediaType }, (key) =>
    context.services.storage.keepBytes(key, bytes),
  );
}

/**
 * The bytes are safe on disk before the row that names them is committed: a crash between the two leaves a file that
 * nothing names, never a row that names nothing.
 */
async function store(
  { services, transaction, now }: Storing,
  { shopId, sha256, byteSize, mediaType }: { shopId: string; sha256: string; byteSize: number; mediaType: string },
  keep: (key: string) => Promise<void>,
): Promise<StoredFile> {
  const known = await StoredFile.findOne({ where: { shopId, sha256 }, transaction });
  if (known) return known;
  const id = newId();
  const storageKey = `${shopId}/${id}`;
  await keep(storageKey);
  // Not findOrCreate: it makes a temporary function, which the application's role may not.
  await StoredFile.bulkCreate([{ id, shopId, sha256, byteSize, mediaType, storageKey, createdAt: now }], {
    ignoreDuplicates: true,
    transaction,
  });
  const row = await StoredFile.findOne({ where: { shopId, sha256 }, transaction });
  if (!row) throw new Error("A stored file just made is not there.");
  // Another request brought the same bytes at the same moment and was first.
  if (row.id !== id) await services.storage.remove(storageKey);
  return row;
}
