import { create, type Font } from "fontkit";
import { type OpenFace, openFace } from "#shared/lettering/open-face.ts";
import { sha256 } from "#shared/lettering/sha-256.ts";
import { faceFiles } from "./face-files.ts";

/** A face ready to set words in, and the SHA-256 of its file. */
export type LoadedFace = { readonly face: OpenFace; readonly fontSha256: string };

const loading = new Map<string, Promise<LoadedFace>>();

/** A face by its key, fetched once; a failed fetch is tried again at the next call. For workers: opening a font takes a moment. */
export function loadFace(key: string): Promise<LoadedFace> {
  const known = loading.get(key);
  if (known) return known;
  const promise = fetchFace(key).catch((error: unknown) => {
    loading.delete(key);
    throw error;
  });
  loading.set(key, promise);
  return promise;
}

async function fetchFace(key: string): Promise<LoadedFace> {
  const url = faceFiles.get(key);
  if (url === undefined) throw new Error("This face is not among those that the application ships.");
  const answer = await fetch(url);
  if (!answer.ok) throw new Error(`The face could not be fetched (${answer.status}).`);
  const bytes = new Uint8Array(await answer.arrayBuffer());
  return { face: openFace(() => fontOf(bytes)), fontSha256: sha256(bytes) };
}

function fontOf(bytes: Uint8Array): Font {
  // fontkit asks for Node's kind of bytes in its types only.
  const font = create(bytes as Parameters<typeof create>[0]);
  if (!("layout" in font)) throw new Error("The face's file is a collection of fonts.");
  return font;
}
