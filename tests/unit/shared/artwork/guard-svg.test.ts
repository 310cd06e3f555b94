import { describe, expect, it } from "vitest";
import { guardSvg } from "#shared/artwork/guard-svg.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";

const guarded = (content: string, attributes = `viewBox="0 0 9 9"`) =>
  guardSvg(`<svg xmlns="http://www.w3.org/2000/svg" ${attributes}>${content}</svg>`);
const inner = (content: string) =>
  guarded(content)
    .svg.replace(/^<svg[^>]*>/, "")
    .replace(/<\/svg>$/, "");

describe("rewriting an untrusted drawing", () => {
  it("passes shapes on as they are, escaped anew", () => {
    expect(inner(`<g id="a&amp;b"><path d='M0 0h9"'/></g>`)).toBe(`<g id="a&amp;b"><path d="M0 0h9&quot;"></path></g>`);
  });

  it.each([
    ["<script>alert(1)</script>", "script.removed"],
    [`<rect onload="a()"/>`, "script.removed"],
    ["<foreignObject><b/></foreignObject>", "foreign.left-out"],
    [`<animate attributeName="x"/>`, "animation.ignored"],
    [`<image href="data:image/svg+xml,x"/>`, "image.left-out"],
    [`<image href="http://pictures.example/a.png"/>`, "reference.outside"],
    [`<rect fill="url(other.svg#g)"/>`, "reference.outside"],
    [`<style>@import "a.css";</style>`, "reference.outside"],
  ] as const)("%s leaves nothing of itself and is told of", (content, warning) => {
    const { svg, warnings } = guarded(content);
    expect(svg).not.toMatch(/alert|onload|foreignObject|animate|http:\/\/pictures|data:|other\.svg|@import|<b/);
    expect([...warnings]).toEqual([warning]);
  });

  it("keeps links' contents but not where they lead, and drops other programs' notes", () => {
    expect(
      inner(`<a href="https://shop.example/"><rect/></a><p:note xmlns:p="urn:p"><rect/></p:note><rect p:x="1"/>`),
    ).toBe("<a><rect></rect></a><rect></rect>");
  });

  it("numbers text without an id, and gathers its letters", () => {
    const { svg, texts } = guarded(`<text>One <tspan>two</tspan></text><text id="own">3</text><text> </text>`);
    expect(texts).toEqual([
      { id: "text-1", letters: "One two" },
      { id: "own", letters: "3" },
    ]);
    expect(svg).toContain(`<text id="text-1">`);
  });

  it("takes the size off a root with a view box and reports it", () => {
    const { svg, root } = guarded("", `viewBox="0 0 9 9" width="3in" height="5%" preserveAspectRatio="none"`);
    expect(root).toEqual({ viewBox: "0 0 9 9", width: "3in", height: "5%", aspect: "none" });
    expect(/^<svg[^>]*>/.exec(svg)?.[0]).not.toContain("3in");
    expect(guarded("", `viewBox="0 0 x 9" width="30"`).svg).toContain(`width="30"`);
  });

  it.each([
    ["<svg><g></svg>", "svg.broken"],
    ["<svg", "svg.broken"],
    ["", "svg.broken"],
    ["<svg a='1' a='2'/>", "svg.broken"],
    ["<svg>&nbsp;</svg>", "svg.broken"],
    ["<html/>", "svg.not-svg"],
    [`<svg xmlns="http://www.w3.org/1999/xhtml"/>`, "svg.not-svg"],
    [`<!DOCTYPE svg [<!ENTITY a "<g/>">]><svg/>`, "svg.entities"],
  ])("%s is refused: %s", (text, code) => {
    const attempt = () => guardSvg(text);
    expect(attempt).toThrow(ArtworkRefused);
    expect(attempt).toThrow(expect.objectContaining({ code }));
  });
});
