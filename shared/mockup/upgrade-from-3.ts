import type { UpgradeStep } from "./upgrade.ts";

/** From version 3: nothing was lettered from a face, no layer was locked and no sign hung in a photo. */
export const upgradeFrom3: UpgradeStep = (old) => ({
  ...old,
  layers: Array.isArray(old.layers) ? old.layers.map((layer: unknown) => withField(layer, { locked: false })) : [],
  lettering: [],
  presentation: withField(old.presentation, { photo: null }),
});

const withField = (value: unknown, field: object): unknown =>
  typeof value === "object" && value !== null ? { ...value, ...field } : value;
