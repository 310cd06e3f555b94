import type { Config } from "tailwindcss";

/** The palette, type and measure of the drawing office. Components name these tokens and never a raw colour. */
export const colours = {
  paper: "#FBF8F1",
  sheet: "#FFFFFF",
  linen: "#F1EADC",
  rule: "#D8CFBD",
  ink: "#1F1D1A",
  graphite: "#57524A",
  madder: "#96372B",
  verdigris: "#28685C",
  ochre: "#8A5A12",
  indigo: "#34416B",
  oxblood: "#7A1F2B",
} as const;

export default {
  content: ["./index.html", "./src/**/*.{ts,tsx}"],
  theme: {
    colors: { ...colours, transparent: "transparent", current: "currentColor" },
    fontFamily: {
      serif: ["Merriweather", "Georgia", "serif"],
      sans: ["Merriweather Sans", "Verdana", "sans-serif"],
    },
    borderRadius: { none: "0", DEFAULT: "2px", full: "9999px" },
    extend: {
      fontSize: { fine: ["0.8125rem", "1.25rem"] },
    },
  },
} satisfies Config;
