import createClipper from "clipper2-wasm/dist/es/clipper2z.js";
import wasmUrl from "clipper2-wasm/dist/es/clipper2z.wasm?url";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";

let loading: Promise<Kernel> | undefined;

/**
 * The geometry kernel in the browser, fetched once; a failed fetch is tried again at the next call. Its glue makes functions
 * from text, which the pages' content policy forbids: load it in the workers that the server lets do so only.
 */
export function loadKernel(): Promise<Kernel> {
  loading ??= createClipper({ locateFile: () => wasmUrl })
    .then(clipperKernel)
    .catch((error: unknown) => {
      loading = undefined;
      throw error;
    });
  return loading;
}
