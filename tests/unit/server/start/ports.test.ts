import { createServer } from "node:net";
import { describe, expect, it } from "vitest";
import { findFreePort, isPortFree, parsePort } from "#server/start/ports.mjs";

/** Runs `use` while something listens on a port of its own choice. */
async function whileTaken(use: (port: number) => Promise<void>): Promise<void> {
  const server = createServer();
  const port = await new Promise<number>((resolve) => {
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      resolve(address !== null && typeof address === "object" ? address.port : 0);
    });
  });
  try {
    await use(port);
  } finally {
    await new Promise((resolve) => server.close(resolve));
  }
}

describe("ports", () => {
  it("sees that a port is taken, and free again afterwards", async () => {
    let taken = 0;
    await whileTaken(async (port) => {
      taken = port;
      expect(await isPortFree(port)).toBe(false);
    });
    expect(await isPortFree(taken)).toBe(true);
  });

  it("keeps the remembered port when it is free and leaves it when it is taken", async () => {
    const remembered = await findFreePort();
    expect(await findFreePort(remembered)).toBe(remembered);
    await whileTaken(async (port) => {
      const other = await findFreePort(port);
      expect(other).not.toBe(port);
      expect(other).toBeGreaterThan(1023);
    });
  });

  it("passes on what else is wrong with an address", async () => {
    // 203.0.113.0/24 is set aside for documentation (RFC 5737), so it is no machine's own.
    await expect(isPortFree(4600, "203.0.113.7")).rejects.toThrow("EADDRNOTAVAIL");
  });

  it.each([
    { text: "4600", port: 4600 },
    { text: " 5432\n", port: 5432 },
    { text: "65535", port: 65535 },
    { text: "65536", port: undefined },
    { text: "0", port: undefined },
    { text: "-1", port: undefined },
    { text: "80x", port: undefined },
    { text: "4e3", port: undefined },
    { text: "", port: undefined },
    { text: undefined, port: undefined },
  ])("reads $text as $port", ({ text, port }) => {
    expect(parsePort(text)).toBe(port);
  });
});
