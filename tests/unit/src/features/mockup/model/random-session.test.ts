import { expect, it } from "vitest";
import { randomCommands } from "../../../../../support/random-commands.ts";
import { commandNames, playSession } from "../../../../../support/random-session.ts";

it("has every command of the mockup in the table that chance draws from", () => {
  expect(Object.keys(randomCommands).sort()).toEqual(commandNames());
  expect(commandNames()).toContain("movePieces");
});

it("leads back to the start and forward to the end of 500 random commands, through documents that are always valid", () => {
  const changed = playSession({ seed: 20_261_201, steps: 500 });
  // Most of the commands did something, so that undo had something to bring back.
  expect(changed.size).toBeGreaterThan(Object.keys(randomCommands).length * 0.7);
});
