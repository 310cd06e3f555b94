import createClipper from "clipper2-wasm";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";

let loading: Promise<Kernel> | undefined;

/** The geometry kernel in Node, loaded once per process or worker. */
export function loadKernel(): Promise<Kernel> {
  loading ??= createClipper().then(clipperKernel);
  return loading;
}
