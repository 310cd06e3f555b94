import { calculations } from "#shared/calculations/definitions.ts";
import { loadKernel } from "@/lib/load-kernel.ts";
import { type ExamplesAnswer, workedExamples } from "./worked-examples.ts";

/** Computes every example once, as soon as it starts: the kernel that some of them need may not load in a page. */
async function answer(): Promise<ExamplesAnswer> {
  try {
    return { ok: true, examples: workedExamples(calculations, await loadKernel()) };
  } catch (error) {
    return { ok: false, reason: error instanceof Error ? error.message : String(error) };
  }
}

void answer().then((message) => postMessage(message));
