import { existsSync, readdirSync, realpathSync } from "node:fs";
import { delimiter, dirname, join } from "node:path";
import { installDebianPackages } from "./debian.mjs";
import { Problem } from "./problem.mjs";
import { run } from "./processes.mjs";

/** What a private cluster needs. Debian keeps them off the PATH, all in one folder per version. */
const needed = ["initdb", "pg_ctl", "postgres", "psql"];
const debianRoot = "/usr/lib/postgresql";
const oldestMajor = 14;

/**
 * @typedef {object} PostgresPrograms
 * @property {string} folder where initdb, pg_ctl, postgres and psql are
 * @property {number} major the version before the first dot
 */

/**
 * The major version in the words of `postgres --version`.
 * @param {string} text such as "postgres (PostgreSQL) 15.18 (Debian 15.18-0+deb12u1)"
 * @returns {number | undefined}
 */
export function parseMajor(text) {
  const found = /\(PostgreSQL\) (\d+)/.exec(text);
  return found?.[1] === undefined ? undefined : Number(found[1]);
}

/**
 * Every set of PostgreSQL server programs on this machine, the newest first.
 * @returns {Promise<PostgresPrograms[]>}
 */
export async function findPostgresPrograms() {
  const versions = existsSync(debianRoot) ? readdirSync(debianRoot) : [];
  const folders = [
    ...versions.map((version) => join(debianRoot, version, "bin")),
    // A link in a folder of the PATH leads to the folder that has them all.
    ...(process.env.PATH ?? "").split(delimiter).flatMap((folder) => {
      const initdb = join(folder, "initdb");
      return existsSync(initdb) ? [dirname(realpathSync(initdb))] : [];
    }),
  ];
  const complete = [...new Set(folders)].filter((folder) => needed.every((name) => existsSync(join(folder, name))));
  const found = await Promise.all(
    complete.map(async (folder) => {
      const { output } = await run(join(folder, "postgres"), ["--version"]);
      return { folder, major: parseMajor(output) ?? 0 };
    }),
  );
  return found.filter(({ major }) => major >= oldestMajor).sort((a, b) => b.major - a.major);
}

/**
 * The programs for a cluster, installed from Debian's packages when there are none.
 * @param {number} [major] the version that wrote an existing cluster; only that one can open it
 * @returns {Promise<PostgresPrograms>}
 * @throws {Problem} when they are not there and can't be installed
 */
export async function ensurePostgresPrograms(major) {
  const fits = (/** @type {PostgresPrograms} */ programs) => major === undefined || programs.major === major;
  const present = (await findPostgresPrograms()).find(fits);
  if (present !== undefined) return present;
  await installDebianPackages([major === undefined ? "postgresql" : `postgresql-${major}`], "Standproud's database");
  const installed = (await findPostgresPrograms()).find(fits);
  if (installed !== undefined) return installed;
  throw new Problem(
    `PostgreSQL ${major ?? `${oldestMajor} or newer`} was installed, but initdb, pg_ctl, postgres and psql are in no folder known here. Set DATABASE_URL to use a server of your own.`,
  );
}
