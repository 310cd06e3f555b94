import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import type { TracedPicture } from "#shared/tracing/traced-picture.ts";

/** What the page asks the tracing worker: to keep a picture, and to trace the kept one. */
export type TraceRequest =
  | { readonly kind: "open"; readonly file: Blob }
  | { readonly kind: "trace"; readonly number: number; readonly choices: TraceChoices };

/** What it answers. `reason` is for the reader; null means that this browser can't read the picture. */
export type TraceAnswer =
  | { readonly kind: "traced"; readonly number: number; readonly traced: TracedPicture }
  | { readonly kind: "refused"; readonly number: number; readonly reason: string }
  | { readonly kind: "unreadable" };
