import { useEffect, useEffectEvent, useRef, useState } from "react";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import { createEngine, type Engine } from "./engine-client.ts";
import type { Mends, MendsOutcome, Picture, PictureInput } from "./picture-messages.ts";

/** A drawing of a document, with what it was made of. */
export type Drawn = { readonly input: PictureInput; readonly mends: Mends } & NonNullable<Picture["drawing"]>;

type Engineering = {
  /** The newest figures, and the document that they are of. */
  readonly figures: { readonly figures: Figures; readonly of: MockupDocument } | null;
  /** The newest drawing that could be made; it can be older than the figures. */
  readonly drawn: Drawn | null;
  /** Why the newest one could not be made. */
  readonly failure: string | null;
};

/** Figures and drawings of `input` from a worker, the newest that there are. null waits. */
export function useEngine(input: PictureInput | null): Engineering {
  const [made, setMade] = useState<Engineering>({ figures: null, drawn: null, failure: null });
  const engine = useRef<Engine | null>(null);
  const latestInput = useEffectEvent(() => input);

  useEffect(() => {
    const worker = new Worker(new URL("./engine.worker.ts", import.meta.url), { type: "module", name: "engine" });
    worker.addEventListener("error", () =>
      setMade((before) => ({ ...before, failure: "The part of the page that draws did not start." })),
    );
    const keepMends = ({ input: of, mends }: { input: PictureInput; mends: MendsOutcome }) =>
      setMade((before) => {
        if (!mends.ok) return { ...before, failure: mends.reason };
        return before.drawn?.input === of ? { ...before, drawn: { ...before.drawn, mends: mends.list } } : before;
      });
    const started = createEngine(
      worker,
      ({ input: of, outcome }) => {
        setMade((before) => {
          if (!outcome.ok) return { ...before, failure: outcome.reason };
          const { figures, drawing } = outcome.picture;
          const drawn = drawing === null ? before.drawn : { input: of, mends: [], ...drawing };
          return { figures: { figures, of: of.document }, drawn, failure: null };
        });
      },
      keepMends,
    );
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
  return made;
}
