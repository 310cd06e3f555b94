import type { PdfPainter } from "./painter.ts";

export type PdfInformation = {
  readonly title: string;
  readonly author: string;
  readonly subject: string;
  readonly keywords: readonly string[];
  /** Stands as creation and change date; the clock is never read. */
  readonly date: Date;
};

/** Finishes a document. Throws a RangeError when the date is none: a drawing without its date is not to go out. */
export function savePdf(
  { document }: PdfPainter,
  { title, author, subject, keywords, date }: PdfInformation,
): Promise<Uint8Array> {
  if (Number.isNaN(date.getTime())) throw new RangeError("The document has no valid date.");
  document.setTitle(title, { showInWindowTitleBar: true });
  document.setAuthor(author);
  document.setSubject(subject);
  document.setKeywords([...keywords]);
  document.setCreator("Standproud");
  document.setProducer("Standproud");
  document.setCreationDate(date);
  document.setModificationDate(date);
  document.setLanguage("en");
  return document.save({ useObjectStreams: false, addDefaultPage: false });
}
