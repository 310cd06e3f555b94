import { defaultLimits } from "#shared/dry-fit/limits.ts";
import type { Site } from "@/features/mockup/model/propose-holes.ts";

export const inside: Site = { place: "inside", limits: defaultLimits };
