import type { ArtworkWarning } from "./imported-artwork.ts";

/** Everything the pieces may show differently from the file, in the order in which people should read it. */
const warningTexts = {
  "size.guessed":
    "The file gives no true size, so we took 96 units for an inch. Type one true measure to set the size.",
  "size.rescaled":
    "The size in the file can't be a sign's, so the drawing was fitted to 300 mm. Type one true measure to set the size.",
  "size.from-density":
    "The size comes from the density that the picture states, which says how fine it is and rarely how large the sign will be. Type one true measure to set the size.",
  "size.of-picture":
    "A picture tells no true size, so its longer side became 300 mm. Type one true measure to set the size.",
  "picture.paper-dropped":
    "The white that fills the picture's rim was taken for paper and makes no pieces. Trace again and keep the background if it belongs to the logo.",
  "picture.shades":
    "The picture holds shades that run into each other, as a gradient or a photograph does. They were cut into flat colours: look at them, or choose fewer.",
  "picture.scaled-down": "The picture was scaled down to 2,000 pixels along its longer side before it was traced.",
  "text.font-replaced":
    "Text in the file was drawn in Merriweather, not in its own font. Turn text into paths and bring the file in again.",
  "text.missing-letters":
    "Some letters are not in our font and show as boxes. Turn text into paths and bring the file in again.",
  "text.lost": "Some text in the file could not be drawn. Turn text into paths and bring the file in again.",
  "image.left-out": "A picture inside the file was left out: only drawn shapes become pieces.",
  "foreign.left-out": "Web content embedded in the file was left out.",
  "reference.outside":
    "The file points to other files or addresses. They were not followed and what they hold is missing.",
  "script.removed": "The file holds scripts or event handlers. They were removed.",
  "animation.ignored": "The file is animated. The pieces show it without the animation.",
  "gradient.flattened": "A gradient was replaced by its average colour: a sheet has one colour.",
  "pattern.flattened": "A pattern fill was replaced by one of its colours: a sheet has one colour.",
  "opacity.mixed":
    "Translucent colours were mixed with what lies below them, or with white: a sheet can't be cut translucent.",
  "mask.soft": "A mask with soft edges or half-tones was replaced by mixed colours.",
  "filter.ignored": "An effect such as a blur or a shadow was left out.",
  "blend.ignored": "A blend mode was ignored: colours show as if painted plainly.",
  "frame.cut": "Parts of the drawing that lie outside its page were cut off, as a viewer would.",
  "shape.too-far": "A shape that reaches far outside the drawing was left out.",
  "number.unreadable": "Some shapes hold numbers that can't be read, such as NaN, and were left out.",
  "css.var": "The file uses CSS variables, which we don't read: check the colours.",
  "css.media": "The file changes with the screen it is shown on (@media). The pieces show it without that.",
  "css.important": "The file uses !important in its styles, which we don't read: check the colours.",
  "css.current-color": "The file takes colours from the page it is shown on (currentColor). Unset, they became black.",
  "css.vector-effect": "The file asks for lines that keep their width when scaled (vector-effect). They were scaled.",
  "css.transform-origin": "The file sets transform-origin, which we don't read: check the positions.",
  "pdf.font-missing":
    "Letters whose font is not in the PDF were left out. Turn text into outlines in the drawing program and bring the file in again.",
  "pdf.hairline":
    "Lines of no width were left out: a printer draws them as thin as it can, a cutter can't. Give them a width.",
  "pdf.layer-hidden": "The PDF has hidden layers. They were left out, as a reader would leave them out.",
  "pdf.mask-left-out": "A mask made of a picture was left out. What it should fade out shows whole.",
  "pdf.comments": "Comments, stamps or form fields on the page were left out: only its drawing becomes pieces.",
  "pdf.damaged":
    "Parts of the page could not be read, or hold a very large picture, and were left out. Look at what is missing.",
} as const;

export type WarningCode = keyof typeof warningTexts;

export const warningCodes = Object.keys(warningTexts) as readonly WarningCode[];

/** The warnings for the codes met, each once and in the table's order. */
export function artworkWarnings(codes: ReadonlySet<WarningCode>): ArtworkWarning[] {
  return warningCodes.filter((code) => codes.has(code)).map((code) => ({ code, text: warningTexts[code] }));
}
