// @vitest-environment jsdom
import { createElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { paintSvg } from "#shared/drawing/svg.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";

const stroke = { colour: "#1F1D1A", widthMm: 0.25, dashMm: [3, 1], cap: "round" as const };
const list: DisplayList = {
  widthMm: 120,
  heightMm: 80,
  items: [
    { kind: "path", id: "disc", path: circlePath({ x: 40, y: 40 }, 20), fill: "#27304F", stroke, opacity: 0.5 },
    {
      kind: "line",
      points: [
        { x: 0, y: 0 },
        { x: 9, y: 9 },
      ],
      stroke,
    },
    {
      kind: "group",
      id: "layer:B",
      x: 10,
      y: 20,
      scale: 0.2,
      items: [
        {
          kind: "clip",
          clip: rectanglePath({ x: 0, y: 0, width: 5, height: 5 }),
          items: [{ kind: "image", box: { x: 1, y: 2, width: 3, height: 4 }, pngBase64: "AAAA", opacity: 0.4 }],
        },
      ],
    },
    {
      kind: "text",
      text: "<b>600</b> & more",
      at: { x: 5, y: 6 },
      sizeMm: 3.4,
      font: "serif",
      colour: "#57524A",
      align: "middle",
      turn: -90,
    },
  ],
};

/** An element with everything under it as plain values; sizes and ids differ by design. */
function outline(element: Element): unknown {
  const attributes = [...element.attributes]
    .filter(
      ({ name }) => !["width", "height", "xmlns", "id", "clip-path"].includes(name) || element.tagName === "image",
    )
    .map(({ name, value }) => `${name}=${value}`)
    .sort();
  return [
    element.tagName,
    attributes,
    element.children.length > 0 ? [...element.children].map(outline) : element.textContent,
  ];
}

const parse = (svg: string) => new DOMParser().parseFromString(svg, "image/svg+xml").documentElement;

describe("DrawingSvg", () => {
  it("draws the same elements as paintSvg writes", () => {
    const markup = renderToStaticMarkup(createElement(DrawingSvg, { list, title: "Lobby sign" }));
    expect(outline(parse(markup))).toEqual(outline(parse(paintSvg(list, { idPrefix: "", title: "Lobby sign" }))));
  });

  it("gives two pictures on one page clips of their own", () => {
    const pair = [1, 2].map((key) => createElement(DrawingSvg, { key, list, title: "Lobby sign" }));
    const page = parse(renderToStaticMarkup(createElement("svg", { xmlns: "http://www.w3.org/2000/svg" }, pair)));
    const ids = [...page.querySelectorAll("clipPath")].map(({ id }) => id);
    expect(new Set(ids).size).toBe(2);
    const used = [...page.querySelectorAll("[clip-path]")].map((element) => element.getAttribute("clip-path"));
    expect(used).toEqual(ids.map((id) => `url(#${id})`));
  });
});
