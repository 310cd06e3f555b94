import { describe, expect, it } from "vitest";
import { headerLine, letterHtml, letterText } from "#server/mail/letter.ts";

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
});
