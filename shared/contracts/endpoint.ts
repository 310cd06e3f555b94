import type { z } from "zod";

type Shape = z.ZodType;

/**
 * One definition of a request for both sides: where it goes, what it takes and what it gives.
 * The server parses `params`, `query` and `body` (unknown fields refused) and checks `result` before it sends;
 * the browser takes its types from the same object.
 */
export type Endpoint<
  P extends Shape = Shape,
  Q extends Shape = Shape,
  B extends Shape = Shape,
  R extends Shape = Shape,
> = {
  readonly method: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  /** As Express reads it: /api/shops/:shop/jobs/:jobId */
  readonly path: string;
  readonly summary: string;
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly result: R;
  /** `multipart`: the body carries a file; `file`: the answer is bytes; `stream`: it is events as they come. `result` then describes nothing. */
  readonly form?: "multipart" | "file" | "stream";
  readonly status?: 200 | 201 | 202 | 204;
};

export function endpoint<P extends Shape, Q extends Shape, B extends Shape, R extends Shape>(
  definition: Endpoint<P, Q, B, R>,
): Endpoint<P, Q, B, R> {
  return definition;
}
