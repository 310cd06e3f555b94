// @vitest-environment jsdom
import { describe, expect, it } from "vitest";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { paintSvg } from "#shared/drawing/svg.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";

const list: DisplayList = {
  widthMm: 120.5,
  heightMm: 80,
  items: [
    {
      kind: "path",
      id: 'disc "1" <&>',
      path: [...circlePath({ x: 40, y: 40 }, 20), ...circlePath({ x: 40, y: 40 }, 10)],
      fill: "#27304F",
      stroke: { colour: "#1F1D1A", widthMm: 0.25, dashMm: [3, 1.5], cap: "round" },
      opacity: 0.5,
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
      text: "Fish & <script>alert('x')</script> \u0007",
      at: { x: 5, y: 6 },
      sizeMm: 3.4,
      font: "sans-semibold",
      colour: "#57524A",
      align: "right",
      turn: -90,
    },
  ],
};

const parsed = () => new DOMParser().parseFromString(paintSvg(list, { idPrefix: "p-" }), "image/svg+xml");

describe("paintSvg", () => {
  it("is well-formed XML, measured in millimetres", () => {
    const { documentElement } = parsed();
    expect(documentElement.getAttribute("viewBox")).toBe("0 0 120.5 80");
    expect(documentElement.getAttribute("width")).toBe("120.5mm");
  });

  it("carries ids as data, whatever they hold", () => {
    const path = parsed().querySelector("path[data-id]");
    expect(path?.getAttribute("data-id")).toBe('disc "1" <&>');
    expect(path?.getAttribute("fill-rule")).toBe("evenodd");
    expect(path?.getAttribute("fill-opacity")).toBe("0.5");
    expect(path?.getAttribute("stroke-dasharray")).toBe("3 1.5");
  });

  it("writes text as text, with a visible mark for what XML can't hold", () => {
    const text = parsed().querySelector("text");
    expect(text?.textContent).toBe("Fish & <script>alert('x')</script> \ufffd");
    expect(text?.getAttribute("font-family")).toContain("Merriweather Sans");
    expect(text?.getAttribute("text-anchor")).toBe("end");
    expect(text?.getAttribute("transform")).toBe("rotate(-90 5 6)");
    expect(parsed().querySelector("script")).toBeNull();
  });

  it("gives each picture clips of its own", () => {
    const clip = parsed().querySelector("clipPath");
    expect(clip?.getAttribute("id")).toBe("p-clip1");
    expect(parsed().querySelector("[clip-path]")?.getAttribute("clip-path")).toBe("url(#p-clip1)");
  });

  it("lets a touch through images that show nothing nameable", () => {
    const image = parsed().querySelector("image");
    expect(image?.getAttribute("pointer-events")).toBe("none");
    expect(image?.getAttribute("preserveAspectRatio")).toBe("none");
    expect(image?.closest("[data-id]")?.getAttribute("data-id")).toBe("layer:B");
  });

  it("writes curves as absolute cubics and closes every ring", () => {
    const data = parsed().querySelector("path")?.getAttribute("d") ?? "";
    expect(data).toMatch(/^M60 40C60 51\.046 51\.046 60 40 60C/);
    expect(data.match(/Z/g)).toHaveLength(2);
    expect(data).not.toMatch(/[a-z]/);
  });
});
