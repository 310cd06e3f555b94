/** A mail as words, before it is laid out. The words are plain text; names and quotes come from people. */
export type Letter = {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  /** What someone wrote, set apart from our words. */
  readonly quote?: string;
  readonly button: { readonly label: string; readonly url: string } | null;
  readonly after: readonly string[];
};

export type LetterFrame = {
  readonly greeting: string;
  /** Who writes: the shop's name, or ours. */
  readonly sender: string;
};

/** One line that can stand in a header: no line ends or other controls, no more than a subject line shows. */
export function headerLine(text: string, longest = 180): string {
  const line = text
    .replace(/[\p{C}\u2028\u2029]+/gu, " ")
    .replace(/ {2,}/g, " ")
    .trim();
  return line.length > longest ? `${line.slice(0, longest - 1)}…` : line;
}

export function letterText({ paragraphs, quote, button, after }: Letter, { greeting, sender }: LetterFrame): string {
  const quoted = quote
    ? quote
        .split("\n")
        .map((line) => `> ${line}`)
        .join("\n")
    : null;
  const parts = [
    `Hello ${headerLine(greeting)},`,
    ...paragraphs,
    ...(quoted ? [quoted] : []),
    ...(button ? [`${button.label}:\n${button.url}`] : []),
    ...after,
    headerLine(sender),
  ];
  return `${parts.join("\n\n")}\n`;
}

export function letterHtml({ paragraphs, quote, button, after }: Letter, { greeting, sender }: LetterFrame): string {
  const paragraph = (text: string): string => `<p>${escapeHtml(text)}</p>`;
  const link = button
    ? `<p><a href="${escapeHtml(button.url)}" style="display:inline-block;padding:10px 16px;background:#96372b;color:#ffffff;text-decoration:none">${escapeHtml(button.label)}</a></p>
<p style="font-size:13px">Or open this address: ${escapeHtml(button.url)}</p>`
    : "";
  const parts = [
    paragraph(`Hello ${headerLine(greeting)},`),
    ...paragraphs.map(paragraph),
    quote
      ? `<blockquote style="margin:0 0 1em;padding-left:12px;border-left:3px solid #d8cfbd">${escapeHtml(quote).replaceAll("\n", "<br>")}</blockquote>`
      : "",
    link,
    ...after.map(paragraph),
    paragraph(headerLine(sender)),
  ];
  return `<!doctype html><html lang="en"><body style="font-family:sans-serif;font-size:16px;line-height:1.5;color:#1f1d1a;max-width:36em">
${parts.filter(Boolean).join("\n")}
</body></html>
`;
}

function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}
