import { existsSync, readFileSync } from "node:fs";
import { say, secondsSince } from "./log.mjs";
import { Problem } from "./problem.mjs";
import { run } from "./processes.mjs";

const clusterSettings = "/etc/postgresql-common/createcluster.conf";

/** Whether this process may do anything on this machine. */
export function isRoot() {
  return process.getuid?.() === 0;
}

/**
 * Installs packages of the operating system from Debian's archive: directly as root, through sudo when that asks for
 * no password, and otherwise not at all.
 * @param {readonly string[]} names
 * @param {string} purpose what they are for, to stand in the sentence "… is needed for <purpose>"
 * @throws {Problem} naming the one command to type when this user may not install, or what failed
 */
export async function installDebianPackages(names, purpose) {
  const list = names.join(" ");
  const install = `apt-get update && apt-get install -y --no-install-recommends ${list}`;
  if ((await run("apt-get", ["--version"])).code !== 0) {
    throw new Problem(
      `${list} is needed for ${purpose}, and this system has no apt-get. Install it with your system's own tools.`,
    );
  }
  const prefix = await rootPrefix();
  if (prefix === undefined) {
    const command = (await run("sudo", ["-V"])).code === 0 ? `sudo sh -c '${install}'` : `su -c '${install}'`;
    throw new Problem(`${list} is needed for ${purpose}. Type this once, then start again:\n\n  ${command}\n`);
  }
  const startedAt = performance.now();
  say(`Installing ${list} from Debian's packages, for ${purpose} …`);
  if (names.includes("postgresql")) await declineMainCluster(prefix);
  await asRoot(prefix, ["apt-get", "update", "-q"]);
  await asRoot(prefix, [
    "apt-get",
    "install",
    "-y",
    "-q",
    "--no-install-recommends",
    "-o",
    "Dpkg::Options::=--force-confold",
    ...names,
  ]);
  say(`Installed ${list} in ${secondsSince(startedAt)} s.`);
}

/**
 * How to run a command as root, or undefined when this user can't.
 * @returns {Promise<string[] | undefined>}
 */
async function rootPrefix() {
  if (isRoot()) return ["env", "DEBIAN_FRONTEND=noninteractive"];
  return (await run("sudo", ["-n", "true"])).code === 0
    ? ["sudo", "-n", "env", "DEBIAN_FRONTEND=noninteractive"]
    : undefined;
}

/**
 * Debian's package makes and starts a cluster "main" of its own; Standproud keeps a private one and has no use for it.
 * The setting counts only while the package is being installed, and an administrator's own choice stays.
 * @param {readonly string[]} prefix
 */
async function declineMainCluster(prefix) {
  if (existsSync(clusterSettings) && decidesMainCluster(readFileSync(clusterSettings, "utf8"))) return;
  const script = `mkdir -p "$(dirname "$0")" && printf 'create_main_cluster = false\\n' >> "$0"`;
  await asRoot(prefix, ["sh", "-c", script, clusterSettings]);
}

/**
 * Whether the text of createcluster.conf already sets create_main_cluster, one way or the other.
 * @param {string} text
 */
export function decidesMainCluster(text) {
  return /^\s*create_main_cluster\s*=/m.test(text);
}

/**
 * @param {readonly string[]} prefix
 * @param {readonly string[]} command
 * @throws {Problem} with the end of its output
 */
async function asRoot(prefix, command) {
  const [program = "", ...args] = [...prefix, ...command];
  const { code, output } = await run(program, args);
  if (code === 0) return;
  const ending = output.trim().split("\n").slice(-12).join("\n");
  throw new Problem(`${command.join(" ")} failed (exit code ${code}):\n${ending}`);
}
