import { mkdirSync, mkdtempSync, renameSync, rmSync, utimesSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, expect, it } from "vitest";
import { fingerprint, readStamp, writeStamp } from "#server/start/stamp.mjs";

let root: string;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), "stamp-"));
  mkdirSync(join(root, "src", "deep"), { recursive: true });
  writeFileSync(join(root, "src", "a.ts"), "one");
  writeFileSync(join(root, "src", "deep", "b.ts"), "two");
});
afterEach(() => {
  rmSync(root, { recursive: true });
});

const paths = ["src", "index.html"];

it("stays the same while nothing changes", () => {
  expect(fingerprint(root, paths)).toBe(fingerprint(root, paths));
  expect(fingerprint(root, paths)).toMatch(/^[0-9a-f]{64}$/);
});

it.each([
  { change: "a longer file", make: () => writeFileSync(join(root, "src", "deep", "b.ts"), "three") },
  { change: "a file of the same length saved later", make: () => utimesSync(join(root, "src", "a.ts"), 10, 20) },
  { change: "a new file", make: () => writeFileSync(join(root, "src", "c.ts"), "") },
  { change: "a removed file", make: () => rmSync(join(root, "src", "a.ts")) },
  { change: "a new name", make: () => renameSync(join(root, "src", "a.ts"), join(root, "src", "z.ts")) },
  { change: "a path that was absent", make: () => writeFileSync(join(root, "index.html"), "") },
])("differs after $change", ({ make }) => {
  const before = fingerprint(root, paths);
  make();
  expect(fingerprint(root, paths)).not.toBe(before);
});

it("does not look at what it was not asked about", () => {
  const before = fingerprint(root, paths);
  writeFileSync(join(root, "README.md"), "words");
  expect(fingerprint(root, paths)).toBe(before);
});

it("remembers a stamp in a folder that is not there yet", () => {
  const file = join(root, "dist", ".stamp");
  expect(readStamp(file)).toBeUndefined();
  writeStamp(file, "abc");
  expect(readStamp(file)).toBe("abc");
});
