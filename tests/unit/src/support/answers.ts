import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { vi } from "vitest";

export type Asked = { readonly method: string; readonly path: string; readonly body: unknown };
export type Answer = { readonly status: number; readonly json?: unknown };

/** A server for one test file, reached by every fetch of the page. It keeps what was asked and answers as the test says. */
export async function startAnswers(answer: (asked: Asked) => Answer | Promise<Answer>) {
  const asked: Asked[] = [];
  const server = createServer((request, response) => {
    let text = "";
    request.on("data", (chunk: Buffer) => {
      text += chunk.toString();
    });
    request.on("end", async () => {
      const one = {
        method: request.method ?? "",
        path: request.url ?? "",
        body: text === "" ? null : JSON.parse(text),
      };
      asked.push(one);
      const { status, json } = await answer(one);
      response
        .writeHead(status, { "content-type": "application/json" })
        .end(json === undefined ? "" : JSON.stringify(json));
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const fetchOfNode = globalThis.fetch;
  vi.stubGlobal("fetch", (path: string, { signal: _, ...init }: RequestInit = {}) => fetchOfNode(base + path, init));
  return {
    asked,
    end: () => {
      vi.unstubAllGlobals();
      server.close();
    },
  };
}
