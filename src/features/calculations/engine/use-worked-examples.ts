import { useCallback, useEffect, useRef, useState } from "react";
import type { Examples, ExamplesAnswer } from "./worked-examples.ts";

export type ExamplesState =
  | { readonly step: "computing" }
  | { readonly step: "computed"; readonly examples: Examples }
  | { readonly step: "failed"; readonly reason: string };

/** The worked examples, computed anew by a worker whenever the page is opened or somebody asks again. */
export function useWorkedExamples(): { readonly state: ExamplesState; readonly compute: () => void } {
  const [state, setState] = useState<ExamplesState>({ step: "computing" });
  const running = useRef<Worker | null>(null);

  const compute = useCallback(() => {
    running.current?.terminate();
    setState({ step: "computing" });
    const worker = new Worker(new URL("./examples.worker.ts", import.meta.url), { type: "module", name: "examples" });
    running.current = worker;
    worker.addEventListener("message", ({ data }: MessageEvent<ExamplesAnswer>) => {
      setState(data.ok ? { step: "computed", examples: data.examples } : { step: "failed", reason: data.reason });
      worker.terminate();
    });
    worker.addEventListener("error", () =>
      setState({ step: "failed", reason: "The part of the page that computes did not start." }),
    );
  }, []);

  useEffect(() => {
    compute();
    return () => running.current?.terminate();
  }, [compute]);
  return { state, compute };
}
