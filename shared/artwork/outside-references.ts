const embeddedFont = /^\s*data:(font|application\/([\w-]*font[\w-]*|octet-stream))/i;
const inside = /^\s*(#|data:image\/(png|jpeg|gif|webp)[;,])/i;

/** Whether an href stays in the file: a part of it or an embedded picture. Nested SVG documents don't count. */
export function staysInside(href: string): boolean {
  return inside.test(href);
}

/**
 * CSS, or a value that may hold `url(…)`, without imports and without references that leave the file. `found` tells whether
 * there were any; embedded fonts go too but leave nothing missing, since text is drawn in our own font and said to be.
 */
export function withoutOutsideUrls(css: string): { readonly text: string; readonly found: boolean } {
  let found = false;
  const text = css
    .replace(/@import\b[^;]*(;|$)/gi, () => {
      found = true;
      return "";
    })
    .replace(/url\(\s*(["']?)([^)]*?)\1\s*\)/gi, (whole, _quote: string, target: string) => {
      if (staysInside(target)) return whole;
      if (!embeddedFont.test(target)) found = true;
      return "none";
    });
  return { text, found };
}
