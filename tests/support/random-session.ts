import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { expect } from "vitest";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { commit, goToStep, type History, redo, startHistory, undo } from "@/features/mockup/model/history.ts";
import { emptyMockup } from "../unit/src/features/mockup/sample-mockup.ts";
import type { Chance } from "./random-chance.ts";
import { randomStep } from "./random-commands.ts";
import { seededRandom } from "./seeded-random.ts";

const folder = "src/features/mockup/model/commands";
/** Commands are built from these; none is an edit of its own. */
const notEdits = ["changeLayer", "changeLayers", "changeEveryLayer", "changePieces", "moveAll"];

/** The names of all commands: what is exported from their folder, takes a document first and gives one. */
export function commandNames(): string[] {
  const isCommand = /export function (\w+)\(\s*document: MockupDocument\b[\s\S]*?\): MockupDocument \{/g;
  return readdirSync(folder)
    .flatMap((file) => {
      const text = readFileSync(join(folder, file), "utf8");
      return text
        .split(/^(?=export function )/m)
        .flatMap((part) => [...part.matchAll(isCommand)].map(([, name = ""]) => name));
    })
    .filter((name) => !notEdits.includes(name))
    .sort();
}

/**
 * A session of so many random commands with undos, redos and leaps between them. After each the document breaks no rule of the
 * schema and the one before is as it was; at the end undo leads to the very first document and redo to the very last.
 * Gives how often each command changed something.
 */
export function playSession({ seed, steps }: { seed: number; steps: number }): ReadonlyMap<string, number> {
  const next = seededRandom(seed);
  let given = 0;
  const chance: Chance = {
    next,
    newId: () => {
      given += 1;
      return `id${given}`;
    },
  };
  const start = frozen(emptyMockup());
  let history = startHistory(start);
  const changed = new Map<string, number>();
  for (let step = 0; step < steps; step += 1) {
    const before = history.present;
    const { name, next: after } = randomStep(before, chance);
    const where = `step ${step} of seed ${seed}, ${name}`;
    if (after === before) continue;
    changed.set(name, (changed.get(name) ?? 0) + 1);
    expect(JSON.stringify(after) === JSON.stringify(before), `${where} gave another document of the same`).toBe(false);
    expect(documentSchema.safeParse(after).error?.issues ?? [], where).toEqual([]);
    history = commit(history, frozen(after), { label: name });
    history = wander(history, next);
  }
  const end = history.present;
  const future = history.future.length;
  while (history.past.length > 0) history = undo(history);
  expect(history.present).toBe(start);
  while (history.future.length > future) history = redo(history);
  expect(history.present).toBe(end);
  return changed;
}

/** Now and then back and forward again, as hands do. */
function wander(history: History, next: () => number): History {
  if (next() < 0.9) return history;
  const back = goToStep(history, Math.max(0, history.past.length - Math.ceil(next() * 5)));
  return next() < 0.5 ? redo(back) : goToStep(back, history.past.length);
}

/** Frozen through and through, so that whoever changes an older document throws. What it shares is frozen already. */
function frozen(document: MockupDocument): MockupDocument {
  freeze(document);
  return document;
}

function freeze(value: unknown): void {
  if (typeof value !== "object" || value === null || Object.isFrozen(value)) return;
  Object.freeze(value);
  for (const part of Object.values(value)) freeze(part);
}
