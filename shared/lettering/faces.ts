/** A typeface that letters are cut in: one weight of a family, shipped as one file under an open licence. */
export type Face = {
  /** What documents call it. A key that was once given out is never given to another file. */
  readonly key: string;
  readonly family: string;
  /** As people say it: bold, black. */
  readonly weight: string;
  /** The same as a number from 100 to 900, as style sheets want it. */
  readonly cssWeight: number;
  /** What sign it is good for. */
  readonly suits: string;
  /** The package it comes in, whose LICENSE is its licence's text, and its file there. */
  readonly package: string;
  readonly file: string;
  /** SPDX name of its licence. */
  readonly licence: string;
};

const face = (family: string, cssWeight: number, weight: string, suits: string): Face => {
  const name = family.toLowerCase().replaceAll(" ", "-");
  return {
    key: `${name}-${cssWeight}`,
    family,
    weight,
    cssWeight,
    suits,
    package: `@fontsource/${name}`,
    file: `files/${name}-latin-${cssWeight}-normal.woff`,
    licence: "OFL-1.1",
  };
};

/** The faces that words can be set in, plain ones first. What each suits is our own judgment. */
export const faces: readonly Face[] = [
  face("Montserrat", 600, "semibold", "Round and even: offices, clinics, lobbies."),
  face("Montserrat", 800, "extra bold", "Heavy enough to stand free on standoffs."),
  face("Atkinson Hyperlegible", 700, "bold", "Drawn so that no letter is taken for another: doors and ways."),
  face("Merriweather Sans", 700, "bold", "Open and warm: schools, practices, shops."),
  face("Josefin Sans", 600, "semibold", "Pointed and light on its feet: salons, galleries."),
  face("Oswald", 500, "medium", "Narrow: long names on a short board."),
  face("Oswald", 700, "bold", "Narrow and strong: workshops, gyms."),
  face("Bitter", 700, "bold", "Square feet, even strokes: cafés, bakeries, barns."),
  face("Merriweather", 700, "bold", "A reading face with sturdy feet: bookshops, law."),
  face("Merriweather", 900, "black", "The same with more to glue on."),
  face("Cinzel", 600, "semibold", "Capitals after Roman inscriptions: inns, estates, memorials."),
  face("Cinzel", 800, "extra bold", "The same, for small sizes and thick sheet."),
  face("Lobster", 400, "bold script", "Letters run into each other: join them, or space them out."),
  face("Stardos Stencil", 700, "bold stencil", "Bridges hold the counters: cut through and painted."),
];

/** A face by its key; null for a key that no face has. */
export function faceOf(key: string): Face | null {
  return faces.find((one) => one.key === key) ?? null;
}

/** Family and weight in one, as lists show a face. */
export const nameOfFace = ({ family, weight }: Face): string => `${family}, ${weight}`;
