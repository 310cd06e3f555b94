/** Cube roots of the first 64 primes, and square roots of the first eight, as 32 bits of their fractions. */
const primes = Array.from({ length: 312 }, (_, index) => index).filter(
  (number) => number > 1 && Array.from({ length: number }, (_, by) => by).every((by) => by < 2 || number % by !== 0),
);
const fraction = (root: number): number => Math.floor((root - Math.floor(root)) * 2 ** 32);
const rounds = Uint32Array.from(primes, (prime) => fraction(Math.cbrt(prime)));
const start = primes.slice(0, 8).map((prime) => fraction(Math.sqrt(prime)));

/**
 * SHA-256 of some bytes as 64 hexadecimal digits, after NIST FIPS 180-4. For font files in the browser, whose own digest
 * is missing where the application is served over plain http.
 */
export function sha256(bytes: Uint8Array): string {
  const length = Math.ceil((bytes.length + 9) / 64) * 64;
  const padded = new Uint8Array(length);
  padded.set(bytes);
  padded[bytes.length] = 0x80;
  const view = new DataView(padded.buffer);
  view.setUint32(length - 8, Math.floor(bytes.length / 2 ** 29));
  view.setUint32(length - 4, bytes.length << 3);
  const hash = Uint32Array.from(start);
  const words = new Uint32Array(64);
  for (let block = 0; block < length; block += 64) {
    for (let index = 0; index < 16; index++) words[index] = view.getUint32(block + 4 * index);
    for (let index = 16; index < 64; index++) {
      const a = words[index - 15] ?? 0;
      const b = words[index - 2] ?? 0;
      const sigma0 = turned(a, 7) ^ turned(a, 18) ^ (a >>> 3);
      const sigma1 = turned(b, 17) ^ turned(b, 19) ^ (b >>> 10);
      words[index] = (words[index - 16] ?? 0) + sigma0 + (words[index - 7] ?? 0) + sigma1;
    }
    addBlock(hash, words);
  }
  return Array.from(hash, (word) => word.toString(16).padStart(8, "0")).join("");
}

function addBlock(hash: Uint32Array, words: Uint32Array): void {
  let [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0] = hash;
  for (let index = 0; index < 64; index++) {
    const sum1 = turned(e, 6) ^ turned(e, 11) ^ turned(e, 25);
    const one = (h + sum1 + ((e & f) ^ (~e & g)) + (rounds[index] ?? 0) + (words[index] ?? 0)) | 0;
    const sum0 = turned(a, 2) ^ turned(a, 13) ^ turned(a, 22);
    const two = (sum0 + ((a & b) ^ (a & c) ^ (b & c))) | 0;
    [h, g, f, e, d, c, b, a] = [g, f, e, (d + one) | 0, c, b, a, (one + two) | 0];
  }
  for (const [index, word] of [a, b, c, d, e, f, g, h].entries()) hash[index] = (hash[index] ?? 0) + word;
}

const turned = (word: number, by: number): number => (word >>> by) | (word << (32 - by));
