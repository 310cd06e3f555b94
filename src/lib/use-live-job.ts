import { type QueryClient, useQueryClient } from "@tanstack/react-query";
import { useEffect } from "react";
import { type AddressOf, addresses } from "#shared/contracts/addresses.ts";
import type { JobSignal, streamJobSignals } from "#shared/contracts/job-signals.ts";
import { addressOf } from "./api-client.ts";
import { keys } from "./query-keys.ts";
import { isAboutRevision } from "./revision-keys.ts";

const signalsAt: AddressOf<typeof streamJobSignals> = addresses.streamJobSignals;

/** A stream that the server refused is not tried again by the browser: we do, after this long, ms. */
const againMs = 30_000;

/**
 * Keeps what is shown of a job true while others change it: the server tells what changed, and the answers about it are asked for anew.
 * A broken connection is made again by the browser, which says what it had last. Null for a job that is not known yet.
 */
export function useLiveJob(shop: string, jobId: string | null): void {
  const client = useQueryClient();
  useEffect(() => {
    if (jobId === null) return;
    const job = jobId;
    let source: EventSource | null = null;
    let again: ReturnType<typeof setTimeout> | undefined;

    function open() {
      const opened = new EventSource(addressOf(signalsAt, { params: { shop, jobId: job } }));
      source = opened;
      // What changed between the page's own answers and this moment.
      opened.addEventListener("begun", () => refresh(client, { shop, jobId: job }, "note"), { once: true });
      opened.addEventListener("signal", ({ data }: MessageEvent<string>) => {
        const { kind }: JobSignal = JSON.parse(data);
        refresh(client, { shop, jobId: job }, kind);
      });
      opened.addEventListener("error", () => {
        if (opened.readyState === EventSource.CLOSED) again = setTimeout(open, againMs);
      });
    }

    function close() {
      clearTimeout(again);
      source?.close();
      source = null;
    }

    // Browsers hold few connections to one server: pages that nobody sees give theirs back, and catch up when they are seen again.
    function handleSight() {
      if (document.hidden) close();
      else if (source === null) open();
    }

    handleSight();
    document.addEventListener("visibilitychange", handleSight);
    return () => {
      document.removeEventListener("visibilitychange", handleSight);
      close();
    };
  }, [client, shop, jobId]);
}

function refresh(
  client: QueryClient,
  { shop, jobId }: { readonly shop: string; readonly jobId: string },
  kind: JobSignal["kind"],
): void {
  // A drawing never changes once it is issued, and it is large: only a revision's standing asks for it again.
  const withDrawing = kind === "revision";
  void client.invalidateQueries({
    predicate: ({ queryKey }) => isAboutRevision(queryKey, shop) && (withDrawing || queryKey.at(-1) !== "sheet"),
  });
  void client.invalidateQueries({ queryKey: keys.job(shop, jobId) });
  void client.invalidateQueries({ queryKey: keys.jobs(shop) });
}
