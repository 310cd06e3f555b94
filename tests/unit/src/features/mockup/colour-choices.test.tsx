// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, useReducer } from "react";
import { afterEach, describe, expect, it } from "vitest";
import type { Artwork } from "#shared/contracts/artworks.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { DeskContext } from "@/features/mockup/editor/desk-context.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import type { ArtworkToBringIn } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import { type Editor, nextEditor, startEditor } from "@/features/mockup/model/editor.ts";
import { ColourChoices } from "@/features/mockup/panels/colour-choices.tsx";
import { ReplaceReview } from "@/features/mockup/panels/replace-review.tsx";
import { button, press, render } from "../../support/render.tsx";
import { buildDesk } from "./build-desk.ts";
import { brass, cement, chalk, emptyMockup, epoxy, midnight } from "./sample-mockup.ts";
import { inside } from "./sites.ts";

let editor: Editor;
let page: Awaited<ReturnType<typeof render>> | null = null;
afterEach(() => page?.end());

const gold = "#C8992F";
const blue = "#27314F";
const square = (index: number, colour: string, x: number, size: number) => ({
  index,
  colour,
  path: rectanglePath({ x, y: 10, width: size, height: size }),
  box: { x, y: 10, width: size, height: size },
  areaMm2: size * size,
});
const drawing = (artworkId: string, sizes: readonly number[]): ArtworkToBringIn => ({
  artworkId,
  widthMm: 200,
  heightMm: 80,
  pieces: [square(0, blue, 10, sizes[0] ?? 60), square(1, blue, 90, 20), square(2, gold, 130, 40)].slice(
    0,
    sizes.length,
  ),
});
const first = drawing("0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11", [60, 20, 40]);
const artwork: Artwork = {
  id: first.artworkId,
  name: "heron.svg",
  state: "ready",
  sha256: "0".repeat(64),
  byteSize: 1,
  addedAt: "2031-01-01T00:00:00.000Z",
  addedBy: "Any maker",
  widthMm: 200,
  heightMm: 80,
  colours: [
    { colour: blue, pieces: 2, areaMm2: 4000 },
    { colour: gold, pieces: 1, areaMm2: 1600 },
  ],
  warnings: [],
  refusal: null,
  trace: null,
  can: { change: false, remove: false, trace: false },
};
const stock = {
  acrylics: [midnight, brass, chalk].map((acrylic) => ({ acrylic, thicknessesMm: [3, 5] })),
  woods: [],
  hardware: [],
  adhesives: [epoxy, cement],
};

function Page({
  replaceWith,
  document: start = emptyMockup(),
}: {
  readonly replaceWith?: ArtworkToBringIn;
  readonly document?: MockupDocument;
}) {
  const [held, dispatch] = useReducer(nextEditor, start, startEditor);
  editor = held;
  return (
    <QueryClientProvider client={new QueryClient()}>
      <DeskContext value={buildDesk(held, dispatch, { stock })}>
        {replaceWith && held.history.present.layers.length > 0 ? (
          <ReplaceReview
            artwork={{ ...artwork, name: "heron-2.pdf" }}
            before={{ ...first, name: "heron.svg" }}
            after={replaceWith}
            onDone={() => undefined}
          />
        ) : (
          <ColourChoices shop="s" jobId="j" artwork={artwork} drawing={first} onDone={() => undefined} />
        )}
      </DeskContext>
    </QueryClientProvider>
  );
}

function labelled<T extends HTMLElement>(label: string): T {
  const found = document.querySelector<T>(`[aria-label="${label}"]`);
  if (!found) throw new Error(`nothing is labelled "${label}"`);
  return found;
}
const choose = (label: string, value: string) =>
  act(async () => {
    const select = labelled<HTMLSelectElement>(label);
    select.value = value;
    select.dispatchEvent(new Event("change", { bubbles: true }));
  });
const layers = () => editor.history.present.layers;
const says = () => document.body.textContent ?? "";

