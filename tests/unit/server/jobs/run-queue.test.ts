import type { JobHelpers } from "graphile-worker";
import { expect, it } from "vitest";
import { watched } from "#server/jobs/run-queue.ts";

it("knows which heavy work is under way, each kind once, until the last of it is done or has failed", async () => {
  const ends: { done: () => void; failed: (error: Error) => void }[] = [];
  const slow = (): Promise<void> => new Promise((done, failed) => ends.push({ done, failed }));
  const { taskList, underWay } = watched({ draw: slow, mail: slow }, new Set(["draw"]));
  // The tasks here look at neither.
  const start = (name: string) => Promise.resolve(taskList[name]?.({}, {} as JobHelpers));
  const runs = [start("mail"), start("draw"), start("draw")];
  expect(underWay()).toEqual(["draw"]);
  ends[1]?.done();
  await runs[1];
  expect(underWay()).toEqual(["draw"]);
  ends[2]?.failed(new Error("broke"));
  await expect(runs[2]).rejects.toThrow("broke");
  expect(underWay()).toEqual([]);
  ends[0]?.done();
  await runs[0];
});
