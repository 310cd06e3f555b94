import { expect, it, vi } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { type Kernel, remembered } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";

const square = (x: number, size = 10): Region => [
  [
    { x, y: 0 },
    { x: x + size, y: 0 },
    { x: x + size, y: size },
    { x, y: size },
  ],
];

/** The kernel with a count of what it was asked to work out. */
async function counted() {
  const plain = await loadKernel();
  const asked = vi.fn();
  const count =
    <A extends unknown[], R>(work: (...given: A) => R) =>
    (...given: A): R => {
      asked();
      return work(...given);
    };
  const kernel: Kernel = {
    ...plain,
    union: count(plain.union),
    intersect: count(plain.intersect),
    difference: count(plain.difference),
    offset: count(plain.offset),
  };
  return { plain, kernel: rememberingKernel(kernel), asked };
}

it("works out the same of the very same rings once, also in another list", async () => {
  const { plain, kernel, asked } = await counted();
  const [a, b] = [square(0), square(5)];
  kernel.startRun();
  const first = kernel.union([...a, ...b], "nonzero");
  expect(first).toEqual(plain.union([...a, ...b], "nonzero"));
  expect(kernel.union([...a, ...b], "nonzero")).toBe(first);
  expect(asked).toHaveBeenCalledTimes(1);
});

it("tells apart rule, order, distance, join and other rings that look alike", async () => {
  const { plain, kernel } = await counted();
  const [a, b] = [square(0), square(5)];
  kernel.startRun();
  expect(kernel.union([...a, ...b], "nonzero")).toEqual(plain.union([...a, ...b], "nonzero"));
  expect(kernel.union([...a, ...b], "evenodd")).toEqual(plain.union([...a, ...b], "evenodd"));
  expect(kernel.difference(a, b)).toEqual(plain.difference(a, b));
  expect(kernel.difference(b, a)).toEqual(plain.difference(b, a));
  expect(kernel.intersect([...a, ...b], a)).toEqual(plain.intersect([...a, ...b], a));
  expect(kernel.intersect(a, [...b, ...a])).toEqual(plain.intersect(a, [...b, ...a]));
  for (const distance of [1, -1, 1.5])
    for (const join of ["round", "mitre"] as const)
      expect(kernel.offset(a, distance, join)).toEqual(plain.offset(a, distance, join));
});

it("keeps what each run asks for again, and forgets the rest", async () => {
  const { kernel, asked } = await counted();
  const [a, b] = [square(0), square(5)];
  for (let run = 0; run < 4; run++) {
    kernel.startRun();
    kernel.difference(a, b);
  }
  expect(asked).toHaveBeenCalledTimes(1);
  kernel.startRun();
  kernel.startRun();
  kernel.difference(a, b);
  expect(asked).toHaveBeenCalledTimes(2);
});

it("remembers other work by its objects and its name", async () => {
  const { plain, kernel } = await counted();
  const [a, b] = [{}, {}];
  const make = vi.fn(() => Symbol("made"));
  kernel.startRun();
  const first = remembered(kernel, [a, b], "measure", make);
  expect(remembered(kernel, [a, b], "measure", make)).toBe(first);
  expect(remembered(kernel, [b, a], "measure", make)).not.toBe(first);
  expect(remembered(kernel, [a, b], "other measure", make)).not.toBe(first);
  expect(remembered(kernel, [a, {}], "measure", make)).not.toBe(first);
  expect(make).toHaveBeenCalledTimes(4);
  expect(remembered(plain, [a, b], "measure", make)).not.toBe(first);
});
