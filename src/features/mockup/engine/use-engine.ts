import { useEffect, useEffectEvent, useRef, useState } from "react";
import { createEngine, type Engine } from "./engine-client.ts";
import type { Picture, PictureInput } from "./picture-messages.ts";

/** A picture with what it was made of. */
export type DrawnPicture = { readonly input: PictureInput; readonly picture: Picture };

type Drawn = {
  /** The newest picture that could be made of the input or of what it was a moment ago. */
  readonly drawn: DrawnPicture | null;
  /** Why the newest one could not be made. */
  readonly failure: string | null;
};

/** Pictures of `input` from a worker, the newest that there is. null waits. */
export function useEngine(input: PictureInput | null): Drawn {
  const [drawn, setDrawn] = useState<Drawn>({ drawn: null, failure: null });
  const engine = useRef<Engine | null>(null);
  const latestInput = useEffectEvent(() => input);

  useEffect(() => {
    const worker = new Worker(new URL("./engine.worker.ts", import.meta.url), { type: "module", name: "engine" });
    worker.addEventListener("error", () =>
      setDrawn((before) => ({ ...before, failure: "The part of the page that draws did not start." })),
    );
    const started = createEngine(worker, ({ input: of, outcome }) => {
      if (outcome.ok) setDrawn({ drawn: { input: of, picture: outcome.picture }, failure: null });
      else setDrawn((before) => ({ ...before, failure: outcome.reason }));
    });
    engine.current = started;
    const waiting = latestInput();
    if (waiting !== null) started.ask(waiting);
    return () => {
      engine.current = null;
      started.close();
    };
  }, []);

  const asked = useRef<PictureInput | null>(null);
  useEffect(() => {
    if (input === null || input === asked.current) return;
    asked.current = input;
    engine.current?.ask(input);
  }, [input]);
  return drawn;
}
