const alphabet = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";

/** RFC 4648 base64 with padding. */
export function base64OfBytes(bytes: Uint8Array): string {
  const parts: string[] = [];
  for (let index = 0; index < bytes.length; index += 3) {
    const left = bytes.length - index;
    const triple = ((bytes[index] ?? 0) << 16) | ((bytes[index + 1] ?? 0) << 8) | (bytes[index + 2] ?? 0);
    parts.push(
      alphabet.charAt(triple >> 18) +
        alphabet.charAt((triple >> 12) & 63) +
        (left > 1 ? alphabet.charAt((triple >> 6) & 63) : "=") +
        (left > 2 ? alphabet.charAt(triple & 63) : "="),
    );
  }
  return parts.join("");
}

/** The bytes of RFC 4648 base64. Throws on a character that does not belong there. */
export function bytesOfBase64(text: string): Uint8Array {
  const body = text.replace(/=+$/, "");
  const bytes = new Uint8Array(Math.floor((body.length * 3) / 4));
  let held = 0;
  let bits = 0;
  let position = 0;
  for (const character of body) {
    const value = alphabet.indexOf(character);
    if (value < 0) throw new Error(`Not base64: ${character}`);
    held = ((held << 6) | value) & 0xffffff;
    bits += 6;
    if (bits >= 8) {
      bits -= 8;
      bytes[position++] = (held >> bits) & 255;
    }
  }
  return bytes;
}
