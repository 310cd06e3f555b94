import { ArtworkRefused } from "#shared/artwork/refusals.ts";
import { type PictureFile, tracePicture } from "#shared/tracing/trace-picture.ts";
import type { TraceAnswer, TraceRequest } from "./trace-messages.ts";

let hand: (file: Blob) => void = () => undefined;
/** Asked for before the file has come, a trace waits for it. */
const opened: Promise<PictureFile> = new Promise<Blob>((resolve) => {
  hand = resolve;
}).then(readPicture);

/** Pictures are traced here as the server traces them, so that a choice shows at once and the page never waits. */
addEventListener("message", ({ data }: MessageEvent<TraceRequest>) => {
  if (data.kind === "open") hand(data.file);
  else void answer(data).then((message) => postMessage(message));
});

async function answer({ number, choices }: Extract<TraceRequest, { kind: "trace" }>): Promise<TraceAnswer> {
  const file = await opened.catch(() => null);
  if (!file) return { kind: "unreadable" };
  try {
    return { kind: "traced", number, traced: tracePicture(file, choices) };
  } catch (error) {
    if (error instanceof ArtworkRefused) return { kind: "refused", number, reason: error.message };
    throw error;
  }
}

/** The pixels as the file has them, turned as its camera says, and no colour changed to suit a screen. */
async function readPicture(file: Blob): Promise<PictureFile> {
  const bitmap = await createImageBitmap(file, { premultiplyAlpha: "none", colorSpaceConversion: "none" });
  const { width, height } = bitmap;
  const context = new OffscreenCanvas(width, height).getContext("2d");
  if (!context) throw new Error("No canvas.");
  context.drawImage(bitmap, 0, 0);
  bitmap.close();
  const { data } = context.getImageData(0, 0, width, height);
  return { picture: { width, height, data }, lossy: file.type === "image/jpeg", density: null, warnings: new Set() };
}
