import { letterStyle, tones } from "./letter-style.ts";

/** One note with what was said, for a letter that gathers several. */
export type LetterNote = {
  readonly number: number;
  /** Zone, kind and state in words. */
  readonly about: string;
  readonly said: readonly { readonly who: string; readonly text: string }[];
};

/** A mail as words, before it is laid out. The words are plain text; names and quotes come from people. */
export type Letter = {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  /** What someone wrote, set apart from our words. */
  readonly quote?: string;
  readonly notes?: readonly LetterNote[];
  readonly button: { readonly label: string; readonly url: string } | null;
  readonly after: readonly string[];
  /** Where its reader stops mails like this one; null for those that are needed. */
  readonly stop: { readonly url: string } | null;
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

const stopWords = "You get this mail because you take part in this job. The mails you need are sent all the same.";

export function letterText(letter: Letter, { greeting, sender }: LetterFrame): string {
  const { paragraphs, quote, notes = [], button, after, stop } = letter;
  const parts = [
    `Hello ${headerLine(greeting)},`,
    ...paragraphs,
    ...(quote ? [quoted(quote)] : []),
    ...notes.map(noteText),
    ...(button ? [`${button.label}:\n${button.url}`] : []),
    ...after,
    headerLine(sender),
    ...(stop ? [`--\n${stopWords}\nStop mails like this one:\n${stop.url}`] : []),
  ];
  return `${parts.join("\n\n")}\n`;
}

const quoted = (text: string): string =>
  text
    .split("\n")
    .map((line) => `> ${line}`)
    .join("\n");

const noteText = ({ number, about, said }: LetterNote): string =>
  [`Note ${number}, ${about}`, ...said.map(({ who, text }) => `${headerLine(who)}:\n${quoted(text)}`)].join("\n");

/**
 * The same as HTML: no pictures, nothing from elsewhere, and colours that a mail program may turn dark. Where a program drops the style
 * sheet, what stands on the elements is enough to read it.
 */
export function letterHtml(letter: Letter, { greeting, sender }: LetterFrame): string {
  const { subject, paragraphs, quote, notes = [], button, after, stop } = letter;
  const parts = [
    paragraph(`Hello ${headerLine(greeting)},`),
    ...paragraphs.map(paragraph),
    quote ? blockQuote(quote) : "",
    ...notes.map(noteHtml),
    button ? buttonHtml(button) : "",
    ...after.map(paragraph),
    `<p class="sender" style="margin:24px 0 0;font-weight:bold">${escapeHtml(headerLine(sender))}</p>`,
    stop ? stopHtml(stop) : "",
  ];
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta name="supported-color-schemes" content="light dark">
<title>${escapeHtml(headerLine(subject))}</title>
<style>${letterStyle}</style>
</head>
<body class="page" style="margin:0;padding:16px;background:${tones.page};color:${tones.ink};font-family:Georgia,'Times New Roman',serif;font-size:17px;line-height:1.5">
<div class="letter" style="max-width:600px;margin:0 auto;padding:24px;background:${tones.sheet};border:1px solid ${tones.rule}">
<p class="sender" style="margin:0 0 20px;padding-bottom:12px;border-bottom:2px solid ${tones.ink};font-weight:bold">${escapeHtml(headerLine(sender))}</p>
${parts.filter(Boolean).join("\n")}
</div>
</body>
</html>
`;
}

const paragraph = (text: string): string => `<p style="margin:0 0 16px">${escapeHtml(text)}</p>`;

const words = (text: string): string => escapeHtml(text).replaceAll("\n", "<br>");

const blockQuote = (text: string): string =>
  `<blockquote class="quote" style="margin:0 0 16px;padding:2px 0 2px 14px;border-left:3px solid ${tones.rule};overflow-wrap:anywhere">${words(text)}</blockquote>`;

function noteHtml({ number, about, said }: LetterNote): string {
  const lines = said.map(
    ({ who, text }) =>
      `<p class="faint" style="margin:8px 0 2px;font-size:14px;color:${tones.faint}">${escapeHtml(headerLine(who))}</p>\n<div style="overflow-wrap:anywhere">${words(text)}</div>`,
  );
  return `<div class="note" style="margin:0 0 14px;padding:12px 14px;border:1px solid ${tones.rule}">
<p style="margin:0"><b>Note ${number}</b> <span class="faint" style="font-size:14px;color:${tones.faint}">${escapeHtml(about)}</span></p>
${lines.join("\n")}
</div>`;
}

const buttonHtml = ({ label, url }: { label: string; url: string }): string =>
  `<p style="margin:20px 0 8px"><a class="button" href="${escapeHtml(url)}" style="display:inline-block;padding:12px 20px;background:${tones.seal};color:${tones.onSeal};font-weight:bold;text-decoration:none">${escapeHtml(label)}</a></p>
<p class="faint" style="margin:0 0 20px;font-size:13px;color:${tones.faint};overflow-wrap:anywhere">Or open this address: ${escapeHtml(url)}</p>`;

const stopHtml = ({ url }: { url: string }): string =>
  `<p class="faint stop" style="margin:24px 0 0;padding-top:12px;border-top:1px solid ${tones.rule};font-size:13px;color:${tones.faint}">${escapeHtml(stopWords)} <a class="faint" href="${escapeHtml(url)}" style="color:${tones.faint}">Stop mails like this one</a></p>`;

function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}
