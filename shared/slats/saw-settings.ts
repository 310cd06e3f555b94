import type { Slat } from "./slat-layout.ts";

export type SawSetting = {
  /** Degrees off a square cut, to a tenth. */
  readonly setting: number;
  /** How many cuts are made at it, and how many of those must fit: the others are trimmed away and may be cut square. */
  readonly cuts: number;
  readonly fitting: number;
};

/** The settings that a set of slats asks of the saw, steepest first. */
export function sawSettings(slats: readonly Pick<Slat, "near" | "far">[]): SawSetting[] {
  const counted = new Map<number, SawSetting>();
  for (const cut of slats.flatMap(({ near, far }) => [...near, ...far])) {
    const setting = Math.round(cut.setting * 10) / 10;
    const { cuts, fitting } = counted.get(setting) ?? { cuts: 0, fitting: 0 };
    counted.set(setting, { setting, cuts: cuts + 1, fitting: fitting + (cut.mustFit ? 1 : 0) });
  }
  return [...counted.values()].toSorted((a, b) => b.setting - a.setting);
}

/** The settings of cuts that must fit and that a saw does not turn to. `most` in degrees off a square cut. */
export function settingsBeyond(slats: readonly Pick<Slat, "near" | "far">[], most: number): SawSetting[] {
  return sawSettings(slats).filter(({ setting, fitting }) => fitting > 0 && setting > most);
}
