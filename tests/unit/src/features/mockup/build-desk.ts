import type { Desk } from "@/features/mockup/editor/desk-context.ts";
import { usualAids } from "@/features/mockup/model/desk-aids.ts";
import type { Editor, EditorAction } from "@/features/mockup/model/editor.ts";
import { inside } from "./sites.ts";

/** A desk for one panel: the editor's document and choice, edits taken, everything else empty unless a test says otherwise. */
export function buildDesk(
  { history, selection }: Editor,
  dispatch: (action: EditorAction) => void,
  overrides: Partial<Desk> = {},
): Desk {
  return {
    document: history.present,
    selection,
    unit: "mm",
    stock: { acrylics: [], woods: [], hardware: [], adhesives: [] },
    site: inside,
    briefWords: "",
    heights: "nominal",
    letterHeights: () => undefined,
    figures: null,
    figuresOf: history.present,
    holesByHand: null,
    putHolesByHand: () => undefined,
    client: "Any client",
    copyPlace: { personId: "person", shop: "shop", clientId: "client" },
    aids: usualAids("mm"),
    changeAids: () => undefined,
    edit: (edit) => dispatch({ kind: "edit", ...edit }),
    choose: (next) => dispatch({ kind: "choose", selection: next }),
    say: () => undefined,
    ...overrides,
  };
}
