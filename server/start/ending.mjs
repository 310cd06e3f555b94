import { interruptRunning } from "./processes.mjs";

/** Thrown between two steps of the start when somebody asked to stop. */
export class Ended extends Error {}

/**
 * @typedef {object} Ending
 * @property {Promise<"asked">} asked resolves at the first SIGINT, SIGTERM or SIGHUP
 * @property {() => boolean} isAsked
 * @property {() => void} check throws Ended when it was asked for
 */

/**
 * Listens for the signals that ask this process to stop. Only the first one counts: npm and the terminal both send
 * one for a single Ctrl-C.
 * @returns {Ending}
 */
export function listenForEnd() {
  let isAsked = false;
  /** @type {Promise<"asked">} */
  const asked = new Promise((resolve) => {
    for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) {
      process.on(signal, () => {
        if (isAsked) return;
        isAsked = true;
        interruptRunning();
        resolve("asked");
      });
    }
  });
  return {
    asked,
    isAsked: () => isAsked,
    check: () => {
      if (isAsked) throw new Ended();
    },
  };
}
