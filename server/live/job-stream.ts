import type { Response } from "express";
import type { Logger } from "pino";
import { AppError } from "../http/app-error.ts";
import type { NumberedSignal } from "../queries/signals-after.ts";

/** What a stream asks each time it looks: who is there still, and what is new to them. Throws an AppError when they may not look any more. */
export type Look = (after: number) => Promise<readonly NumberedSignal[]>;

/** How often a quiet stream shows that it lives and asks whether it still may, ms. Shorter than proxies' usual patience. */
const beatMs = 15_000;
/** A stream ends by itself after this long, ms: the browser comes again, to whatever process there is then. */
const longestMs = 3_600_000;

export type JobStream = { readonly look: () => void; readonly end: () => void };

/**
 * Sends the signals of a job as server-sent events from `after` on. Only one look is under way at a time; being told meanwhile makes one
 * more. A reader that may not look any more, or does not take what is sent, is cut off. With `once` it ends after what is there. `onEnd` is
 * called once.
 */
export function openJobStream(
  response: Response,
  { after, look, log, once, onEnd }: { after: number; look: Look; log: Logger; once: boolean; onEnd: () => void },
): JobStream {
  let sent = after;
  let isLooking = false;
  let isTold = false;
  let isEnded = false;
  const beat = setInterval(() => {
    response.write(": still here\n\n");
    void lookNow();
  }, beatMs);
  const late = setTimeout(end, longestMs);

  function end(): void {
    if (isEnded) return;
    isEnded = true;
    clearInterval(beat);
    clearTimeout(late);
    response.end();
    onEnd();
  }

  async function lookNow(): Promise<void> {
    isTold = true;
    if (isLooking) return;
    isLooking = true;
    try {
      while (isTold && !isEnded) {
        isTold = false;
        const signals = await look(sent);
        for (const { number, kind, id } of signals) {
          if (isEnded) return;
          response.write(`id: ${number}\nevent: signal\ndata: ${JSON.stringify({ kind, id })}\n\n`);
          sent = number;
          isTold = true;
        }
        // Nobody reads any more what has piled up.
        if (response.writableLength > mostWaitingBytes) end();
      }
      if (once) end();
    } catch (error) {
      if (!(error instanceof AppError)) log.error({ err: error }, "A stream of signals broke");
      end();
    } finally {
      isLooking = false;
    }
  }

  response.status(200);
  response.set({
    "Content-Type": "text/event-stream; charset=utf-8",
    // no-transform keeps the compression, and proxies, from holding events back.
    "Cache-Control": "no-store, no-transform",
    "X-Accel-Buffering": "no",
  });
  response.flushHeaders();
  response.write(`retry: ${retryMs}\nid: ${after}\nevent: begun\ndata: {}\n\n`);
  response.on("close", end);
  if (response.closed) end();
  void lookNow();
  return { look: () => void lookNow(), end };
}

const mostWaitingBytes = 1_000_000;
/** How long the browser waits before it comes again, ms. */
const retryMs = 2_000;

/** Where a reader wants to go on from: what its browser says it had last, else what it asked for; null for from now on. */
export function wantedAfter(header: string | undefined, asked: number | undefined): number | null {
  if (header !== undefined && /^\d{1,15}$/.test(header)) return Number(header);
  return asked ?? null;
}
