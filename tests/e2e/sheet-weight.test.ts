import { readFileSync, statSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { z } from "zod";

/** What the build wrote about itself (Vite's manifest): each entry and page with what it imports. */
const chunkSchema = z.looseObject({ file: z.string(), imports: z.array(z.string()).default([]) });
const manifest = z
  .record(z.string(), chunkSchema)
  .parse(JSON.parse(readFileSync("dist/client/.vite/manifest.json", "utf8")));

/** Every script that a browser has fetched when a page stands there. */
function scriptsOf(...entries: readonly string[]): string[] {
  const found = new Set<string>();
  const take = (key: string): void => {
    const chunk = manifest[key];
    if (!chunk) throw new Error(`The build has no ${key}.`);
    if (found.has(chunk.file)) return;
    found.add(chunk.file);
    chunk.imports.forEach(take);
  };
  entries.forEach(take);
  return [...found].filter((file) => file.endsWith(".js"));
}

/** The packages that went into a script, by its source map. */
function packagesIn(script: string): string[] {
  const { sources } = z
    .looseObject({ sources: z.array(z.string()) })
    .parse(JSON.parse(readFileSync(`dist/client/${script}.map`, "utf8")));
  return sources.flatMap((source) => /node_modules\/((?:@[^/]+\/)?[^/]+)/.exec(source)?.[1] ?? []);
}

describe("what a client's phone fetches for a sheet", () => {
  const scripts = scriptsOf("index.html", "src/app/pages/sheet-page.tsx");

  it("is at most 150 kB of script, compressed", () => {
    const bytes = scripts.map((script) => statSync(`dist/client/${script}.br`).size);
    expect(scripts.length).toBeGreaterThan(5);
    expect(bytes.reduce((sum, size) => sum + size, 0)).toBeLessThanOrEqual(150_000);
  });

  it("holds neither a canvas nor schemas", () => {
    const packages = new Set(scripts.flatMap(packagesIn));
    expect(packages).toContain("react-dom");
    for (const heavy of ["fabric", "zod", "clipper2-wasm", "fontkit", "radix-ui"])
      expect(packages).not.toContain(heavy);
  });
});
