import {
  beginText,
  clipEvenOdd,
  closePath,
  concatTransformationMatrix,
  drawObject,
  endPath,
  endText,
  lineTo,
  moveTo,
  PDFBool,
  PDFDocument,
  type PDFFont,
  type PDFImage,
  PDFName,
  type PDFOperator,
  type PDFPage,
  PDFStream,
  popGraphicsState,
  pushGraphicsState,
  setFillingColor,
  setFontAndSize,
  setGraphicsState,
  setLineWidth,
  setStrokingColor,
  setTextMatrix,
  stroke as strokePath,
} from "pdf-lib";
import { bytesOfBase64 } from "#shared/drawing/base64.ts";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { embedCut, fontkit, glyphsOfRun, type Run, runsOfText } from "./fonts.ts";
import { colourOf, lineItemOperators, pathItemOperators, pathOperators, saved, showGlyphs } from "./operators.ts";

/** 72 points an inch (ISO 32000-1, 8.3.2.3). */
export const pointsPerMm = 72 / 25.4;

type TextItem = Extract<Item, { kind: "text" }>;
type ImageItem = Extract<Item, { kind: "image" }>;

/** Width a character that no font holds is given, and the box drawn in its place, in thousandths of the em. */
const missingAdvance = 700;

/**
 * Writes display lists into one PDF document with operators of its own: pdf-lib's helpers fill by the nonzero rule only.
 * Fonts and images are embedded once, however often they are drawn. Characters that no font holds are drawn as boxes and
 * listed in `missingCharacters`.
 */
export class PdfPainter {
  readonly document: PDFDocument;
  readonly missingCharacters = new Set<string>();
  private readonly fonts = new Map<string, PDFFont>();
  private readonly images = new Map<string, PDFImage>();

  private constructor(document: PDFDocument) {
    this.document = document;
  }

  static async create(): Promise<PdfPainter> {
    const document = await PDFDocument.create({ updateMetadata: false });
    document.registerFontkit(fontkit);
    return new PdfPainter(document);
  }

  /** Adds a page of the list's true size and draws the list on it. */
  async addPage(list: DisplayList): Promise<PDFPage> {
    const page = this.document.addPage([list.widthMm * pointsPerMm, list.heightMm * pointsPerMm]);
    const operators = await this.itemsOperators(page, list.items);
    page.pushOperators(
      pushGraphicsState(),
      concatTransformationMatrix(pointsPerMm, 0, 0, -pointsPerMm, 0, list.heightMm * pointsPerMm),
    );
    // Each operator becomes an argument, and a call takes only as many as the stack holds.
    for (const operator of operators) page.pushOperators(operator);
    page.pushOperators(popGraphicsState());
    return page;
  }

  private async itemsOperators(page: PDFPage, items: readonly Item[]): Promise<PDFOperator[]> {
    const operators: PDFOperator[] = [];
    for (const item of items) {
      for (const operator of await this.itemOperators(page, item)) operators.push(operator);
    }
    return operators;
  }

  private async itemOperators(page: PDFPage, item: Item): Promise<PDFOperator[]> {
    switch (item.kind) {
      case "path":
        return saved([...this.opacityOperators(page, item.opacity), ...pathItemOperators(item)]);
      case "line":
        return saved(lineItemOperators(item));
      case "text":
        return saved(await this.textOperators(page, item));
      case "image":
        return saved(await this.imageOperators(page, item));
      case "clip":
        return saved([
          ...pathOperators(item.clip),
          clipEvenOdd(),
          endPath(),
          ...(await this.itemsOperators(page, item.items)),
        ]);
      case "group":
        return saved([
          concatTransformationMatrix(item.scale, 0, 0, item.scale, item.x, item.y),
          ...(await this.itemsOperators(page, item.items)),
        ]);
    }
  }

  private opacityOperators(page: PDFPage, opacity: number | undefined): PDFOperator[] {
    if (opacity === undefined || opacity >= 1) return [];
    const state = this.document.context.obj({ Type: "ExtGState", ca: opacity, CA: opacity });
    return [setGraphicsState(page.node.newExtGState("Opacity", this.document.context.register(state)))];
  }

