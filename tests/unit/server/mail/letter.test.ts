import { describe, expect, it } from "vitest";
import { headerLine, letterHtml, letterText } from "#server/mail/letter.ts";
import { stopHeaders } from "#server/mail/send.ts";

describe("a line for a header", () => {
  it.each([
    { text: "Plain words", line: "Plain words" },
    { text: "a\r\nBcc: thief@evil.example", line: "a Bcc: thief@evil.example" },
    { text: "a\nb\tc\u0000d\u0085e\u2028f\u2029g", line: "a b c d e f g" },
    { text: "  wide   space  ", line: "wide space" },
    { text: "right\u202eleft", line: "right left" },
    { text: "\r\n", line: "" },
    { text: "Größe – “Ähren” 漢字", line: "Größe – “Ähren” 漢字" },
  ])("of $text", ({ text, line }) => {
    expect(headerLine(text)).toBe(line);
  });

  it("is cut where a reader's list would cut it", () => {
    expect(headerLine("x".repeat(200), 12)).toBe("xxxxxxxxxxx…");
  });
});

const letter = {
  subject: "S",
  paragraphs: ["First <i>words</i>."],
  quote: "line one\nline <two> & three",
  button: { label: "Open it", url: "http://127.0.0.1:4600/link/abc?x=1&y=2" },
  after: ["Last."],
  stop: null,
};

describe("a letter", () => {
  it("reads as plain text, what people wrote set apart", () => {
    expect(letterText(letter, { greeting: "Ines", sender: "Copperlark Signs" })).toBe(
      "Hello Ines,\n\nFirst <i>words</i>.\n\n> line one\n> line <two> & three\n\nOpen it:\nhttp://127.0.0.1:4600/link/abc?x=1&y=2\n\nLast.\n\nCopperlark Signs\n",
    );
  });

  it("has no markup but ours in HTML", () => {
    const html = letterHtml(letter, { greeting: "<script>", sender: '"Quoted" & Sons' });
    expect(html).toContain("Hello &lt;script&gt;,");
    expect(html).toContain("First &lt;i&gt;words&lt;/i&gt;.");
    expect(html).toContain("line one<br>line &lt;two&gt; &amp; three");
    expect(html).toContain('href="http://127.0.0.1:4600/link/abc?x=1&amp;y=2"');
    expect(html).toContain("&quot;Quoted&quot; &amp; Sons");
    expect(html).not.toMatch(/<script|<i>/);
  });

  const gathered = {
    ...letter,
    notes: [
      {
        number: 3,
        about: "zone B4, must change, open",
        said: [
          { who: "Ada <b>", text: "Wider\n<gap>" },
          { who: "Ines answered", text: "Done." },
        ],
      },
    ],
    stop: { url: "https://proofs.example/unsubscribe/t" },
  };
  const frame = { greeting: "Ines", sender: "Copperlark Signs" };

  it("has each note with number, zone, kind, state and who said what, and where mails like it are stopped", () => {
    const text = letterText(gathered, frame);
    expect(text).toContain("Note 3, zone B4, must change, open\nAda <b>:\n> Wider\n> <gap>\nInes answered:\n> Done.\n");
    expect(text).toContain("Stop mails like this one:\nhttps://proofs.example/unsubscribe/t\n");
    const html = letterHtml(gathered, frame);
    expect(html).toContain("<b>Note 3</b>");
    expect(html).toContain("zone B4, must change, open");
    expect(html).toContain("Wider<br>&lt;gap&gt;");
    expect(html).toContain('href="https://proofs.example/unsubscribe/t"');
    expect(html).not.toContain("Ada <b>");
  });

  it("fetches nothing from anywhere, and says that it can be read on dark ground", () => {
    const html = letterHtml(gathered, frame);
    expect(html).not.toMatch(/<img|<link|<script|url\(|@import|src=/i);
    expect(html).toContain('<meta name="color-scheme" content="light dark">');
    expect(html).toContain("@media (prefers-color-scheme: dark)");
  });
});

describe("the headers by which mails are stopped", () => {
  it.each([
    { url: null, headers: {} },
    {
      url: "https://proofs.example/unsubscribe/t",
      headers: {
        "List-Unsubscribe": "<https://proofs.example/unsubscribe/t>",
        "List-Unsubscribe-Post": "List-Unsubscribe=One-Click",
      },
    },
    // RFC 8058, 3.1: one click needs https.
    { url: "http://127.0.0.1/unsubscribe/t", headers: { "List-Unsubscribe": "<http://127.0.0.1/unsubscribe/t>" } },
  ])("for $url", ({ url, headers }) => {
    expect(stopHeaders({ stop: url === null ? null : { url } })).toEqual(headers);
  });
});
