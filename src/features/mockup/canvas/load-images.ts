import type { DisplayList, Item } from "#shared/drawing/display-list.ts";

/** Decoded images by their bytes. Grain and unchanged shadows come again with every picture. */
export type Images = ReadonlyMap<string, HTMLImageElement>;

/** Decodes the images of a picture; those of the picture before are taken over. */
export async function loadImages(list: DisplayList, before: Images): Promise<Images> {
  const sources = new Set(pngsOf(list.items));
  const loaded = await Promise.all(
    [...sources].map(async (png): Promise<[string, HTMLImageElement]> => {
      const known = before.get(png);
      return [png, known ?? (await decoded(png))];
    }),
  );
  return new Map(loaded);
}

async function decoded(base64: string): Promise<HTMLImageElement> {
  const image = new Image();
  image.src = `data:image/png;base64,${base64}`;
  await image.decode();
  return image;
}

function pngsOf(items: readonly Item[]): string[] {
  return items.flatMap((item) => {
    if (item.kind === "image") return [item.pngBase64];
    return item.kind === "group" || item.kind === "clip" ? pngsOf(item.items) : [];
  });
}
