import { createElement, type MouseEvent, type ReactNode, useId, useMemo } from "react";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { type SvgNode, svgTree } from "#shared/drawing/svg.ts";

type DrawingSvgProps = {
  list: DisplayList;
  /** What the picture shows, for those who don't see it. */
  title: string;
  className?: string;
  /** The id of the topmost item under the pointer, and where that is on the drawing in mm; null when the ground was touched. */
  onPick?: (id: string | null, at: { x: number; y: number }) => void;
};

const reactNames: Readonly<Record<string, string>> = {
  "clip-path": "clipPath",
  "clip-rule": "clipRule",
  "fill-opacity": "fillOpacity",
  "fill-rule": "fillRule",
  "font-family": "fontFamily",
  "font-size": "fontSize",
  "font-variant": "fontVariant",
  "font-weight": "fontWeight",
  "pointer-events": "pointerEvents",
  "stroke-dasharray": "strokeDasharray",
  "stroke-linecap": "strokeLinecap",
  "stroke-linejoin": "strokeLinejoin",
  "stroke-opacity": "strokeOpacity",
  "stroke-width": "strokeWidth",
  "text-anchor": "textAnchor",
};

const reactAttributes = (attributes: Readonly<Record<string, string>>) =>
  Object.fromEntries(Object.entries(attributes).map(([name, value]) => [reactNames[name] ?? name, value]));

/** Items never move inside a picture: a changed drawing is a new list, so the place in it is the key. */
function elementOfNode(node: SvgNode, place: number): ReactNode {
  return createElement(node.tag, { key: place, ...reactAttributes(node.attributes) }, ...childrenOf(node));
}

const childrenOf = (node: SvgNode): ReactNode[] =>
  node.text === undefined ? node.children.map(elementOfNode) : [node.text];

/** A display list as SVG elements, the same as `paintSvg` writes. It takes the width of its place. */
export function DrawingSvg({ list, title, className, onPick }: DrawingSvgProps) {
  const prefix = useId();
  const tree = useMemo(() => svgTree(list, { idPrefix: prefix, title }), [list, prefix, title]);
  const { width: _width, height: _height, ...attributes } = tree.attributes;

  function handleClick(event: MouseEvent<SVGSVGElement>) {
    const matrix = event.currentTarget.getScreenCTM();
    if (!onPick || !matrix || !(event.target instanceof Element)) return;
    const at = new DOMPoint(event.clientX, event.clientY).matrixTransform(matrix.inverse());
    const named = event.target.closest("[data-id]");
    onPick(named?.getAttribute("data-id") ?? null, { x: at.x, y: at.y });
  }

  return createElement(
    "svg",
    { ...reactAttributes(attributes), className, ...(onPick === undefined ? {} : { onClick: handleClick }) },
    ...childrenOf(tree),
  );
}
