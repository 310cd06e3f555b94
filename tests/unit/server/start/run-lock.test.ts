import { type ChildProcess, spawn } from "node:child_process";
import { existsSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { isAlive } from "#server/start/processes.mjs";
import { leaveFolder, recordChildren, takeFolder } from "#server/start/run-lock.mjs";

let folder: string;
let children: ChildProcess[];
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "run-lock-"));
  children = [];
});
afterEach(() => {
  for (const child of children) child.kill("SIGKILL");
  rmSync(folder, { recursive: true });
});

/** Runs a script of this name that does nothing until it is ended. */
async function runScript(name: string): Promise<{ pid: number; ended: Promise<void> }> {
  const script = join(folder, name);
  writeFileSync(script, 'process.stdout.write("up"); setInterval(() => undefined, 1000);');
  const child = spawn(process.execPath, [script], { stdio: ["ignore", "pipe", "ignore"] });
  children.push(child);
  const ended = new Promise<void>((resolve) => child.once("exit", () => resolve()));
  await new Promise((resolve) => child.stdout?.once("data", resolve));
  return { pid: child.pid ?? 0, ended };
}

const record = (start: number, pid: number, what: string) =>
  writeFileSync(join(folder, "running.json"), JSON.stringify({ start, children: [{ pid, what }] }));

describe("one start at a time", () => {
  it("refuses while another start uses the folder, and names it", async () => {
    const other = await runScript("start.mjs");
    record(other.pid, 0, "");
    await expect(takeFolder(folder)).rejects.toThrow(`already running from this checkout (process ${other.pid})`);
    expect(isAlive(other.pid)).toBe(true);
  });

  it("takes over after a start that was killed, and ends what that left running", async () => {
    const gone = await runScript("start.mjs");
    process.kill(gone.pid, "SIGKILL");
    await gone.ended;
    const left = await runScript("left-behind.mjs");
    record(gone.pid, left.pid, "left-behind.mjs");
    await takeFolder(folder);
    await left.ended;
    expect(isAlive(left.pid)).toBe(false);
  });

  it("spares a program that only got the number of one that ended", async () => {
    const stranger = await runScript("stranger.mjs");
    record(stranger.pid, stranger.pid, "dist/server/index.mjs");
    await takeFolder(folder);
    expect(isAlive(stranger.pid)).toBe(true);
  });

  it("leaves nothing behind when it ends in order", async () => {
    await takeFolder(folder);
    recordChildren(folder, [{ pid: process.pid, what: "x" }]);
    leaveFolder(folder);
    expect(existsSync(join(folder, "running.json"))).toBe(false);
  });
});
