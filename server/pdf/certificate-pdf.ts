import { type CertificateInput, drawCertificate } from "#shared/drawing/certificate.ts";
import { PdfPainter } from "./painter.ts";
import { savePdf } from "./save-pdf.ts";

/** The certificate of an approval as a PDF. `date` is the decision's moment; the same input gives the same bytes. */
export async function renderCertificate(input: CertificateInput & { readonly date: Date }): Promise<Uint8Array> {
  const painter = await PdfPainter.create();
  for (const sheet of drawCertificate(input)) await painter.addPage(sheet);
  return savePdf(painter, {
    title: `Certificate of approval, ${input.number} revision ${input.revision}`,
    author: input.shop,
    subject: `Approved by ${input.typedName}; snapshot SHA-256 ${input.snapshotSha256}`,
    keywords: [
      input.number,
      `revision ${input.revision}`,
      `sha256:${input.snapshotSha256}`,
      `pdf-sha256:${input.pdfSha256}`,
    ],
    date: input.date,
  });
}
