import { isWithin, numberProblem } from "../units/number-problem.ts";
import { barWidthRange, bladeAngleRange, kerfRange, squaringRange, usableLengthMm } from "./bar-take.ts";
import type { CuttingJob, CuttingProblem } from "./cutting-job.ts";

/** Pieces that one plan takes at most, all parts together. */
export const mostPieces = 20_000;
const mostStockLengths = 20;
/** A share of 1 would leave nothing. */
const rejectRange = { least: 0, most: 0.9 };
const lengthMmRange = { least: 0.1, most: 10_000 };
const priceRange = { least: 0, most: 1_000_000_000 };

/** Everything that is wrong with a job, in the order of its fields; nothing for a job that can be planned. */
export function checkCuttingJob(job: CuttingJob): CuttingProblem[] {
  const problems: CuttingProblem[] = [];
  const check = (field: string, what: string, value: number, range: { least: number; most: number }, unit = "") => {
    const words = numberProblem(what, value, range, unit);
    if (words !== null) problems.push({ field, words });
  };
  const checkWhole = (field: string, what: string, value: number, range: { least: number; most: number }) => {
    if (isWithin(value, range) && !Number.isInteger(value))
      problems.push({ field, words: `${what} must be a whole number, not ${value}.` });
    else check(field, what, value, range);
  };
  const unique = (field: string, ids: readonly string[]) => {
    const seen = new Set<string>();
    for (const [index, id] of ids.entries()) {
      if (seen.has(id)) problems.push({ field: `${field}.${index}.id`, words: `“${id}” is there twice.` });
      seen.add(id);
    }
  };

  check("widthMm", "The bars' width", job.widthMm, barWidthRange, "mm");
  check("saw.kerfMm", "The kerf", job.saw.kerfMm, kerfRange, "mm");
  check("saw.squaringMm", "The squaring cut", job.saw.squaringMm, squaringRange, "mm");
  check("saw.rejectShare", "The share lost to knots", job.saw.rejectShare, rejectRange);
  if (job.stock.length === 0)
    problems.push({ field: "stock", words: "There is no bar to cut from. Add a stock length." });
  if (job.stock.length > mostStockLengths)
    problems.push({
      field: "stock",
      words: `${job.stock.length} stock lengths are too many; ${mostStockLengths} at most.`,
    });
  for (const [index, { label, lengthMm, price, onHand }] of job.stock.entries()) {
    check(`stock.${index}.lengthMm`, `The length of ${label}`, lengthMm, lengthMmRange, "mm");
    if (price !== null) checkWhole(`stock.${index}.price`, `The price of ${label}`, price, priceRange);
    if (onHand !== null)
      checkWhole(`stock.${index}.onHand`, `The count of ${label}`, onHand, { least: 0, most: 100_000 });
  }
  let pieces = 0;
  for (const [index, { label, lengthMm, quantity, start, end }] of job.parts.entries()) {
    check(`parts.${index}.lengthMm`, `The length of part ${label}`, lengthMm, lengthMmRange, "mm");
    checkWhole(`parts.${index}.quantity`, `The quantity of part ${label}`, quantity, { least: 1, most: mostPieces });
    check(
      `parts.${index}.start.angle`,
      `The saw angle at the start of part ${label}`,
      start.angle,
      bladeAngleRange,
      "°",
    );
    check(`parts.${index}.end.angle`, `The saw angle at the end of part ${label}`, end.angle, bladeAngleRange, "°");
    if (Number.isFinite(quantity)) pieces += quantity;
  }
  if (pieces > mostPieces)
    problems.push({
      field: "parts",
      words: `${pieces} parts are too many for one plan; ${mostPieces} at most. Split the job.`,
    });
  unique(
    "parts",
    job.parts.map(({ id }) => id),
  );
  unique(
    "stock",
    job.stock.map(({ id }) => id),
  );
  return problems.length > 0 ? problems : longParts(job);
}

/** Parts that no bar is long enough for. */
function longParts({ parts, stock, saw }: CuttingJob): CuttingProblem[] {
  const usable = stock.map(({ lengthMm, onHand }) => {
    const outcome = usableLengthMm({ lengthMm, ...saw });
    return outcome.ok && onHand !== 0 ? outcome.value : 0;
  });
  const longest = Math.max(...usable);
  return parts.flatMap(({ label, lengthMm }, index) => {
    if (lengthMm <= longest + 1e-6) return [];
    const room = Number(longest.toFixed(1));
    return [
      {
        field: `parts.${index}.lengthMm`,
        words: `Part ${label} is ${Number(lengthMm.toFixed(1))} mm long, and no bar gives more than ${room} mm once its end is squared and knots are allowed for. Add a longer stock length or join the part.`,
      },
    ];
  });
}
