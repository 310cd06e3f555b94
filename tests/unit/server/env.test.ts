import { expect, it } from "vitest";
import { appDatabaseUrl, readEnvironment } from "#server/env.ts";

const good = {
  PUBLIC_URL: "https://signs.example/",
  DATABASE_URL: "postgres://owner@127.0.0.1/standproud",
  AUTH_SECRET: "0123456789abcdef0123456789abcdef",
};

it("takes what is given and fills in the rest", () => {
  const env = readEnvironment({ ...good, PORT: "4700", SMTP_URL: "" });
  expect(env).toMatchObject({ PUBLIC_URL: "https://signs.example", PORT: 4700, WORKER: "inside", DEMO: "off" });
  expect(env.SMTP_URL).toBeUndefined();
  expect(appDatabaseUrl(env)).toBe(good.DATABASE_URL);
  expect(appDatabaseUrl({ ...env, APP_DATABASE_URL: "postgres://app@127.0.0.1/standproud" })).toContain("app@");
});

it("names every field that can't be used, and none of their values", () => {
  const bad = {
    ...good,
    PORT: "99999",
    AUTH_SECRET: "short-secret",
    DATABASE_URL: "mysql://user:pw-1234@h/db",
    WORKER: "both",
  };
  let message = "";
  try {
    readEnvironment(bad);
  } catch (error) {
    message = error instanceof Error ? error.message : "";
  }
  const fields = message
    .split("\n")
    .slice(1)
    .map((line) => line.trim().split(":")[0]);
  expect(fields.sort()).toEqual(["AUTH_SECRET", "DATABASE_URL", "PORT", "WORKER"]);
  expect(message).not.toContain("short-secret");
  expect(message).not.toContain("pw-1234");
});
