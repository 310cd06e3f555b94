import { expect, it } from "vitest";
import { pages } from "#server/mail/pages.ts";
import { paths } from "@/app/paths.ts";

it("mails lead to the addresses that the browser's part has", () => {
  expect(pages.link("t0k")).toBe(paths.link("t0k"));
  expect(pages.unsubscribe("t0k")).toBe(paths.unsubscribe("t0k"));
  expect(pages.bench("copperlark")).toBe(paths.bench("copperlark"));
  expect(pages.sheet("copperlark", "a-1")).toBe(paths.sheet("copperlark", "a-1"));
});
