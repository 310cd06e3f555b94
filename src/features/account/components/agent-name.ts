const browsers: readonly (readonly [RegExp, string])[] = [
  [/Edg\//, "Edge"],
  [/Firefox\//, "Firefox"],
  [/Chrom(e|ium)\//, "Chrome or Chromium"],
  [/Safari\//, "Safari"],
];
const systems: readonly (readonly [RegExp, string])[] = [
  [/iPhone|iPad/, "iPhone or iPad"],
  [/Android/, "Android"],
  [/Windows/, "Windows"],
  [/Mac OS X/, "Mac"],
  [/Linux/, "Linux"],
];

/** A browser's own long description in a few words: "Firefox on Linux". */
export function agentName(agent: string): string {
  const browser = browsers.find(([pattern]) => pattern.test(agent))?.[1];
  const system = systems.find(([pattern]) => pattern.test(agent))?.[1];
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? "A browser we do not know";
}
