import { mkdirSync, mkdtempSync, readFileSync, rmSync, statSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { checkoutName, dataFolder, readOrMakeSecrets, secretsFile } from "#server/start/data-folder.mjs";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "data-folder-"));
});
afterEach(() => {
  rmSync(folder, { recursive: true });
});

describe("the data folder of a checkout", () => {
  it("is under /var/lib for root, whatever root's home", () => {
    const path = dataFolder("/root/signs", { HOME: "/root" }, { asRoot: true });
    expect(path).toBe(`/var/lib/standproud/${checkoutName("/root/signs")}`);
  });

  it("is in the user's data folder otherwise", () => {
    const name = checkoutName("/home/ada/signs");
    const ofUser = (env: NodeJS.ProcessEnv) => dataFolder("/home/ada/signs", env, { asRoot: false });
    expect(ofUser({ HOME: "/home/ada" })).toBe(`/home/ada/.local/share/standproud/${name}`);
    expect(ofUser({ HOME: "/home/ada", XDG_DATA_HOME: "/data/ada" })).toBe(`/data/ada/standproud/${name}`);
  });

  it("is what STANDPROUD_DATA says, read from the checkout when relative", () => {
    expect(dataFolder("/home/ada/signs", { STANDPROUD_DATA: "/srv/signs" })).toBe("/srv/signs");
    expect(dataFolder("/home/ada/signs", { STANDPROUD_DATA: "../kept" })).toBe("/home/ada/kept");
  });

  it("tells two checkouts of one name apart and keeps odd letters out of its name", () => {
    expect(checkoutName("/home/ada/signs")).not.toBe(checkoutName("/home/bob/signs"));
    expect(checkoutName("/home/ada/Signs (copy) 2")).toMatch(/^signs-copy-2-[0-9a-f]{12}$/);
  });
});

describe("secrets", () => {
  it("are made once, each another, in a file for its owner's eyes", () => {
    const made = readOrMakeSecrets(folder);
    expect(new Set(Object.values(made)).size).toBe(4);
    for (const secret of Object.values(made)) expect(secret).toMatch(/^[0-9a-f]{64}$/);
    expect(statSync(secretsFile(folder)).mode & 0o777).toBe(0o600);
    expect(readOrMakeSecrets(folder)).toEqual(made);
    expect(JSON.parse(readFileSync(secretsFile(folder), "utf8"))).toEqual(made);
  });

  it("are not made anew beside a database that knows the old ones", () => {
    mkdirSync(join(folder, "pgdata"));
    expect(() => readOrMakeSecrets(folder)).toThrow("is missing, but the database beside it needs its passwords");
  });
});
