import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path, Point, Region } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { numberProblem } from "../units/number-problem.ts";
import type { Range } from "../units/outcome.ts";
import type { CuttingRules, NestingRequest } from "./nesting.ts";

/** What can't be nested as it is: which field of the request, and why, in words. */
export type NestingProblem = { readonly field: string; readonly words: string };

/** Copies that one layout takes at most, all pieces together. */
export const mostCopies = 10_000;
export const marginRange: Range = { least: 0, most: 500 };
export const kerfRange: Range = { least: 0, most: 20 };
export const spacingRange: Range = { least: 0, most: 500 };
const bedRange: Range = { least: 10, most: 20_000 };
const offcutRange: Range = { least: 1, most: 20_000 };
const turnRange: Range = { least: -360, most: 360 };
const stepRange: Range = { least: 1, most: 360 };
const quantityRange: Range = { least: 1, most: mostCopies };
/** A kind of which there is none left may stay in the list. */
const stockRange: Range = { least: 0, most: mostCopies };
const effortRange: Range = { least: 0, most: 1000 };
/** Farther than this from its origin nothing of a sign or a sheet lies, mm. */
const reachMm = 100_000;
/** Area that an outline may gain or lose by crossing itself in a hair, mm². */
const crossingMm2 = 0.01;

/** Everything that is wrong with numbers and names of a request, in its order; nothing for one that can be nested. */
export function checkNumbers({ pieces, stock, rules, seed, effort }: NestingRequest): NestingProblem[] {
  const problems: NestingProblem[] = [];
  const check = (field: string, what: string, value: number, range: Range, unit = "") => {
    const words = numberProblem(what, value, range, unit);
    if (words !== null) problems.push({ field, words });
  };
  const count = (field: string, what: string, value: number, range: Range) => {
    if (Number.isInteger(value) || !Number.isFinite(value)) check(field, what, value, range);
    else problems.push({ field, words: `${what} must be a whole number, not ${value}.` });
  };
  if (pieces.length === 0) problems.push({ field: "pieces", words: "There is no piece to cut." });
  if (stock.length === 0) problems.push({ field: "stock", words: "There is no sheet to cut from." });
  for (const [index, { name, quantity, turns }] of pieces.entries()) {
    const field = `pieces.${index}`;
    count(`${field}.quantity`, `The quantity of ${name}`, quantity, quantityRange);
    if (turns.kind === "free") continue;
    check(`${field}.turns.from`, `The turn of ${name}`, turns.from, turnRange, "°");
    check(`${field}.turns.every`, `The step in which ${name} is turned`, turns.every, stepRange, "°");
    if (turns.every >= 1 && Math.abs(360 / turns.every - Math.round(360 / turns.every)) > 1e-9)
      problems.push({
        field: `${field}.turns.every`,
        words: `The step in which ${name} is turned must go into a full turn, as 15°, 90° or 180° do.`,
      });
  }
  for (const [index, { name, quantity, grainTurn }] of stock.entries()) {
    if (quantity !== null) count(`stock.${index}.quantity`, `The quantity of ${name}`, quantity, stockRange);
    check(`stock.${index}.grainTurn`, `The grain of ${name}`, grainTurn, turnRange, "°");
  }
  const copies = pieces.reduce((sum, { quantity }) => sum + (Number.isFinite(quantity) ? quantity : 0), 0);
  if (copies > mostCopies)
    problems.push({
      field: "pieces",
      words: `${copies} pieces are more than one layout takes: at most ${mostCopies}.`,
    });
  for (const field of ["pieces", "stock"] as const) {
    const ids = (field === "pieces" ? pieces : stock).map(({ id }) => id);
    const twice = ids.find((id, index) => ids.indexOf(id) !== index);
    if (twice !== undefined) problems.push({ field, words: `Two of the ${field} are called ${twice}.` });
  }
  return [...problems, ...checkRules(rules), ...checkSearch(seed, effort)];
}

function checkRules({ marginMm, kerfMm, spacingMm, bed, leastOffcutMm }: CuttingRules): NestingProblem[] {
  const rows: readonly (readonly [field: string, what: string, value: number, range: Range])[] = [
    ["marginMm", "The margin", marginMm, marginRange],
    ["kerfMm", "The kerf", kerfMm, kerfRange],
    ["spacingMm", "The spacing", spacingMm, spacingRange],
    ["leastOffcutMm", "The shortest offcut worth keeping", leastOffcutMm, offcutRange],
    ...(bed
      ? ([
          ["bed.widthMm", "The bed's width", bed.widthMm, bedRange],
          ["bed.heightMm", "The bed's height", bed.heightMm, bedRange],
        ] as const)
      : []),
  ];
  return rows.flatMap(([field, what, value, range]) => {
    const words = numberProblem(what, value, range, "mm");
    return words === null ? [] : [{ field: `rules.${field}`, words }];
  });
}

function checkSearch(seed: number, effort: number): NestingProblem[] {
  const words = numberProblem("The effort", effort, effortRange);
  return [
    ...(Number.isInteger(seed) ? [] : [{ field: "seed", words: `The seed must be a whole number, not ${seed}.` }]),
    ...(words === null ? [] : [{ field: "effort", words }]),
  ];
}

/** A closed outline as the kernel gives it, or what is wrong with it, as a sentence about `name`. */
export function checkOutline(
  name: string,
  path: Path,
  kernel: Kernel,
): { readonly ok: true; readonly region: Region } | { readonly ok: false; readonly words: string } {
  if (path.length === 0) return { ok: false, words: `${name} has no outline.` };
  const isInReach = ({ x, y }: Point) => Math.abs(x) <= reachMm && Math.abs(y) <= reachMm;
  const points = path.flatMap(({ start, segments }) => [
    start,
    ...segments.flatMap((segment) => (segment.kind === "line" ? [segment.to] : [segment.c1, segment.c2, segment.to])),
  ]);
  if (!points.every(isInReach))
    return { ok: false, words: `The outline of ${name} has points that are no numbers or lie too far out.` };
  const flat = flattenPath(path);
  const region = kernel.union(flat, "evenodd");
  const areaMm2 = regionAreaMm2(region);
  if (region.length === 0 || areaMm2 < crossingMm2)
    return { ok: false, words: `The outline of ${name} encloses no area.` };
  // Where an outline crosses itself, what its rings enclose is not what even-odd filling makes of them.
  if (Math.abs(regionAreaMm2(flat) - areaMm2) > crossingMm2 + lengthToleranceMm * regionPerimeterMm(flat))
    return { ok: false, words: `The outline of ${name} crosses itself. Join or part its shapes where it does.` };
  return { ok: true, region };
}
