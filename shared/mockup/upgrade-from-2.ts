import type { UpgradeStep } from "./upgrade.ts";

/** From version 2: a backer was a plain plank without slats, and no sign had a frame. */
export const upgradeFrom2: UpgradeStep = (old) => {
  const backer = typeof old.backer === "object" && old.backer !== null ? old.backer : {};
  const { kind: _, ...rest } = { kind: undefined, ...backer };
  return { ...old, backer: { ...rest, slats: null }, frame: null };
};
