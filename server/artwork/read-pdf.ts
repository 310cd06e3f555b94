// Its parser, which it would else load with the first file, whose time must not pay for that.
import "pdfjs-dist/legacy/build/pdf.worker.mjs";
import {
  getDocument,
  OPS,
  type PDFDocumentProxy,
  type PDFPageProxy,
  VerbosityLevel,
} from "pdfjs-dist/legacy/build/pdf.mjs";
import { isRecord, numbersOf } from "#shared/artwork/pdf/operands.ts";
import type { PdfFont, PdfOperation, PdfPage } from "#shared/artwork/pdf/pdf-page.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";
import type { WarningCode } from "#shared/artwork/warnings.ts";
import { unpacksWithinLimit } from "./unpacked-size.ts";

export type ReadPdf = {
  readonly page: PdfPage;
  readonly pages: number;
  readonly warnings: ReadonlySet<WarningCode>;
};

/** Pixels of a picture inside: more are not decoded only to be left out. */
const mostPixels = 25_000_000;

/**
 * The first page of a PDF as operations, with its fonts' outlines. Nothing in it is run, nothing is fetched, no font of
 * this machine is used. Throws ArtworkRefused with pdf.broken, pdf.password or pdf.unpacking.
 */
export async function readPdf(bytes: Uint8Array): Promise<ReadPdf> {
  if (!unpacksWithinLimit(bytes)) throw new ArtworkRefused("pdf.unpacking");
  const read = await readAs(bytes, { isStrict: false });
  if (!read) throw new ArtworkRefused("pdf.broken");
  // A strict reading ends, without a word, at what a lenient one leaves out: a shorter list tells that something is missing.
  const strict = await readAs(bytes, { isStrict: true });
  const isWhole = strict?.page.operations.length === read.page.operations.length;
  return isWhole ? read : { ...read, warnings: new Set([...read.warnings, "pdf.damaged"]) };
}

/** Null when the file can't be read. With `isStrict` the operations end where the first can't be read. */
async function readAs(bytes: Uint8Array, { isStrict }: { isStrict: boolean }): Promise<ReadPdf | null> {
  const loading = getDocument({
    data: Uint8Array.from(bytes),
    isEvalSupported: false,
    useWorkerFetch: false,
    useSystemFonts: false,
    useWasm: false,
    enableXfa: false,
    isOffscreenCanvasSupported: false,
    isImageDecoderSupported: false,
    disableFontFace: true,
    fontExtraProperties: true,
    stopAtErrors: isStrict,
    maxImageSize: mostPixels,
    verbosity: VerbosityLevel.ERRORS,
  });
  try {
    const file = await loading.promise;
    const page = await file.getPage(1);
    const warnings = new Set<WarningCode>();
    if (await hasComments(page)) warnings.add("pdf.comments");
    return { page: await pageOf(file, page), pages: file.numPages, warnings };
  } catch (error) {
    if (error instanceof Error && error.name === "PasswordException") throw new ArtworkRefused("pdf.password");
    // Whatever else the reader throws is about the file, which is then refused.
    if (error instanceof Error) return null;
    throw error;
  } finally {
    await loading.destroy();
  }
}

async function hasComments(page: PDFPageProxy): Promise<boolean> {
  const annotations: readonly { readonly subtype?: string }[] = await page.getAnnotations();
  return annotations.some(({ subtype }) => subtype !== "Link" && subtype !== "Popup");
}

const names: ReadonlyMap<number, string> = new Map(Object.entries(OPS).map(([name, code]) => [code, name]));

async function pageOf(file: PDFDocumentProxy, page: PDFPageProxy): Promise<PdfPage> {
  // 0: without comments, stamps and form fields.
  const list = await page.getOperatorList({ annotationMode: 0 });
  const layers = await file.getOptionalContentConfig();
  const [left = 0, bottom = 0, right = 0, top = 0] = page.view;
  const operations = operationsOf(list);
  const objects = await objectsOf(page, operations);
  const fonts = new Map<string, PdfFont | null>();
  return {
    box: [left, bottom, right, top],
    turn: page.rotate,
    unit: page.userUnit,
    operations,
    font: (id) => {
      const known = fonts.get(id);
      if (known !== undefined) return known;
      const font = fontOf(objects.get(id), objects);
      fonts.set(id, font);
      return font;
    },
    shading: (id) => {
      const pattern = objects.get(id);
      return isRecord(pattern) && typeof pattern.getIR === "function" ? pattern.getIR() : pattern;
    },
    isVisible: (group) => layers.isVisible(group),
  };
}

type OperatorList = { readonly fnArray: readonly number[]; readonly argsArray: readonly unknown[] };

function operationsOf({ fnArray, argsArray }: OperatorList): PdfOperation[] {
  return fnArray.map((code, index) => {
    const args = argsArray[index];
    return { name: names.get(code) ?? "", args: Array.isArray(args) || isTyped(args) ? Array.from<unknown>(args) : [] };
  });
}

const isTyped = (value: unknown): value is Float32Array => value instanceof Float32Array;

/** What the operations name and the reader handed over beside them: fonts, glyph outlines, shadings. They come a moment later. */
async function objectsOf(page: PDFPageProxy, operations: readonly PdfOperation[]): Promise<Map<string, unknown>> {
  const objects = new Map<string, unknown>();
  const named = new Set(operations.flatMap(({ name, args }) => (name === "dependency" ? args : [])));
  for (const id of named) {
    if (typeof id !== "string") continue;
    // Pictures are left out: what they hold need not be waited for.
    if (/^(img|mask|inline)_/.test(id)) continue;
    const store = id.startsWith("g_") ? page.commonObjs : page.objs;
    await new Promise<void>((resolve) => store.get(id, () => resolve()));
  }
  for (const store of [page.commonObjs, page.objs]) for (const [id, value] of store) objects.set(id, value);
  return objects;
}

function fontOf(font: unknown, objects: ReadonlyMap<string, unknown>): PdfFont | null {
  if (!isRecord(font)) return null;
  const glyphs = isRecord(font.charProcOperatorList) ? font.charProcOperatorList : null;
  return {
    isMissing: font.missingFile === true || font.isInvalidPDFjsFont === true,
    isVertical: font.vertical === true,
    matrix: matrixOr(font.fontMatrix),
    verticalDefaults: numbersOf(font.defaultVMetrics),
    outline: (glyph) => {
      const outline = objects.get(`${String(font.loadedName)}_path_${glyph}`);
      if (!isRecord(outline)) return undefined;
      const { path } = outline;
      return path instanceof Float32Array ? path : null;
    },
    drawn:
      font.isType3Font === true
        ? (glyph) => {
            const list = glyphs?.[glyph];
            return isOperatorList(list) ? operationsOf(list) : null;
          }
        : null,
  };
}

function matrixOr(value: unknown): readonly number[] {
  const matrix = numbersOf(value);
  return matrix.length === 6 ? matrix : [0.001, 0, 0, 0.001, 0, 0];
}

function isOperatorList(value: unknown): value is OperatorList {
  return isRecord(value) && Array.isArray(value.fnArray) && Array.isArray(value.argsArray);
}
