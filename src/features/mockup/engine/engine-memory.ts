import type { Kernel } from "#shared/geometry/kernel.ts";
import { type RememberingKernel, rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { reuseUnchanged } from "#shared/mockup/reuse-unchanged.ts";
import type { PictureInput } from "./picture-messages.ts";

/**
 * Keeps what was worked out for one picture for the next, which mostly differs in a piece or two. A document comes as a
 * copy over the worker's border, so its unchanged parts are first exchanged for those that are known.
 */
export function createEngineMemory(): {
  readonly take: <T extends PictureInput>(input: T, kernel: Kernel) => { readonly input: T; readonly kernel: Kernel };
} {
  let last: MockupDocument | null = null;
  // Apart, so that the many small questions of a drag don't push out what the whole picture needs after it.
  const kernels = new Map<PictureInput["what"], RememberingKernel>();
  return {
    take: (input, kernel) => {
      const document = reuseUnchanged(last, input.document);
      last = document;
      const remembering = kernels.get(input.what) ?? rememberingKernel(kernel);
      kernels.set(input.what, remembering);
      remembering.startRun();
      return { input: { ...input, document }, kernel: remembering };
    },
  };
}
