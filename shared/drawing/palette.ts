import type { Colour } from "./display-list.ts";

/** The drawing office's inks, the same values as the theme's tokens (a test compares them). */
export const ink: Colour = "#1F1D1A";
export const graphite: Colour = "#57524A";
export const rule: Colour = "#D8CFBD";
export const linen: Colour = "#F1EADC";
export const sheetWhite: Colour = "#FFFFFF";
export const madder: Colour = "#96372B";
export const verdigris: Colour = "#28685C";
export const ochre: Colour = "#8A5A12";
export const oxblood: Colour = "#7A1F2B";

type Channels = readonly [number, number, number];

/** Reads #RRGGBB into three whole numbers from 0 to 255. Throws on anything else: colours are checked where they enter. */
export function colourChannels(colour: Colour): Channels {
  if (!/^#[0-9a-fA-F]{6}$/.test(colour)) throw new Error(`Not a colour: ${colour}`);
  const value = Number.parseInt(colour.slice(1), 16);
  return [(value >> 16) & 255, (value >> 8) & 255, value & 255];
}

/** The colour a share of the way from one to another, channel by channel; 0 is `from`, 1 is `to`. */
export function mixColours(from: Colour, to: Colour, share: number): Colour {
  const a = colourChannels(from);
  const b = colourChannels(to);
  const mixed = a.map((channel, index) => Math.round(channel + ((b[index] ?? channel) - channel) * share));
  return `#${mixed.map((channel) => channel.toString(16).padStart(2, "0")).join("")}`.toUpperCase();
}
