import { describe, expect, it } from "vitest";
import { applicationEnv } from "#server/start/environment.mjs";
import { readSettings } from "#server/start/settings.mjs";

const secrets = { superuser: "s", owner: "o", app: "a", auth: "key-of-this-checkout" };
const cluster = {
  data: "/data",
  port: 5999,
  ownerUrl: "postgres://owner@127.0.0.1:5999/x",
  appUrl: "postgres://app@127.0.0.1:5999/x",
  isRunning: () => true,
  stop: async () => true,
};

function environment(env: NodeJS.ProcessEnv, args: string[] = []) {
  return applicationEnv({ settings: readSettings("/checkout", args, env), folder: "/kept", secrets, cluster, env });
}

describe("settings of a start", () => {
  it("serves on loopback, port 4600, when nothing is said", () => {
    expect(readSettings("/checkout", [], {})).toEqual({
      port: 4600,
      host: "127.0.0.1",
      publicUrl: "http://127.0.0.1:4600",
      filesDir: "/checkout/uploads",
      isDev: false,
    });
  });

  it("follows PORT, HOST, PUBLIC_URL, FILES_DIR and --dev", () => {
    const env = { PORT: "4711", HOST: "::", PUBLIC_URL: "https://signs.example/", FILES_DIR: "/srv/files" };
    expect(readSettings("/checkout", ["--dev"], env)).toEqual({
      port: 4711,
      host: "::",
      publicUrl: "https://signs.example",
      filesDir: "/srv/files",
      isDev: true,
    });
  });

  it("names this machine in the address when it listens everywhere, and puts IPv6 in brackets", () => {
    expect(readSettings("/checkout", [], { HOST: "0.0.0.0" }).publicUrl).toBe("http://127.0.0.1:4600");
    expect(readSettings("/checkout", [], { HOST: "::1" }).publicUrl).toBe("http://[::1]:4600");
  });

  it("refuses a port and an option that make no sense, in words", () => {
    expect(() => readSettings("/checkout", [], { PORT: "99999" })).toThrow('PORT is "99999"');
    expect(() => readSettings("/checkout", ["--fast"], {})).toThrow("Unknown option --fast");
  });
});

describe("the environment of the application", () => {
  it("names the private cluster with both roles and the kept key", () => {
    expect(environment({})).toMatchObject({
      DATABASE_URL: "postgres://owner@127.0.0.1:5999/x",
      APP_DATABASE_URL: "postgres://app@127.0.0.1:5999/x",
      AUTH_SECRET: "key-of-this-checkout",
      NODE_ENV: "production",
      PORT: "4600",
      MAIL_SINK_DIR: "/kept/mail",
    });
    expect(environment({}, ["--dev"]).NODE_ENV).toBe("development");
  });

  it("leaves a database of the caller's own as it is", () => {
    const env = { DATABASE_URL: "postgres://db.example/x", AUTH_SECRET: "mine" };
    const settings = readSettings("/checkout", [], env);
    const result = applicationEnv({ settings, folder: "/kept", secrets, cluster: undefined, env });
    expect(result).toMatchObject({ DATABASE_URL: "postgres://db.example/x", AUTH_SECRET: "mine" });
    expect(result.APP_DATABASE_URL).toBeUndefined();
  });

  it.each([
    { env: {}, demo: "auto" },
    { env: { HOST: "::1" }, demo: "auto" },
    { env: { HOST: "0.0.0.0" }, demo: "off" },
    { env: { PUBLIC_URL: "https://signs.example" }, demo: "off" },
    { env: { PUBLIC_URL: "https://signs.example", DEMO: "auto" }, demo: "auto" },
    { env: { DEMO: "off" }, demo: "off" },
  ])("loads the demo with its public password only where others can't reach it: $env gives $demo", ({ env, demo }) => {
    expect(environment(env).DEMO).toBe(demo);
  });
});
