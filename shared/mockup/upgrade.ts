import type { z } from "zod";
import { documentSchema, documentVersion, type MockupDocument } from "./document.ts";
import { upgradeFrom1 } from "./upgrade-from-1.ts";
import { upgradeFrom2 } from "./upgrade-from-2.ts";
import { upgradeFrom3 } from "./upgrade-from-3.ts";

export type ReadOutcome =
  | { readonly ok: true; readonly document: MockupDocument }
  | { readonly ok: false; readonly reason: string };

/** Turns a document of one version into the next one, as plain JSON: what an old version held has no type any more. */
export type UpgradeStep = (old: Readonly<Record<string, unknown>>) => Record<string, unknown>;

/** By the version a step starts from. */
const steps: Readonly<Record<number, UpgradeStep>> = { 1: upgradeFrom1, 2: upgradeFrom2, 3: upgradeFrom3 };

/**
 * A stored document in today's version. The stored text itself stays as it was. Refused with the reason when it is no
 * document, was made by a later version than this one, or breaks a rule of the schema.
 */
export function readDocument(json: unknown): ReadOutcome {
  const upgraded = upgradeTo(json, documentVersion, steps);
  if (!upgraded.ok) return upgraded;
  const parsed = documentSchema.safeParse(upgraded.value);
  return parsed.success ? { ok: true, document: parsed.data } : { ok: false, reason: firstIssue(parsed.error) };
}

/** Runs the steps from the value's version up to `target`, each on what the one before gave. */
export function upgradeTo(
  json: unknown,
  target: number,
  table: Readonly<Record<number, UpgradeStep>>,
): { readonly ok: true; readonly value: Record<string, unknown> } | { readonly ok: false; readonly reason: string } {
  if (!isRecord(json)) return { ok: false, reason: "This is no mockup: an object with a version was expected." };
  const { version } = json;
  if (typeof version !== "number" || !Number.isInteger(version) || version < 1) {
    return { ok: false, reason: "This is no mockup: it does not say its version." };
  }
  if (version > target) {
    return {
      ok: false,
      reason: `This mockup has version ${version}, made by a later Standproud. This one reads up to ${target}.`,
    };
  }
  let value: Record<string, unknown> = { ...json };
  for (let from = version; from < target; from++) {
    const step = table[from];
    if (!step) return { ok: false, reason: `There is no way from version ${from} to ${from + 1} of a mockup.` };
    value = { ...step(value), version: from + 1 };
  }
  return { ok: true, value };
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

function firstIssue(error: z.ZodError): string {
  const [issue] = error.issues;
  if (!issue) return "This mockup breaks a rule.";
  const where = issue.path.map(String).join(" / ");
  const more = error.issues.length > 1 ? ` (and ${error.issues.length - 1} more)` : "";
  return where ? `At ${where}: ${issue.message}${more}` : `${issue.message}${more}`;
}
