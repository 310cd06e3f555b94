import { readFile, writeFile } from "node:fs/promises";
import { sniffArtwork } from "../artwork/sniff-artwork.ts";
import { AppError } from "../http/app-error.ts";
import type { ReceivedFile } from "../http/uploads.ts";
import { shopLine } from "../threads/shop-line.ts";
import { workerInTurn } from "../threads/worker-in-turn.ts";
import type { PreparedBytes } from "./prepare-bytes.ts";

/** A photo in quarantine that is a JPEG of ours. */
export type PreparedPhoto = ReceivedFile & { readonly widthPx: number; readonly heightPx: number };

/**
 * Decoding takes some 20 bytes a pixel and 150 ns, so size is limited by the header, before anything is decoded. Few photos may wait, and
 * no shop fills the line alone.
 */
export const photoLimits = {
  fileBytes: 30_000_000,
  pixels: 40_000_000,
  timeMs: 30_000,
  waiting: 4,
  ofAShop: 2,
} as const;

const program = { bundle: "photo-worker.mjs", source: "../photos/photo-worker.ts", memoryMb: 512 } as const;
const line = shopLine();
const worker = workerInTurn<Uint8Array, PreparedBytes>(program, { questionsEach: 20 });

/**
 * Looks at a photo by its content and makes it ready to show, in a thread of its own; what was in quarantine is
 * overwritten by it. `shopId` is the shop that brings it. Refuses in words what is no JPEG or PNG, too many pixels, and what can't be decoded.
 */
export async function preparePhoto(file: ReceivedFile, shopId: string): Promise<PreparedPhoto> {
  const bytes = await readFile(file.path);
  const { kind, pixels } = sniffArtwork(bytes);
  if (kind !== "jpeg" && kind !== "png")
    throw new AppError("unsupported_type", {
      detail: "This is no JPEG or PNG. A phone sends its photos as JPEG when it is told to keep them compatible.",
    });
  if (!pixels) throw unreadable();
  if (pixels.width * pixels.height > photoLimits.pixels)
    throw new AppError("too_large", {
      detail: `The photo has ${Math.round((pixels.width * pixels.height) / 1e6)} million pixels. Up to 40 million can be taken: make it smaller first.`,
    });
  if (worker.waiting() >= photoLimits.waiting || line.of(shopId) >= photoLimits.ofAShop)
    throw new AppError("too_many_requests", {
      detail: "Other photos are being made ready right now. Try again in a minute.",
    });
  const copy = Uint8Array.from(bytes);
  const told = await line.stand(shopId, () =>
    worker.ask(copy, { timeMs: photoLimits.timeMs, transfer: [copy.buffer] }),
  );
  if (told.kind === "late")
    throw new AppError("too_large", { detail: "The photo takes too long to decode. Make it smaller and try again." });
  if (told.kind === "fault") throw new Error(`Making a photo ready broke: ${told.message}`);
  if (!told.answer.ok) throw unreadable();
  const { jpeg, widthPx, heightPx } = told.answer;
  await writeFile(file.path, jpeg);
  return { ...file, byteSize: jpeg.byteLength, widthPx, heightPx };
}

/** Ends the worker that waits for the next photo, if there is one. */
export const stopPhotos = (): Promise<void> => worker.stop();

const unreadable = () =>
  new AppError("unsupported_type", {
    detail: "The photo is not complete. Send it again, or open it and save it as a new JPEG.",
  });
