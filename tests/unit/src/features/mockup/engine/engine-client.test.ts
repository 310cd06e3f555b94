import { describe, expect, it } from "vitest";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import { createEngine } from "@/features/mockup/engine/engine-client.ts";
import type { PictureAnswer, PictureInput, PictureRequest } from "@/features/mockup/engine/picture-messages.ts";
import { emptyMockup } from "../sample-mockup.ts";

/** The other end of the port, which answers when the test says so. */
function startPort() {
  const asked: PictureRequest[] = [];
  let listen: (event: { data: PictureAnswer }) => void = () => undefined;
  return {
    asked,
    answer: (sequence: number) => listen({ data: { sequence, outcome: { ok: false, reason: `answer ${sequence}` } } }),
    mend: (sequence: number) => listen({ data: { sequence, mends: { ok: true, list: [] } } }),
    port: {
      postMessage: (request: PictureRequest) => void asked.push(request),
      addEventListener: (_: "message", listener: (event: { data: PictureAnswer }) => void) => {
        listen = listener;
      },
      terminate: () => undefined,
    },
  };
}

const input = (quantity: number): PictureInput => ({
  document: emptyMockup({ quantity }),
  context: usualContext,
  limits: defaultLimits,
  paperScale: 5,
  dimensions: true,
  what: "all",
});

const noMends = () => {
  throw new Error("no mends were sent");
};

describe("asking the engine", () => {
  it("hands on what mends the picture that was answered last, and nothing of an older one", () => {
    const { port, answer, mend } = startPort();
    const mended: number[] = [];
    const engine = createEngine(
      port,
      () => undefined,
      ({ input: of }) => mended.push(of.document.quantity),
    );
    engine.ask(input(1));
    mend(1);
    answer(1);
    mend(1);
    engine.ask(input(2));
    mend(1);
    answer(2);
    mend(1);
    mend(2);
    engine.close();
    mend(2);
    expect(mended).toEqual([1, 1, 2]);
  });

  it("has one question under way and lets only the newest one wait", () => {
    const { port, asked, answer } = startPort();
    const results: number[] = [];
    const engine = createEngine(port, ({ input: of }) => results.push(of.document.quantity), noMends);
    for (const quantity of [1, 2, 3, 4]) engine.ask(input(quantity));
    expect(asked.map(({ document }) => document.quantity)).toEqual([1]);
    answer(1);
    expect(asked.map(({ document }) => document.quantity)).toEqual([1, 4]);
    answer(2);
    expect(results).toEqual([1, 4]);
  });

  it("drops answers to what was not asked, was answered, or comes after it was closed", () => {
    const { port, answer } = startPort();
    const results: number[] = [];
    const engine = createEngine(port, ({ input: of }) => results.push(of.document.quantity), noMends);
    engine.ask(input(1));
    answer(9);
    answer(1);
    answer(1);
    engine.ask(input(2));
    engine.close();
    answer(2);
    expect(results).toEqual([1]);
  });
});
