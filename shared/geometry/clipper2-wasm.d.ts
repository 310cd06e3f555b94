/** The package ships the types of its module but not of the functions that load it. */
declare module "clipper2-wasm" {
  import type { MainModule } from "clipper2-wasm/dist/clipper2z";
  export default function createClipper(options?: { locateFile?: (file: string) => string }): Promise<MainModule>;
}

declare module "clipper2-wasm/dist/es/clipper2z.js" {
  import type { MainModule } from "clipper2-wasm/dist/clipper2z";
  export default function createClipper(options?: { locateFile?: (file: string) => string }): Promise<MainModule>;
}
