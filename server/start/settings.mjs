import { join } from "node:path";
import { parsePort } from "./ports.mjs";
import { Problem } from "./problem.mjs";

/**
 * @typedef {object} Settings
 * @property {number} port
 * @property {string} host the address to listen on
 * @property {string} publicUrl the address people use, without a slash at its end
 * @property {string} filesDir
 * @property {boolean} isDev
 */

/**
 * What the start script needs from its command line and environment; everything else is the application's to read.
 * @param {string} root
 * @param {readonly string[]} args
 * @param {NodeJS.ProcessEnv} env
 * @returns {Settings}
 * @throws {Problem} for an option or a port that makes no sense
 */
export function readSettings(root, args, env) {
  const unknown = args.find((arg) => arg !== "--dev");
  if (unknown !== undefined) throw new Problem(`Unknown option ${unknown}. The only one is --dev.`);
  const port = parsePort(env.PORT || "4600");
  if (port === undefined) throw new Problem(`PORT is "${env.PORT}", but a port is a whole number from 1 to 65535.`);
  const host = env.HOST || "127.0.0.1";
  return {
    port,
    host,
    publicUrl: (env.PUBLIC_URL || `http://${reachableHost(host)}:${port}`).replace(/\/+$/, ""),
    filesDir: env.FILES_DIR || join(root, "uploads"),
    isDev: args.includes("--dev"),
  };
}

/**
 * The address by which this machine itself reaches what listens on `host`; brackets around IPv6, as in URLs.
 * @param {string} host
 */
export function reachableHost(host) {
  if (host === "0.0.0.0" || host === "::") return "127.0.0.1";
  return host.includes(":") ? `[${host}]` : host;
}
