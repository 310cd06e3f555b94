import { buildSnapshot } from "#shared/drawing/build-snapshot.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import type { RuleInput } from "#shared/dry-fit/rule.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { matchSetAsides, openStops } from "#shared/dry-fit/set-aside.ts";
import { OutOfReach } from "#shared/geometry/clipper-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { loadKernel } from "../artwork/load-kernel.ts";
import { canonicalJson } from "../files/canonical-json.ts";
import { sha256Hex } from "../files/sha256.ts";
import { renderProof } from "../pdf/proof.ts";
import { answerQuestions } from "../threads/answer-questions.ts";

/** What a revision is frozen from; all but the kernel, which each thread loads for itself. */
export type FreezeInput = Omit<Parameters<typeof buildSnapshot>[0], "kernel">;

/** What a dry fit alone is worked out from; figures and kernel come from the thread. */
export type CheckInput = Omit<RuleInput, "figures" | "kernel">;

/** The frozen text in its one spelling, its hash, and the findings that keep it from being issued: stops that nobody set aside. */
export type Frozen = { readonly text: string; readonly sha256: string; readonly stops: readonly Finding[] };

export type DrawingQuestion =
  | { readonly what: "freeze"; readonly input: FreezeInput }
  | { readonly what: "check"; readonly input: CheckInput }
  | { readonly what: "proof"; readonly snapshot: Snapshot; readonly sha256: string };
export type DrawingAnswer =
  | { readonly what: "freeze"; readonly frozen: Frozen }
  | { readonly what: "check"; readonly findings: readonly Finding[] }
  /** A piece reaches farther than geometry can be computed. */
  | { readonly what: "out of reach" }
  | { readonly what: "proof"; readonly pdf: Uint8Array };

answerQuestions<DrawingQuestion, DrawingAnswer>(async (question) => {
  if (question.what === "proof") return { what: "proof", pdf: await renderProof(question.snapshot, question.sha256) };
  const kernel = await loadKernel();
  return withinReach(() =>
    question.what === "freeze" ? freeze({ ...question.input, kernel }) : check(question.input, kernel),
  );
});

function freeze(input: Parameters<typeof buildSnapshot>[0]): DrawingAnswer {
  const snapshot = buildSnapshot(input);
  const text = canonicalJson(snapshot);
  const stops = openStops(matchSetAsides(snapshot.findings, input.setAsides));
  return { what: "freeze", frozen: { text, sha256: sha256Hex(text), stops } };
}

function check(input: CheckInput, kernel: Kernel): DrawingAnswer {
  const figures = computeFigures(input.document, kernel);
  return { what: "check", findings: runDryFit({ ...input, figures, kernel }) };
}

function withinReach(answer: () => DrawingAnswer): DrawingAnswer {
  try {
    return answer();
  } catch (error) {
    if (error instanceof OutOfReach) return { what: "out of reach" };
    throw error;
  }
}
