import { Bench } from "tinybench";

/** One line of the bench's table. Lower is better unless the unit says otherwise ("/s"). */
export type Measurement = {
  name: string;
  unit: string;
  median: number;
  p95: number;
  min: number;
  max: number;
  runs: number;
};

/** What a file in tests/bench exports as `measure`: it prepares, measures and cleans up by itself. */
export type Measure = () => Promise<readonly Measurement[]>;

/** The smallest value that at least `share` (0 to 1) of the values do not exceed; values in any order, at least one. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = values.toSorted((a, b) => a - b);
  const value = sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)];
  if (value === undefined) throw new Error("A quantile needs at least one value.");
  return value;
}

/** Sums up values that were measured by other means than timed(), such as sizes or rates. */
export function summarise(name: string, unit: string, values: readonly number[]): Measurement {
  return {
    name,
    unit,
    median: quantile(values, 0.5),
    p95: quantile(values, 0.95),
    min: quantile(values, 0),
    max: quantile(values, 1),
    runs: values.length,
  };
}

/** Runs a piece of work again and again after a warm-up, at least `iterations` times and half a second, and reports milliseconds. */
export async function timed(
  name: string,
  work: () => unknown,
  { iterations = 20 }: { iterations?: number } = {},
): Promise<Measurement> {
  const bench = new Bench({
    iterations,
    time: 500,
    warmupIterations: 3,
    warmupTime: 50,
    retainSamples: true,
    throws: true,
  });
  bench.add(name, async () => {
    await work();
  });
  const [task] = await bench.run();
  const samples = task?.result.state === "completed" ? task.result.latency.samples : undefined;
  if (samples === undefined) throw new Error(`"${name}" was not measured.`);
  return summarise(name, "ms", samples);
}
