import { describe, expect, it } from "vitest";
import type { Hold } from "#shared/mockup/document.ts";
import { sectionHint } from "@/features/mockup/model/section-hint.ts";
import { barrel, cement } from "../sample-mockup.ts";
import { layerOf } from "../set-out-page.tsx";

const bond: Hold = { kind: "bond", adhesive: cement, tack: null };
const pocket: Hold = { kind: "pocket", depth: 3, clearance: 0.2, adhesive: cement, cut: "routed", bitRadius: 1.5 };
const standoff: Hold = { kind: "standoff", hardware: barrel(19), offset: 19, holes: [] };
const hintOf = (...holds: readonly Hold[]) =>
  sectionHint(holds.map((hold, at) => layerOf("BCD"[at] ?? "E", [], { hold })));

describe("what the section says a hand can do", () => {
  it("promises no more than the layers' holds allow", () => {
    expect(hintOf()).toBeNull();
    expect(hintOf(bond)).toBe("a layer on standoffs can be raised");
    expect(hintOf(bond, standoff)).toBe("drag a layer to raise it");
    expect(hintOf(bond, pocket)).toBe("drag a layer to let it in");
    expect(hintOf(pocket, standoff)).toBe("drag a layer to raise it or let it in");
  });

  it("counts no layer that is locked", () => {
    expect(sectionHint([layerOf("B", [], { hold: standoff, locked: true })])).toBeNull();
  });
});
