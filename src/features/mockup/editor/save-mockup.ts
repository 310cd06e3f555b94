import { type Mockup, mockupSchema, saveMockup } from "#shared/contracts/mockups.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { ApiProblem, call } from "@/lib/api-client.ts";

export type SaveOutcome =
  | { readonly kind: "saved"; readonly mockup: Mockup }
  | { readonly kind: "newer"; readonly newer: Mockup }
  | { readonly kind: "unreachable" }
  | { readonly kind: "refused"; readonly why: string };

/** Saves a draft and tells how that went. Throws only what is no answer of the server. */
export async function saveDraft(
  params: { shop: string; jobId: string },
  draft: { version: number; document: MockupDocument },
): Promise<SaveOutcome> {
  try {
    return { kind: "saved", mockup: await call(saveMockup, { params, body: draft }) };
  } catch (error) {
    if (!(error instanceof ApiProblem)) throw error;
    if (error.code === "stale") {
      const newer = mockupSchema.safeParse(error.problem?.extra?.newer);
      if (newer.success) return { kind: "newer", newer: newer.data };
    }
    // A server that is starting again or overrun is one to try again, like a lost connection.
    if (error.code === "unreachable" || error.status >= 500 || error.code === "too_many_requests")
      return { kind: "unreachable" };
    return { kind: "refused", why: error.message };
  }
}
