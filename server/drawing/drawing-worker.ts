import { buildSnapshot } from "#shared/drawing/build-snapshot.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { OutOfReach } from "#shared/geometry/clipper-kernel.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { loadKernel } from "../artwork/load-kernel.ts";
import { canonicalJson } from "../files/canonical-json.ts";
import { sha256Hex } from "../files/sha256.ts";
import { renderProof } from "../pdf/proof.ts";
import { answerQuestions } from "../threads/answer-questions.ts";

/** What a revision is frozen from; all but the kernel, which each thread loads for itself. */
export type FreezeInput = Omit<Parameters<typeof buildSnapshot>[0], "kernel">;

/** The frozen text in its one spelling, its hash, and the findings that keep it from being issued. */
export type Frozen = { readonly text: string; readonly sha256: string; readonly stops: readonly Finding[] };

export type DrawingQuestion =
  | { readonly what: "freeze"; readonly input: FreezeInput }
  | { readonly what: "proof"; readonly snapshot: Snapshot; readonly sha256: string };
export type DrawingAnswer =
  | { readonly what: "freeze"; readonly frozen: Frozen }
  /** A piece reaches farther than geometry can be computed. */
  | { readonly what: "out of reach" }
  | { readonly what: "proof"; readonly pdf: Uint8Array };

answerQuestions<DrawingQuestion, DrawingAnswer>(async (question) =>
  question.what === "freeze"
    ? freeze({ ...question.input, kernel: await loadKernel() })
    : { what: "proof", pdf: await renderProof(question.snapshot, question.sha256) },
);

function freeze(input: Parameters<typeof buildSnapshot>[0]): DrawingAnswer {
  try {
    const snapshot = buildSnapshot(input);
    const text = canonicalJson(snapshot);
    const stops = snapshot.findings.filter(({ severity }) => severity === "stop");
    return { what: "freeze", frozen: { text, sha256: sha256Hex(text), stops } };
  } catch (error) {
    if (error instanceof OutOfReach) return { what: "out of reach" };
    throw error;
  }
}
