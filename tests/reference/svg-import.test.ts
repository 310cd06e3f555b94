import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { importFile, stopImporting } from "#server/artwork/import-file.ts";
import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { launchBrowser } from "../support/browser.ts";
import { inkAgreements, piecesAsSvg } from "../support/ink-agreement.ts";
import { printTable } from "../support/print-table.ts";

// Source: the files of three open icon sets (Tabler Icons: strokes; Twemoji: several colours; Circle Flags: masks), as drawn by
// Chromium, a renderer that shares no code with the import. A hundred files each, drawn by seed.
const sets = [
  { name: "strokes", folder: "@tabler/icons/icons/outline", seed: 20_261 },
  { name: "many colours", folder: "@twemoji/svg", seed: 20_262 },
  { name: "masks", folder: "circle-flags/flags", seed: 20_263 },
];
const filesPerSet = 100;
const goodInk = 0.98;

type Judged = {
  readonly file: string;
  readonly score: number;
  readonly outcome: ImportOutcome;
  readonly original: string;
};

let browser: Browser;
const judged = new Map<string, Judged[]>();

beforeAll(async () => {
  browser = await launchBrowser();
  for (const set of sets) judged.set(set.name, await judgeSet(set));
  printTable("Ink agreement of imported pieces with Chromium", [
    ["set", "files", "≥ 0.98", "mean", "worst", "refused", "warned of"],
    ...sets.map(({ name }) => summaryRow(name, judged.get(name) ?? [])),
  ]);
}, 180_000);
afterAll(async () => {
  await browser.close();
  await stopImporting();
});

describe.each(sets)("a hundred files of $name", ({ name }) => {
  it("agree with Chromium's picture in at least 98 of them", () => {
    const files = judged.get(name) ?? [];
    expect(files).toHaveLength(filesPerSet);
    const poor = files.filter(({ score }) => score < goodInk).map(({ file, score }) => `${file} ${score.toFixed(4)}`);
    expect(poor.length, poor.join(", ")).toBeLessThanOrEqual(filesPerSet * 0.02);
  });

  it("are refused in one at most, with a reason", () => {
    const refused = (judged.get(name) ?? []).flatMap(({ file, outcome }) =>
      outcome.ok ? [] : [{ file, ...outcome.refusal }],
    );
    expect(refused.length, refused.map(({ file, code }) => `${file} ${code}`).join(", ")).toBeLessThanOrEqual(
      filesPerSet * 0.01,
    );
    for (const { text } of refused) expect(text).toMatch(/\.$/);
  });

  it("lose nothing without a warning", () => {
    const silent = (judged.get(name) ?? []).filter(
      ({ score, outcome }) =>
        score < goodInk && outcome.ok && outcome.artwork.warnings.every(({ code }) => code === "size.guessed"),
    );
    expect(silent.map(({ file, score }) => `${file} ${score.toFixed(4)}`)).toEqual([]);
  });

  it("would not agree if the pieces were those of another file", async () => {
    const files = judged.get(name) ?? [];
    const swapped = files.slice(0, 10).map((file, index) => {
      const other = files[(index + 1) % files.length]?.outcome;
      return { original: file.original, pieces: other?.ok ? piecesAsSvg(other.artwork) : "" };
    });
    const scores = await inkAgreements(browser, swapped);
    expect(scores.filter((score) => score >= goodInk)).toEqual([]);
  });
});

async function judgeSet({ folder, seed }: (typeof sets)[number]): Promise<Judged[]> {
  const path = join(import.meta.dirname, "../../node_modules", folder);
  const names = readdirSync(path)
    .filter((file) => file.endsWith(".svg"))
    .sort();
  const sample = drawSample(names, filesPerSet, seed);
  const read = sample.map((file) => ({ file, original: readFileSync(join(path, file), "utf8") }));
  const outcomes: ImportOutcome[] = [];
  for (const { original } of read)
    outcomes.push(await importFile(new TextEncoder().encode(original), { timeMs: 60_000 }));
  const scores = await inkAgreements(
    browser,
    read.map(({ original }, index) => {
      const outcome = outcomes[index];
      return { original, pieces: outcome?.ok ? piecesAsSvg(outcome.artwork) : "" };
    }),
  );
  return read.flatMap(({ file, original }, index) => {
    const outcome = outcomes[index];
    return outcome ? [{ file, original, outcome, score: scores[index] ?? -1 }] : [];
  });
}

function summaryRow(name: string, files: readonly Judged[]): (string | number)[] {
  const taken = files.filter(({ outcome }) => outcome.ok);
  const scores = taken.map(({ score }) => score);
  const codes = new Map<string, number>();
  for (const { outcome } of files) {
    if (!outcome.ok) continue;
    for (const { code } of outcome.artwork.warnings) codes.set(code, (codes.get(code) ?? 0) + 1);
  }
  return [
    name,
    files.length,
    scores.filter((score) => score >= goodInk).length,
    (scores.reduce((sum, score) => sum + score, 0) / scores.length).toFixed(4),
    Math.min(...scores).toFixed(4),
    files.length - taken.length,
    [...codes].map(([code, count]) => `${code} ${count}`).join(", "),
  ];
}

/** `count` different names, the same for the same seed: a shuffle driven by a 32-bit mixing generator. */
function drawSample(names: readonly string[], count: number, seed: number): string[] {
  let state = seed;
  const random = () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const pool = [...names];
  return Array.from(
    { length: Math.min(count, pool.length) },
    () => pool.splice(Math.floor(random() * pool.length), 1)[0] ?? "",
  );
}
