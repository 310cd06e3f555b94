import { vi } from "vitest";
import type { JobSignal } from "#shared/contracts/job-signals.ts";
import type { Visitor } from "./visitor.ts";

/** An event as server-sent events write it: `id`, `event` and what is in `data`. */
export type ServerEvent = { readonly id: string; readonly event: string; readonly data: unknown };

export type EventReader = {
  readonly status: number;
  /** All that came so far. */
  readonly events: readonly ServerEvent[];
  readonly signals: () => readonly JobSignal[];
  /** Waits until so many signals came. */
  readonly until: (count: number) => Promise<readonly JobSignal[]>;
  /** Waits until the server has ended the stream. */
  readonly ended: () => Promise<void>;
  readonly leave: () => void;
};

const patience = { timeout: 20_000, interval: 20 };

/** Reads a stream of events as a browser does, by hand: EventSource is no part of Node. */
export async function readEvents(
  baseUrl: string,
  visitor: Visitor,
  path: string,
  headers: Record<string, string> = {},
): Promise<EventReader> {
  const stop = new AbortController();
  const cookie = [...visitor.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
  const response = await fetch(baseUrl + path, { headers: { Cookie: cookie, ...headers }, signal: stop.signal });
  const events: ServerEvent[] = [];
  let isEnded = false;
  void (async () => {
    let text = "";
    const decoder = new TextDecoder();
    try {
      for await (const bytes of response.body ?? []) {
        text += decoder.decode(bytes, { stream: true });
        const whole = text.split("\n\n");
        text = whole.pop() ?? "";
        for (const block of whole) {
          const event = parsed(block);
          if (event) events.push(event);
        }
      }
    } catch (error) {
      if (!stop.signal.aborted) throw error;
    }
    isEnded = true;
  })();
  const signals = () => events.filter(({ event }) => event === "signal").map(({ data }) => data as JobSignal);
  return {
    status: response.status,
    events,
    signals,
    until: (count) =>
      vi.waitFor(() => {
        if (signals().length < count) throw new Error(`${signals().length} of ${count} signals came.`);
        return signals();
      }, patience),
    ended: () =>
      vi.waitFor(() => {
        if (!isEnded) throw new Error("The stream goes on.");
      }, patience),
    leave: () => stop.abort(),
  };
}

function parsed(block: string): ServerEvent | null {
  const fields = new Map(
    block
      .split("\n")
      .filter((line) => !line.startsWith(":"))
      .map((line) => {
        const [name = "", ...rest] = line.split(": ");
        return [name, rest.join(": ")] as const;
      }),
  );
  const data = fields.get("data");
  if (data === undefined) return null;
  return { id: fields.get("id") ?? "", event: fields.get("event") ?? "message", data: JSON.parse(data) };
}
