import { describe, expect, it } from "vitest";
import { localPath, signInTo } from "@/app/paths.ts";

describe("localPath", () => {
  it.each(["/shop/copperlark-signs/bench", "/shop/s/bench?q=ring&move=ours", "/"])("keeps %s", (path) => {
    expect(localPath(path)).toBe(path);
  });
  it.each([
    null,
    "",
    "https://elsewhere.example/",
    "//elsewhere.example/",
    "/\\elsewhere.example",
    "/a\\b",
    "/a b",
    "shop/s/bench",
    "/sign-in?next=/x",
  ])("refuses %s", (path) => {
    expect(localPath(path)).toBeNull();
  });
});

it("carries the whole address through sign-in", () => {
  const next = "/shop/s/bench?q=ring&move=ours";
  expect(new URL(signInTo(next), "http://x.example").searchParams.get("next")).toBe(next);
});
