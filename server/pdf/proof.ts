import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { runsOfText } from "./fonts.ts";
import { PdfPainter } from "./painter.ts";
import { savePdf } from "./save-pdf.ts";

/** Characters of some lists that no font of ours holds. They are drawn as boxes; say which before a drawing goes out. */
export async function findMissingCharacters(lists: readonly DisplayList[]): Promise<string[]> {
  const missing = new Set<string>();
  const look = async (items: readonly Item[]): Promise<void> => {
    for (const item of items) {
      if (item.kind === "group" || item.kind === "clip") await look(item.items);
      if (item.kind !== "text") continue;
      for (const run of await runsOfText(item.text, item.font)) {
        if (run.cut === null) for (const character of run.text) missing.add(character);
      }
    }
  };
  for (const list of lists) await look(list.items);
  return [...missing].sort();
}

/**
 * The proof of a revision: one page a sheet at true paper size. Nothing of the moment goes into it, so the same snapshot gives the same
 * bytes; its hash stands in the document's subject and keywords.
 */
export async function renderProof(snapshot: Snapshot, snapshotSha256: string): Promise<Uint8Array> {
  const { titleBlock } = snapshot;
  const painter = await PdfPainter.create();
  for (const sheet of snapshot.drawing.sheets) await painter.addPage(sheet);
  return savePdf(painter, {
    title: `${titleBlock.number}, revision ${titleBlock.revision}: ${titleBlock.title}`,
    author: titleBlock.owner,
    subject: `${titleBlock.documentType} for ${titleBlock.client}; snapshot SHA-256 ${snapshotSha256}`,
    keywords: [titleBlock.number, `revision ${titleBlock.revision}`, `sha256:${snapshotSha256}`],
    date: new Date(`${titleBlock.date}T00:00:00Z`),
  });
}
