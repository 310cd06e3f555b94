import { join } from "node:path";

/**
 * @typedef {object} Parts
 * @property {import("./settings.mjs").Settings} settings
 * @property {string} folder the data folder
 * @property {import("./data-folder.mjs").Secrets} secrets
 * @property {import("./postgres.mjs").RunningCluster | undefined} cluster undefined when DATABASE_URL was given
 * @property {NodeJS.ProcessEnv} env of the start script
 */

/**
 * The environment the migrations and the application run with: what the caller set, completed. The caller's own
 * AUTH_SECRET, NODE_ENV and DEMO win.
 * @param {Parts} parts
 * @returns {NodeJS.ProcessEnv}
 */
export function applicationEnv({ settings, folder, secrets, cluster, env }) {
  return {
    ...env,
    ...(cluster === undefined ? {} : { DATABASE_URL: cluster.ownerUrl, APP_DATABASE_URL: cluster.appUrl }),
    NODE_ENV: env.NODE_ENV || (settings.isDev ? "development" : "production"),
    PORT: String(settings.port),
    HOST: settings.host,
    PUBLIC_URL: settings.publicUrl,
    FILES_DIR: settings.filesDir,
    MAIL_SINK_DIR: env.MAIL_SINK_DIR || join(folder, "mail"),
    AUTH_SECRET: env.AUTH_SECRET || secrets.auth,
    DEMO: env.DEMO || (isLoopback(settings.host) && isLoopback(new URL(settings.publicUrl).hostname) ? "auto" : "off"),
  };
}

/**
 * Whether only this machine can reach a host. The demo accounts' password is public, so a shop that others can reach
 * gets them only when DEMO says so.
 * @param {string} host a name or an address, with or without the brackets of a URL
 */
function isLoopback(host) {
  return host === "localhost" || host === "::1" || host === "[::1]" || /^127(\.\d{1,3}){3}$/.test(host);
}