  private async imageOperators(page: PDFPage, item: ImageItem): Promise<PDFOperator[]> {
    const image = await this.embedImage(item.pngBase64);
    const { x, y, width, height } = item.box;
    return [
      ...this.opacityOperators(page, item.opacity),
      concatTransformationMatrix(width, 0, 0, -height, x, y + height),
      drawObject(page.node.newXObject("Image", image.ref)),
    ];
  }

  private async embedImage(pngBase64: string): Promise<PDFImage> {
    const known = this.images.get(pngBase64);
    if (known) return known;
    const image = await this.document.embedPng(bytesOfBase64(pngBase64));
    await image.embed();
    // Masks and grain are coarser than the printer: without this a viewer may show their pixels as squares.
    const stream = this.document.context.lookup(image.ref, PDFStream);
    stream.dict.set(PDFName.of("Interpolate"), PDFBool.True);
    const mask = stream.dict.lookupMaybe(PDFName.of("SMask"), PDFStream);
    mask?.dict.set(PDFName.of("Interpolate"), PDFBool.True);
    this.images.set(pngBase64, image);
    return image;
  }

  private async embedFont(run: Run): Promise<PDFFont | null> {
    if (run.cut === null) return null;
    const known = this.fonts.get(run.cut.name);
    if (known) return known;
    const font = await embedCut(this.document, run.cut);
    this.fonts.set(run.cut.name, font);
    return font;
  }

  private async textOperators(page: PDFPage, item: TextItem): Promise<PDFOperator[]> {
    const runs = await runsOfText(item.text, item.font);
    const set = runs.map((run) => ({ run, glyphs: run.cut === null ? null : glyphsOfRun(run.text, run.cut) }));
    const widths = set.map(({ run, glyphs }) =>
      glyphs === null
        ? missingAdvance * [...run.text].length
        : glyphs.reduce((sum, { advance, kern }) => sum + advance + kern, 0),
    );
    const em = item.sizeMm / 1000;
    const shares = { left: 0, middle: 0.5, right: 1 };
    const radians = ((item.turn ?? 0) * Math.PI) / 180;
    const along = { x: Math.cos(radians), y: Math.sin(radians) };
    let from = -shares[item.align] * widths.reduce((sum, width) => sum + width, 0) * em;
    const operators: PDFOperator[] = [setFillingColor(colourOf(item.colour))];
    for (const [index, { run, glyphs }] of set.entries()) {
      const at = { x: item.at.x + along.x * from, y: item.at.y + along.y * from };
      const font = await this.embedFont(run);
      if (font === null || glyphs === null) operators.push(...this.missingOperators(run.text, at, along, item));
      else {
        operators.push(
          beginText(),
          setFontAndSize(page.node.newFontDictionary("Font", font.ref), item.sizeMm),
          setTextMatrix(along.x, along.y, along.y, -along.x, at.x, at.y),
          showGlyphs(this.document, font.encodeText(run.text), glyphs),
          endText(),
        );
      }
      from += (widths[index] ?? 0) * em;
    }
    return operators;
  }

  /** A box for each character no font holds: a reader sees that something is missing, and the caller is told what. */
  private missingOperators(
    text: string,
    at: { x: number; y: number },
    along: { x: number; y: number },
    item: TextItem,
  ) {
    const em = item.sizeMm;
    const operators = [
      pushGraphicsState(),
      concatTransformationMatrix(along.x, along.y, -along.y, along.x, at.x, at.y),
      setStrokingColor(colourOf(item.colour)),
      setLineWidth(em * 0.06),
    ];
    for (const [index, character] of [...text].entries()) {
      this.missingCharacters.add(character);
      const left = em * (index * (missingAdvance / 1000) + 0.08);
      const right = left + em * 0.54;
      operators.push(
        moveTo(left, 0),
        lineTo(right, 0),
        lineTo(right, -em * 0.7),
        lineTo(left, -em * 0.7),
        closePath(),
        strokePath(),
      );
    }
    return [...operators, popGraphicsState()];
  }
}
