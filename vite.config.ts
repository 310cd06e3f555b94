import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { promisify } from "node:util";
import { brotliCompress, constants } from "node:zlib";
import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import type { Plugin } from "vite";
import { defineConfig, type TestProjectInlineConfiguration } from "vitest/config";
import { BaseSequencer, type TestSpecification } from "vitest/node";

const here = import.meta.dirname;
const appUrl = process.env.STANDPROUD_APP ?? "http://127.0.0.1:4601";
const seconds = 1_000;

/** Writes scripts and styles as small as they get beside themselves, once a build: the server only hands them on. */
function compressedBeside(): Plugin {
  const compress = promisify(brotliCompress);
  const params = { [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY };
  return {
    name: "compressed-beside",
    apply: "build",
    async writeBundle({ dir = "" }, bundle) {
      const files = Object.keys(bundle).filter((name) => /\.(?:js|css)$/.test(name));
      await Promise.all(
        files.map(async (name) => {
          const file = join(dir, name);
          await writeFile(`${file}.br`, await compress(await readFile(file), { params }));
        }),
      );
    },
  };
}

/** Files that take longest, the longest first: begun last, one of them alone would keep everyone waiting. */
const longest = [
  "e2e/screens-desk",
  "e2e/whole-sign",
  "e2e/round-trip",
  "e2e/screens-phone",
  "e2e/safety-net",
  "api/races",
  "api/policies",
  "api/decisions",
  "api/revisions",
  "reference/tracing",
];

class LongestFirst extends BaseSequencer {
  override async sort(files: TestSpecification[]): Promise<TestSpecification[]> {
    const place = ({ moduleId }: TestSpecification) => {
      const found = longest.findIndex((name) => moduleId.includes(`/tests/${name}.test.`));
      return found < 0 ? longest.length : found;
    };
    return (await super.sort(files)).toSorted((a, b) => place(a) - place(b));
  }
}

/** Projects whose tests talk to PostgreSQL: their global setup starts a throw-away cluster. */
function withDatabase(name: string, timeout: number, groupOrder: number): TestProjectInlineConfiguration {
  return {
    extends: true,
    test: {
      name,
      include: [`tests/${name}/**/*.test.ts`],
      globalSetup: "tests/support/global-setup.ts",
      testTimeout: timeout,
      hookTimeout: Math.max(timeout, 60 * seconds),
      // Browser tests bring a server and a browser each and come after all others; the long ones run alone.
      ...(groupOrder === 0 ? {} : { maxWorkers: name === "e2e" ? 2 : 1 }),
      sequence: { groupOrder },
    },
  };
}

export default defineConfig({
  plugins: [react(), tailwindcss(), compressedBeside()],
  resolve: { alias: { "@": `${here}/src`, "#shared": `${here}/shared`, "#server": `${here}/server` } },
  build: { outDir: "dist/client", manifest: true, sourcemap: true, target: "es2022", chunkSizeWarningLimit: 700 },
  server: { proxy: { "/api": appUrl, "/auth": appUrl } },
  test: {
    // More than there are cores: most of the time a test waits for the database, a browser or a thread.
    maxWorkers: 4,
    sequence: { sequencer: LongestFirst },
    projects: [
      {
        extends: true,
        test: { name: "unit", include: ["tests/unit/**/*.test.ts"], isolate: false, testTimeout: 60 * seconds },
      },
      {
        extends: true,
        test: {
          name: "client",
          include: ["tests/unit/**/*.test.tsx"],
          environment: "jsdom",
          testTimeout: 60 * seconds,
        },
      },
      {
        extends: true,
        test: {
          name: "reference",
          include: ["tests/reference/**/*.test.ts"],
          globalSetup: "tests/support/reference-table.ts",
          testTimeout: 120 * seconds,
        },
      },
      withDatabase("api", 60 * seconds, 0),
      withDatabase("db", 60 * seconds, 0),
      withDatabase("e2e", 180 * seconds, 1),
      // The test runner's --long asks for these; they take longer than anybody waits for by chance.
      ...(process.env.TEST_LONG ? [withDatabase("long", 1_800 * seconds, 2)] : []),
    ],
  },
});
