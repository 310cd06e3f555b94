import type { ArtworkRefusal } from "./imported-artwork.ts";

/** Every reason an artwork file is turned away, in words for the person who brought it: what is wrong, what to do. */
const refusalTexts = {
  "file.empty": "The file is empty. Export it again from the drawing program and bring that one in.",
  "file.too-large": "The file is larger than 10 MB. Remove embedded pictures and hidden layers, then export it again.",
  "file.unknown":
    "This is neither a drawing in SVG or PDF nor a picture in PNG or JPEG. Export the logo as one of them and bring that one in.",
  "file.unpacking":
    "The compressed file is damaged or unpacks to more than 16 MB. Save it as a plain SVG, not compressed, and try again.",
  "file.encoding": "The file's letters can't be read in the encoding it names. Save it as SVG in UTF-8 and try again.",
  "svg.broken": "The file is not complete, well-formed SVG. It may be cut off: export it again and try once more.",
  "svg.not-svg": "The file is XML but not an SVG drawing. Export the logo as SVG and bring that one in.",
  "svg.entities":
    "The file builds its contents from entities, which we don't expand. Save it as plain SVG and try again.",
  "svg.too-many-elements":
    "The file holds more than 100,000 elements, or repeats its symbols without an end. Simplify the drawing and export it again.",
  "svg.too-deep": "The file nests its groups more than 200 deep. Ungroup the drawing and export it again.",
  "svg.no-size":
    "The drawing's width or height is zero, so nothing of it shows. Set its page to the logo's size and export it again.",
  "svg.unreadable":
    "The file uses SVG in a way we can't read. Save it as plain SVG, with everything turned into paths, and try again.",
  "svg.too-many-paths": "The drawing has more than 20,000 paths. Simplify it to what shall be cut and export it again.",
  "svg.too-many-points":
    "The drawing's outlines need more than 400,000 points. Simplify the paths and export it again.",
  "svg.too-many-dashes":
    "The drawing's dashed lines fall into more than 20,000 dashes. Use longer dashes or a solid line and export it again.",
  "svg.too-many-pieces":
    "The drawing falls into more than 5,000 pieces, more than anyone could cut. Simplify it and export it again.",
  "svg.nothing-visible":
    "The drawing shows nothing that could be cut: no filled shape and no line. Check that the logo is on its page and visible.",
  "pdf.broken":
    "The PDF is damaged or cut off, so no page of it can be read. Save it again from the drawing program and bring that one in.",
  "pdf.password": "The PDF is locked with a password. Save a copy without one and bring that one in.",
  "pdf.unpacking":
    "The PDF unpacks to more than 100 MB. Remove pictures and hidden layers from it, or export the logo as SVG.",
  "pdf.only-pictures":
    "The page holds a picture and no drawn shapes. Bring the picture itself in, or ask for the drawing it was made from.",
  "picture.unreadable":
    "The picture is damaged or cut off, or uses its format in a way we can't read. Open it in a picture program, save it again as PNG and bring that one in.",
  "picture.too-large":
    "The picture has more than 40 million pixels. Scale it down to 4,000 pixels along its longer side and bring that one in.",
  "picture.too-small":
    "The picture is smaller than 16 pixels on a side, too coarse to be traced. Ask for a larger one, or for the logo as SVG.",
  "picture.print-colours":
    "This JPEG holds print colours (CMYK), which screens show in different ways. Save it in RGB colours, as PNG if possible, and bring that one in.",
  "picture.nothing-left":
    "Nothing of the picture is left to cut: it is empty, of one colour that was dropped, or all of it counts as specks. Keep the background or choose a smaller speck, and trace it again.",
  "picture.too-many-pieces":
    "The picture falls into more than 5,000 pieces, more than anyone could cut. Choose fewer colours or a larger smallest area, and trace it again.",
  "picture.too-slow":
    "The picture took longer than a minute to trace. Scale it down, choose fewer colours, and try again.",
  "import.too-slow":
    "The drawing took longer than 5 seconds to work out. Merge its overlapping shapes or simplify the paths and try again.",
  "import.failed":
    "Working out this drawing failed on our side. Save it as plain SVG, with everything turned into paths and try again.",
} as const;

export type RefusalCode = keyof typeof refusalTexts;

export const refusalCodes = Object.keys(refusalTexts) as readonly RefusalCode[];

/** The refusal for a code, with its sentence. */
export function artworkRefusal(code: RefusalCode): ArtworkRefusal {
  return { code, text: refusalTexts[code] };
}

/** Thrown inside the importer to leave its recursion; the importer's own functions turn it into an outcome. */
export class ArtworkRefused extends Error {
  constructor(readonly code: RefusalCode) {
    super(refusalTexts[code]);
    this.name = "ArtworkRefused";
  }
}
