import { createServer } from "node:net";
import { errorCode } from "./problem.mjs";

/**
 * Whether a TCP port can be listened on at this address.
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>} false when another program holds it
 * @throws the system's error for anything else, such as an address that is not this machine's
 */
export function isPortFree(port, host = "127.0.0.1") {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", (error) => (errorCode(error) === "EADDRINUSE" ? resolve(false) : reject(error)));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/**
 * A TCP port on loopback that nothing listens on; the wanted one when that is free.
 * @param {number} [wanted] a port remembered from before
 * @returns {Promise<number>}
 */
export async function findFreePort(wanted) {
  if (wanted !== undefined && (await isPortFree(wanted))) return wanted;
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", reject);
    server.listen({ port: 0, host: "127.0.0.1", exclusive: true }, () => {
      const address = server.address();
      server.close(() =>
        address !== null && typeof address === "object" ? resolve(address.port) : reject(new Error("No free port.")),
      );
    });
  });
}

/**
 * Reads a port number from text, as a variable of the environment or a remembered file holds it.
 * @param {string | undefined} text
 * @returns {number | undefined} undefined when it is not a whole number from 1 to 65535
 */
export function parsePort(text) {
  const trimmed = text?.trim() ?? "";
  const port = Number(trimmed);
  return /^\d{1,5}$/.test(trimmed) && port >= 1 && port <= 65535 ? port : undefined;
}
