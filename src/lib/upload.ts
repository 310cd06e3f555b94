import type { z } from "zod";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { addressOf, problemOf, unreachable, writeHeaders } from "./api-client.ts";

/**
 * Sends one file in the field `file` and reports the share sent so far (0 to 1); `fetch` cannot report it.
 * Throws ApiProblem when refused, and an AbortError when given up.
 */
export function upload<E extends Endpoint>(
  endpoint: E,
  options: {
    readonly params: z.input<E["params"]>;
    readonly file: File;
    readonly signal: AbortSignal;
    readonly onProgress: (share: number) => void;
  },
): Promise<z.output<E["result"]>> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    const giveUp = () => request.abort();
    request.open(
      endpoint.method,
      addressOf(endpoint, { params: options.params } as Parameters<typeof addressOf<E>>[1]),
    );
    for (const [name, value] of Object.entries(writeHeaders)) request.setRequestHeader(name, value);
    request.setRequestHeader("Accept", "application/json");
    request.upload.onprogress = (event) => {
      if (event.lengthComputable && event.total > 0) options.onProgress(event.loaded / event.total);
    };
    request.onload = () => {
      if (request.status < 200 || request.status > 299) {
        reject(problemOf(request.status, request.responseText));
        return;
      }
      try {
        resolve(JSON.parse(request.responseText) as z.output<E["result"]>);
      } catch {
        reject(problemOf(500, request.responseText));
      }
    };
    request.onerror = () => reject(unreachable());
    request.onabort = () => reject(new DOMException("The upload was given up.", "AbortError"));
    request.onloadend = () => options.signal.removeEventListener("abort", giveUp);
    options.signal.addEventListener("abort", giveUp);
    const form = new FormData();
    form.append("file", options.file);
    request.send(form);
    if (options.signal.aborted) giveUp();
  });
}
