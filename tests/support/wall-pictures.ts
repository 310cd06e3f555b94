import { Jimp } from "jimp";

/** A picture whose left half is dark red and whose right half is light green, so that how it lies can be told. */
export function twoHalves(widthPx: number, heightPx: number) {
  const picture = new Jimp({ width: widthPx, height: heightPx, color: 0x9c2a2aff });
  for (let y = 0; y < heightPx; y++)
    for (let x = Math.ceil(widthPx / 2); x < widthPx; x++) picture.setPixelColor(0xb6d7a8ff, x, y);
  return picture;
}

/** Part of the text of the EXIF below; it must not come through. */
export const cameraSerial = "SERIAL-4711-AT-HOME";

/**
 * The same JPEG as a camera held on its side writes it: with an EXIF segment that says how it is turned (CIPA DC-008, tag 0x0112) and
 * whose camera it was (tag 0x010E, its description).
 */
export function asTaken(jpeg: Uint8Array, orientation: number): Uint8Array<ArrayBuffer> {
  const text = Buffer.from(`${cameraSerial}\0`, "latin1");
  const tiff = Buffer.alloc(38 + text.length);
  tiff.write("II", 0, "latin1");
  tiff.writeUInt16LE(42, 2);
  tiff.writeUInt32LE(8, 4);
  tiff.writeUInt16LE(2, 8);
  const entry = (at: number, tag: number, type: number, count: number, value: number) => {
    tiff.writeUInt16LE(tag, at);
    tiff.writeUInt16LE(type, at + 2);
    tiff.writeUInt32LE(count, at + 4);
    tiff.writeUInt32LE(value, at + 8);
  };
  entry(10, 0x010e, 2, text.length, 38);
  entry(22, 0x0112, 3, 1, orientation);
  text.copy(tiff, 38);
  const body = Buffer.concat([Buffer.from("Exif\0\0", "latin1"), tiff]);
  const head = Buffer.from([0xff, 0xe1, (body.length + 2) >> 8, (body.length + 2) & 0xff]);
  return Uint8Array.from(Buffer.concat([jpeg.subarray(0, 2), head, body, jpeg.subarray(2)]));
}

export const jpegOf = async (picture: ReturnType<typeof twoHalves>): Promise<Uint8Array<ArrayBuffer>> =>
  Uint8Array.from(await picture.getBuffer("image/jpeg", { quality: 90 }));

export const pngOf = async (picture: ReturnType<typeof twoHalves>): Promise<Uint8Array<ArrayBuffer>> =>
  Uint8Array.from(await picture.getBuffer("image/png"));
