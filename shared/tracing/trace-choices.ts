import { z } from "zod";

export const smoothings = ["close", "usual", "smooth", "smoothest"] as const;
export const backgrounds = ["automatic", "everywhere", "around", "kept"] as const;

const hex = z.string().regex(/^#[0-9A-F]{6}$/);

/** How a picture is to be traced, as a maker chooses it. Colours are named as they were found. */
export const traceChoices = z.strictObject({
  /** Number of colours; null finds those that are clearly apart. */
  colours: z.number().int().min(1).max(24).nullable(),
  /** Areas smaller than so many pixels of the traced picture are given to what lies around them. */
  speckle: z.number().int().min(0).max(20_000),
  /** How closely outlines follow the pixels. */
  smoothing: z.enum(smoothings),
  /** Colours that become another one. */
  joined: z.array(z.strictObject({ from: hex, into: hex })).max(24),
  /** Colours that become no pieces. */
  dropped: z.array(hex).max(24),
  /** The colour that fills the rim: dropped everywhere, dropped where it reaches the rim, or kept. Automatic drops a near white. */
  background: z.enum(backgrounds),
});
export type TraceChoices = z.infer<typeof traceChoices>;

/** How a picture is traced when it is brought in. */
export const firstChoices: TraceChoices = {
  colours: null,
  speckle: 12,
  smoothing: "usual",
  joined: [],
  dropped: [],
  background: "automatic",
};
