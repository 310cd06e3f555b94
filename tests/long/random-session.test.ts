import { expect, it } from "vitest";
import { randomCommands } from "../support/random-commands.ts";
import { playSession } from "../support/random-session.ts";

const changed = new Map<string, number>();

it.each([1, 2, 3])("5,000 random commands of seed %i are undone to the start and done again to the end", (seed) => {
  for (const [name, times] of playSession({ seed, steps: 5_000 })) changed.set(name, (changed.get(name) ?? 0) + times);
});

it("every command changed something in one of them", () => {
  for (const name of Object.keys(randomCommands)) expect(changed.get(name) ?? 0, name).toBeGreaterThan(0);
});
