import { existsSync, readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { listVariants } from "../../support/broken-variants.mjs";

const root = new URL("../../../", import.meta.url);

it("every deliberate fault still finds the one place that it breaks, and the tests that must catch it", () => {
  const variants = listVariants();
  expect(variants.length).toBeGreaterThan(150);
  const stale = variants.filter(
    ({ file, find, tests }) =>
      readFileSync(new URL(file, root), "utf8").split(find).length !== 2 ||
      !tests.every((test) => existsSync(new URL(test, root))),
  );
  expect(stale.map(({ file, why }) => `${file}: ${why}`)).toEqual([]);
});
