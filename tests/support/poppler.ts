import { execFile } from "node:child_process";
import { mkdtemp, readFile, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";

const run = promisify(execFile);

async function withFile<T>(pdf: Uint8Array, work: (file: string, folder: string) => Promise<T>): Promise<T> {
  const folder = await mkdtemp(join(tmpdir(), "standproud-pdf-"));
  try {
    const file = join(folder, "drawing.pdf");
    await writeFile(file, pdf);
    return await work(file, folder);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** What shows of a page of a PDF as poppler draws it, as PNG bytes. */
export function pageAsPng(pdf: Uint8Array, { page, dpi }: { page: number; dpi: number }): Promise<Buffer> {
  return withFile(pdf, async (file, folder) => {
    const out = join(folder, "page");
    await run("pdftoppm", [
      "-png",
      "-cropbox",
      "-r",
      String(dpi),
      "-f",
      String(page),
      "-l",
      String(page),
      "-singlefile",
      file,
      out,
    ]);
    return readFile(`${out}.png`);
  });
}

/** What one of poppler's readers (pdffonts, pdfinfo, pdftotext) prints of a PDF. */
export function popplerText(pdf: Uint8Array, tool: "pdffonts" | "pdfinfo" | "pdftotext"): Promise<string> {
  return withFile(pdf, async (file) => {
    const { stdout } = await run(tool, tool === "pdftotext" ? ["-layout", file, "-"] : [file]);
    return stdout;
  });
}
