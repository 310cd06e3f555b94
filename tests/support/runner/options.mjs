import { Problem } from "../../../server/start/problem.mjs";

/** The projects of vite.config.ts, in the order they run. */
export const projects = ["unit", "client", "reference", "api", "db", "e2e"];
/** What can be named on the command line. */
const names = ["types", "lint", ...projects, "long"];

/**
 * @typedef {object} Options
 * @property {boolean} types check types
 * @property {boolean} lint check style
 * @property {string[]} projects of vitest
 * @property {string[]} files parts of paths; empty for all
 * @property {boolean} bench measure instead of testing
 */

/**
 * Reads the command line: names of steps choose those and no others, anything with a slash chooses test files,
 * --long adds the long tests, --bench measures instead.
 * @param {readonly string[]} args
 * @returns {Options}
 * @throws {Problem} for what it does not know
 */
export function readOptions(args) {
  const unknown = args.find(
    (arg) => !names.includes(arg) && !arg.includes("/") && !["--long", "--bench"].includes(arg),
  );
  if (unknown !== undefined) {
    throw new Problem(`Unknown: ${unknown}. Name steps (${names.join(", ")}), test files, --long or --bench.`);
  }
  const chosen = args.filter((arg) => names.includes(arg));
  const files = args.filter((arg) => arg.includes("/"));
  const isWhole = chosen.length === 0 && files.length === 0;
  const usual = chosen.length === 0 ? projects : projects.filter((name) => chosen.includes(name));
  const isLong =
    args.includes("--long") || chosen.includes("long") || files.some((file) => file.includes("tests/long/"));
  return {
    types: isWhole || chosen.includes("types"),
    lint: isWhole || chosen.includes("lint"),
    projects: isLong ? [...usual, "long"] : usual,
    files,
    bench: args.includes("--bench"),
  };
}
