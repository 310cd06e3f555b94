import { describe, expect, it } from "vitest";
import { matchesLock } from "#server/start/packages.mjs";

const locked = {
  "": { version: "0.1.0" },
  "node_modules/zod": { version: "4.6.7", integrity: "sha512-z" },
  "node_modules/binary-for-other-systems": { version: "1.0.0", integrity: "sha512-b", optional: true },
};
const { "": _project, ...all } = locked;
const zod = { "node_modules/zod": locked["node_modules/zod"] };

describe("what is installed, against the lock", () => {
  it.each([
    { installed: "everything", list: all, matches: true },
    { installed: "all but an optional package", list: zod, matches: true },
    { installed: "nothing", list: {}, matches: false },
    {
      installed: "another version",
      list: { "node_modules/zod": { version: "4.6.6", integrity: "sha512-z" } },
      matches: false,
    },
    {
      installed: "another content",
      list: { "node_modules/zod": { version: "4.6.7", integrity: "sha512-y" } },
      matches: false,
    },
    {
      installed: "something the lock has dropped",
      list: { ...all, "node_modules/old": { version: "1.0.0" } },
      matches: false,
    },
  ])("$installed: $matches", ({ list, matches }) => {
    expect(matchesLock(locked, list)).toBe(matches);
  });
});