describe("the colours of an artwork", () => {
  it("stand beside the nearest sheet with the difference, and become a layer each, in one step", async () => {
    page = await render(<Page />);
    expect(labelled<HTMLSelectElement>(`Stock of ${blue}`).selectedOptions[0]?.textContent).toBe(midnight.name);
    expect(labelled<HTMLSelectElement>(`Stock of ${gold}`).selectedOptions[0]?.textContent).toBe(brass.name);
    expect(says()).toMatch(/(the same to the eye|close|off, seen side by side|clearly different), ΔE \d+\.\d/);
    await choose(`Stock of ${gold}`, "2");
    expect(says()).toMatch(/clearly different, ΔE \d/);
    await choose(`Thickness, mm of ${gold}`, "5");
    await press(button("Bring in 2 layers"));
    expect(layers().map((layer) => [layer.stock.name, layer.thickness, layer.pieces.length])).toEqual([
      [midnight.name, 3, 2],
      [chalk.name, 5, 1],
    ]);
    expect(editor.history.past).toHaveLength(1);
  });

  it("can be left out or joined; what is left out stays an outline in the picture", async () => {
    page = await render(<Page />);
    await choose(`Where ${gold} goes`, "out");
    expect(document.querySelectorAll("path[stroke-dasharray]")).toHaveLength(1);
    expect(says()).toContain("1 new layer, 1 piece left out");
    await choose(`Where ${gold} goes`, `with ${blue}`);
    await press(button("Bring in 1 layer"));
    expect(layers().map(({ pieces }) => pieces.length)).toEqual([3]);
  });

  it("can be split by picking pieces in the picture, and the part sent to a layer that is there", async () => {
    page = await render(<Page />);
    await press(button("Bring in 2 layers"));
    await page.redraw(<Page />);
    const piece = [...document.querySelectorAll("svg[role=img] path")][1];
    await act(async () => piece?.dispatchEvent(new MouseEvent("click", { bubbles: true })));
    expect(says()).toContain("1 piece picked, 20 × 20 mm.");
    await press(button("Give them a layer of their own"));
    await choose(`Where ${blue} (2) goes`, "layer C");
    await choose(`Where ${blue} goes`, "out");
    await choose(`Where ${gold} goes`, "out");
    await press(button("Add to the layers"));
    expect(layers().map(({ key, pieces }) => [key, pieces.length])).toEqual([
      ["B", 2],
      ["C", 2],
    ]);
  });
});

describe("a mockup with room for one more layer", () => {
  it("takes no second one, and says what to do", async () => {
    let full = emptyMockup();
    for (let key = 0; key < 59; key++)
      full = addPlate(full, {
        shape: { kind: "circle", diameter: 20 },
        id: `plate${key}`,
        name: "Plate",
        stock: chalk,
        thickness: 3,
        hold: { kind: "bond", adhesive: cement },
        site: inside,
      });
    page = await render(<Page document={full} />);
    expect(says()).toContain("A mockup takes 60 layers: join or leave out 1 colour more");
    expect(button("Bring in 2 layers").disabled).toBe(true);
    await choose(`Where ${gold} goes`, `with ${blue}`);
    await press(button("Bring in 1 layer"));
    expect(layers()).toHaveLength(60);
  });
});

describe("an artwork in place of another", () => {
  it("tells what changed and what is gone before it happens, and keeps the layers", async () => {
    const next = drawing("0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c22", [64, 20]);
    page = await render(<Page replaceWith={next} />);
    await press(button("Bring in 2 layers"));
    const before = layers();
    expect(says()).toContain("B, Midnight");
    expect(says()).toMatch(/Changed\s*Piece 1 moved, of another size/);
    expect(says()).toMatch(/As it was\s*1 piece/);
    expect(says()).toMatch(/Gone\s*Piece 1/);
    expect(layers()).toBe(before);
    await press(button("Put it in place"));
    expect(layers().map(({ stock: sheet, hold, pieces }) => [sheet, hold, pieces.length])).toEqual(
      before.map(({ stock: sheet, hold }, at) => [sheet, hold, at === 0 ? 2 : 0]),
    );
    expect(editor.history.past).toHaveLength(2);
  });
});
