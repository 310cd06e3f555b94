import { fileURLToPath } from "node:url";
import { expect, it } from "vitest";
import { listVariants, tryVariants } from "../support/broken-variants.mjs";

it("every deliberate fault of the engine is caught by a test", async () => {
  const variants = listVariants();
  expect(variants.length).toBeGreaterThanOrEqual(30);
  const said: string[] = [];
  const { caught, others } = await tryVariants(fileURLToPath(new URL("../..", import.meta.url)), variants, (line) =>
    said.push(line),
  );
  expect(others.map(({ variant, verdict }) => `${verdict}: ${variant.file}, ${variant.why}`)).toEqual([]);
  expect(caught).toBe(variants.length);
  expect(said.length).toBe(variants.length + 1);
});
