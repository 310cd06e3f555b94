import { mkdirSync, rmSync } from "node:fs";
import { join } from "node:path";
import { argv } from "node:process";
import { fileURLToPath } from "node:url";
import { checkoutOf } from "./data-folder.mjs";
import { say } from "./log.mjs";
import { Problem } from "./problem.mjs";
import { run } from "./processes.mjs";

/** The server's programs: the file in dist/server without .mjs, and the source it is made from. */
export const serverEntries = {
  index: "server/index.ts",
  worker: "server/worker.ts",
  migrate: "server/migrate.ts",
  "import-worker": "server/artwork/import-worker.ts",
  "drawing-worker": "server/drawing/drawing-worker.ts",
  "photo-worker": "server/photos/photo-worker.ts",
};

/**
 * Makes dist/server: our own sources in one file per program, packages left where npm installed them.
 * @param {string} root the checkout
 * @throws {Problem} with esbuild's words
 */
export async function bundleServer(root) {
  const folder = join(root, "dist", "server");
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  const { code, output } = await run(
    // Its file is a binary or, where install scripts are off, a script: both can be executed.
    join(root, "node_modules", ".bin", "esbuild"),
    [
      ...Object.entries(serverEntries).map(([name, source]) => `${name}=${source}`),
      "--bundle",
      "--platform=node",
      "--target=node20",
      "--format=esm",
      "--packages=external",
      "--sourcemap",
      "--out-extension:.js=.mjs",
      "--log-level=warning",
      "--outdir=dist/server",
    ],
    { cwd: root },
  );
  if (code !== 0) throw new Problem(`The server could not be bundled:\n${output}`);
}

if (argv[1] === fileURLToPath(import.meta.url)) {
  await bundleServer(checkoutOf(import.meta.url)).then(
    () => say("Bundled the server into dist/server."),
    (error) => {
      say(error instanceof Problem ? error.message : String(error));
      process.exitCode = 1;
    },
  );
}
