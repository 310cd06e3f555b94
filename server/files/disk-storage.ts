import { createReadStream } from "node:fs";
import { chmod, mkdir, open, readdir, readFile, rename, rm, stat, unlink } from "node:fs/promises";
import { dirname, join, resolve } from "node:path";
import type { Storage } from "./storage.ts";

const keyForm = /^[a-z0-9][a-z0-9/-]{0,120}$/;

/** Clients' artwork and proofs are nobody else's on this machine. */
const ownFile = 0o600;
const ownFolder = 0o700;

/** Files on the local disk below `root`, for this process's user alone. */
export async function openDiskStorage(root: string): Promise<Storage> {
  const base = resolve(root);
  const quarantineDir = join(base, "quarantine");
  await mkdir(quarantineDir, { recursive: true, mode: ownFolder });
  await emptyLeftovers(quarantineDir);

  const pathOf = (key: string): string => {
    if (!keyForm.test(key) || key.includes("//")) throw new Error(`Not a storage key: ${key}`);
    return join(base, "kept", key);
  };

  async function settle(temporaryPath: string, key: string): Promise<void> {
    const path = pathOf(key);
    await mkdir(dirname(path), { recursive: true, mode: ownFolder });
    await chmod(temporaryPath, ownFile);
    await flush(temporaryPath);
    await rename(temporaryPath, path);
    await flush(dirname(path));
  }

  return {
    quarantineDir,
    keepFile: (key, temporaryPath) => settle(temporaryPath, key),
    async keepBytes(key, bytes) {
      const temporaryPath = join(quarantineDir, `kept-${key.replaceAll("/", "-")}-${process.pid}-${Date.now()}`);
      const file = await open(temporaryPath, "wx", ownFile);
      try {
        await file.writeFile(bytes);
      } finally {
        await file.close();
      }
      await settle(temporaryPath, key);
    },
    read: (key) => readFile(pathOf(key)),
    async stream(key) {
      const path = pathOf(key);
      await stat(path);
      return createReadStream(path);
    },
    remove: (key) => rm(pathOf(key), { force: true }),
  };
}

async function flush(path: string): Promise<void> {
  const handle = await open(path, "r");
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** A process that was killed may leave half-written files; an hour is longer than any upload may take. */
async function emptyLeftovers(dir: string): Promise<void> {
  const oldest = Date.now() - 3_600_000;
  for (const name of await readdir(dir)) {
    const path = join(dir, name);
    if ((await stat(path)).mtimeMs < oldest) await unlink(path);
  }
}
