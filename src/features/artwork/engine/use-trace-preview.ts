import { useEffect, useRef, useState } from "react";
import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import type { TracedPicture } from "#shared/tracing/traced-picture.ts";
import type { TraceAnswer, TraceRequest } from "./trace-messages.ts";

/** Where a preview stands. What was traced last stays to be seen while the next is worked out. */
export type TracePreview = {
  readonly step: "working" | "traced" | "refused" | "unreadable";
  readonly traced: TracedPicture | null;
  readonly reason: string | null;
};

/** A choice that changes again within this time is not traced for itself. */
const settleMs = 250;

/** Traces the picture at `address` with the choices, in a worker, each time they change. */
export function useTracePreview(address: string, choices: TraceChoices): TracePreview {
  const [preview, setPreview] = useState<TracePreview>({ step: "working", traced: null, reason: null });
  const worker = useRef<Worker | null>(null);
  const asked = useRef(0);
  useEffect(() => {
    const own = new Worker(new URL("./trace.worker.ts", import.meta.url), { type: "module", name: "trace" });
    const gone = new AbortController();
    const fail = () => setPreview((before) => ({ ...before, step: "unreadable" }));
    own.addEventListener("message", ({ data }: MessageEvent<TraceAnswer>) => {
      if (data.kind === "unreadable") fail();
      else if (data.number !== asked.current) return;
      else if (data.kind === "refused") setPreview({ step: "refused", traced: null, reason: data.reason });
      else setPreview({ step: "traced", traced: data.traced, reason: null });
    });
    own.addEventListener("error", fail);
    worker.current = own;
    fetch(address, { signal: gone.signal })
      .then((answer) => (answer.ok ? answer.blob() : Promise.reject(new Error("The file did not come."))))
      .then((file) => own.postMessage({ kind: "open", file } satisfies TraceRequest))
      .catch(() => {
        if (!gone.signal.aborted) fail();
      });
    return () => {
      gone.abort();
      own.terminate();
    };
  }, [address]);
  useEffect(() => {
    setPreview((before) => (before.step === "unreadable" ? before : { ...before, step: "working" }));
    const timer = setTimeout(() => {
      asked.current += 1;
      worker.current?.postMessage({ kind: "trace", number: asked.current, choices } satisfies TraceRequest);
    }, settleMs);
    return () => clearTimeout(timer);
  }, [choices]);
  return preview;
}
