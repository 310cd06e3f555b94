import { describe, expect, it } from "vitest";
import { drawCuttingDiagrams } from "#shared/drawing/cutting-diagram.ts";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import type { BarEnd, CuttingJob } from "#shared/stock-lengths/cutting-job.ts";
import { squareEnd } from "#shared/stock-lengths/cutting-job.ts";
import { planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { textBoxesOf } from "../../../support/text-boxes.ts";

const upper: BarEnd = { angle: 45, longPoint: "upper" };
const lower: BarEnd = { angle: 45, longPoint: "lower" };

function buildJob(count = 1): CuttingJob {
  const slats = ["S1", "S2", "S3"].map((id, index) => ({
    id,
    label: id,
    lengthMm: index === 2 ? 500 : 300,
    quantity: count,
    start: upper,
    end: lower,
  }));
  const stub = { id: "T", label: "T", lengthMm: 12, quantity: count, start: squareEnd, end: { ...upper, angle: 60 } };
  return {
    parts: [...slats, stub],
    stock: [{ id: "bar", label: "oak strip", lengthMm: 1380, price: null, onHand: null }],
    widthMm: 40,
    saw: { kerfMm: 3, squaringMm: 20, rejectShare: 0, nests: true },
  };
}

function draw(job: CuttingJob, paper = { widthMm: 276.25, heightMm: 120 }): DisplayList[] {
  const outcome = planCutting(job, { work: 10_000 });
  if (!outcome.ok) throw new Error("refused");
  return drawCuttingDiagrams({ job, plan: outcome.value, unit: "mm", ...paper });
}

const flat = (items: readonly Item[]): Item[] =>
  items.flatMap((item) => (item.kind === "group" || item.kind === "clip" ? flat(item.items) : [item]));
const textsOf = (list: DisplayList | undefined) =>
  textBoxesOf(list ?? { widthMm: 0, heightMm: 0, items: [] }).map(({ text }) => text);

function cornersOf(list: DisplayList | undefined, id: string): number[][] {
  const item = flat(list?.items ?? []).find((each) => each.kind === "path" && each.id === id);
  const ring = item?.kind === "path" ? item.path[0] : undefined;
  return ring ? [ring.start, ...ring.segments.map(({ to }) => to)].map(({ x, y }) => [x, y]) : [];
}

describe("a cutting diagram", () => {
  it("has every part at its place, long point to long point, with its mitres", () => {
    const [page] = draw(buildJob());
    // 1380 mm on 276 of paper is 1:5, a quarter line in. First after 20 mm: 500 long, mitre 40 = 8 on paper; the next
    // 4.243 behind it, less the mitre: 20 + 500 + 4.243 − 40 = 484.243.
    const left = 0.125;
    const first = cornersOf(page, "part:S3");
    expect(first.map(([x]) => x)).toEqual([12, 4, 96, 104].map((x) => expect.closeTo(x + left, 6)));
    const second = cornersOf(page, "part:S1");
    expect(second[1]?.[0]).toBeCloseTo(484.243 / 5 + left, 3);
    // Drawn 8 mm high: 40 at 1:5.
    expect((first[0]?.[1] ?? 0) - (first[1]?.[1] ?? 0)).toBeCloseTo(8, 9);
    // A stub shorter than its mitre of 23 mm comes to a point.
    expect(cornersOf(page, "part:T")).toHaveLength(3);
  });

  it("draws an end of two cuts as a point", () => {
    const tip = { angle: 45, longPoint: "middle" } as const;
    const job = buildJob();
    const parts = job.parts.slice(0, 1).map((part) => ({ ...part, end: tip }));
    // 300 mm from 20 on: tip at 320, both edges 20 before it.
    const corners = cornersOf(draw({ ...job, parts })[0], "part:S1");
    expect(corners.map(([x]) => x)).toEqual([12, 4, 60, 64, 60].map((x) => expect.closeTo(x + 0.125, 6)));
  });

  it("says what to buy, the scale, the order of the cuts with lengths and saw settings, and what is left", () => {
    const texts = textsOf(draw(buildJob())[0]);
    expect(texts).toEqual(
      expect.arrayContaining(["1 × oak strip", "Lengths at 1:5, widths not to scale.", "S1", "S2", "S3"]),
    );
    // 20 + 500 + 2 · (300 − 40) + 3 · 4.243 + 12 + 3.464 = 1068.19 of 1380, the mitres of nested slats counted once.
    expect(texts).toContain("left 311.8 mm");
    expect(texts.join(" ")).toContain(
      "Square the end (20), then S3: 500, saw 45°; S1, S2: 300, saw 45°; T: 12, saw 0° and 30°.",
    );
  });

  it("goes on over as many papers as it takes, nothing beside them", () => {
    const pages = draw(buildJob(30));
    expect(pages.length).toBeGreaterThan(1);
    for (const page of pages) {
      expect(page).toMatchObject({ widthMm: 276.25, heightMm: 120 });
      const boxes = textBoxesOf(page);
      expect(boxes.length).toBeGreaterThan(3);
      for (const { box } of boxes) {
        expect(box.x).toBeGreaterThanOrEqual(-0.01);
        expect(box.x + box.width).toBeLessThanOrEqual(276.26);
        expect(box.y + box.height).toBeLessThanOrEqual(120.01);
      }
    }
    const drawn = pages.flatMap(({ items }) => items).filter((item) => item.kind === "group");
    expect(new Set(drawn.map(({ id }) => id)).size).toBe(drawn.length);
  });

  it("with nothing to cut says so", () => {
    const pages = draw({ ...buildJob(), parts: [] });
    expect(pages).toHaveLength(1);
    expect(textsOf(pages[0])[0]).toBe("Nothing to cut");
  });
});
