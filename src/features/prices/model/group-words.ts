import type { PriceGroup } from "./price-fields.ts";

/** The headings of the price book, and what a reader has to know to fill each in. */
export const groupWords: Readonly<Record<PriceGroup, { readonly title: string; readonly under: string }>> = {
  sheets: {
    title: "Sheet acrylic",
    under:
      "Waste is what is cut away and not used again, on top of the pieces’ own area. Whole sheets of a cut plan get none.",
  },
  boards: {
    title: "Boards",
    under: "Planks, and what is glued under slats. “Each” is a board cut to size for one sign.",
  },
  strips: {
    title: "Strips of wood",
    under:
      "What slats, spines and frames are cut from, by their section. Without a strip of its own a slat is taken by area from the board of its thickness.",
  },
  hardware: { title: "Hardware", under: "One of a pack is charged in proportion." },
  adhesives: { title: "Adhesives", under: "What a container costs and holds, and how much of it a bond takes." },
  finishes: { title: "Finishes", under: "For a square metre of one coat: what is put on, and the work of it." },
  machines: {
    title: "Machines",
    under:
      "Setting up counts once for all signs of a job: for each sheet stock that is cut, and for each setting of the saw.",
  },
  labour: { title: "Work by hand", under: "What an hour costs, and how long one takes." },
};
