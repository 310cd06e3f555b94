import { expect, it } from "vitest";
import { interruptRunning, isAlive, run, waitUntilGone } from "#server/start/processes.mjs";

const node = (script: string): [string, string[]] => [process.execPath, ["-e", script]];

it("collects what a program writes, on both streams, and its code", async () => {
  const outcome = await run(
    ...node('process.stdout.write("out "); process.stderr.write("err"); process.exitCode = 3;'),
  );
  expect(outcome.code).toBe(3);
  expect(outcome.output.split(" ").sort()).toEqual(["err", "out"]);
});

it("passes input and exactly the environment it was given", async () => {
  const script =
    'process.stdin.on("data", (d) => process.stdout.write([d, process.env.A, process.env.HOME ?? "none"].join("|")));';
  expect(await run(...node(script), { input: "words", env: { A: "1" } })).toEqual({
    code: 0,
    output: "words|1|none",
  });
});

it("says that there is no such program instead of throwing", async () => {
  expect((await run("no-such-program-here", [])).code).toBe(127);
});

it("ends what it waits for when interrupted, but lets programs apart finish", async () => {
  const waiting = run(...node("setInterval(() => undefined, 1000);"));
  const apart = run(...node('setTimeout(() => process.stdout.write("done"), 300);'), { apart: true });
  interruptRunning();
  expect((await waiting).code).toBe(128);
  expect(await apart).toEqual({ code: 0, output: "done" });
});

it("sees whether a process lives", async () => {
  expect(isAlive(process.pid)).toBe(true);
  expect(await waitUntilGone(process.pid, 60)).toBe(false);
  const { output } = await run(...node("process.stdout.write(String(process.pid));"));
  expect(isAlive(Number(output))).toBe(false);
});
