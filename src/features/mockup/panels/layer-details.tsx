import type { Adhesive, Hold, Layer } from "#shared/mockup/document.ts";
import { useDesk } from "../editor/desk-context.ts";
import { type PocketFields, setPocket, setTack } from "../model/commands/set-hold.ts";
import { setLayer } from "../model/commands/set-layer.ts";
import type { Bounds } from "../model/length-bounds.ts";
import { bitRadiusBounds, clearanceBounds, pocketDepthBounds } from "../model/limits.ts";
import { isSameStock, withCurrent } from "../model/stock-choices.ts";
import { CellLength, CellSelect } from "./cell-controls.tsx";

/** What the schedule has no column for: the pocket, the first step of a joint, and which face is marked. */
export function LayerDetails() {
  const { document, selection } = useDesk();
  const layer = document.layers.find(({ key }) => key === selection.layerKey);
  if (!layer) return null;
  const { hold } = layer;
  return (
    <section aria-label={`More of ${layer.key}`} className="border-t border-rule px-4 py-2 sm:px-6">
      <fieldset disabled={layer.locked}>
        <dl className="flex flex-wrap items-end gap-x-6 gap-y-2 text-sm">
          {hold.kind === "pocket" && <PocketCells layerKey={layer.key} hold={hold} />}
          {hold.kind === "bond" && <TackCell layerKey={layer.key} hold={hold} />}
          <MarkedCell layer={layer} />
        </dl>
      </fieldset>
    </section>
  );
}

const cell = "w-32";
const head = "text-fine text-graphite";

function PocketCells({
  layerKey,
  hold,
}: {
  readonly layerKey: string;
  readonly hold: Extract<Hold, { kind: "pocket" }>;
}) {
  const { edit, unit } = useDesk();
  const set = (fields: PocketFields) =>
    edit({ label: `Pocket of ${layerKey}`, change: (before) => setPocket(before, { key: layerKey, ...fields }) });
  const length = (name: "depth" | "clearance" | "bitRadius", title: string, bounds: Bounds) => (
    <div className={cell}>
      <dt className={head}>{title}</dt>
      <dd>
        <CellLength
          aria-label={`${title} of ${layerKey}`}
          mm={hold[name]}
          unit={unit}
          bounds={bounds}
          onCommit={(mm) => set({ [name]: mm })}
        />
      </dd>
    </div>
  );
  return (
    <>
      {length("depth", "Pocket, deep", pocketDepthBounds)}
      {length("clearance", "Clearance a side", clearanceBounds)}
      <div className={cell}>
        <dt className={head}>Pocket is</dt>
        <dd>
          <CellSelect
            aria-label={`How the pocket of ${layerKey} is cut`}
            value={hold.cut}
            onChange={(event) => set({ cut: event.target.value === "routed" ? "routed" : "engraved" })}
          >
            <option value="engraved">engraved</option>
            <option value="routed">routed</option>
          </CellSelect>
        </dd>
      </div>
      {hold.cut === "routed" && length("bitRadius", "Radius of the bit", bitRadiusBounds)}
    </>
  );
}

function TackCell({ layerKey, hold }: { readonly layerKey: string; readonly hold: Extract<Hold, { kind: "bond" }> }) {
  const { edit, stock } = useDesk();
  const adhesives: readonly Adhesive[] = hold.tack ? withCurrent(stock.adhesives, hold.tack) : stock.adhesives;
  const chosen = hold.tack;
  return (
    <div className="w-52">
      <dt className={head}>Tacked first with</dt>
      <dd>
        <CellSelect
          aria-label={`What ${layerKey} is tacked with first`}
          value={chosen ? adhesives.findIndex((one) => isSameStock(one, chosen)) : -1}
          onChange={(event) => {
            const tack = adhesives[Number(event.target.value)] ?? null;
            edit({ label: `Tack ${layerKey}`, change: (before) => setTack(before, { key: layerKey, tack }) });
          }}
        >
          <option value={-1}>nothing, bonded in one step</option>
          {adhesives.map((one, index) => (
            <option key={`${one.stockId} ${one.name}`} value={index}>
              {one.name}
            </option>
          ))}
        </CellSelect>
      </dd>
    </div>
  );
}

const markings: readonly { readonly marked: Layer["marked"]; readonly text: string }[] = [
  { marked: "not stated", text: "not stated" },
  { marked: "front", text: "on the front" },
  { marked: "back", text: "on the back" },
];

function MarkedCell({ layer }: { readonly layer: Layer }) {
  const { edit } = useDesk();
  return (
    <div className={cell}>
      <dt className={head}>Film is marked</dt>
      <dd>
        <CellSelect
          aria-label={`Where the film of ${layer.key} is marked`}
          value={layer.marked}
          onChange={(event) => {
            const chosen = markings.find(({ marked }) => marked === event.target.value);
            if (chosen)
              edit({
                label: `Mark the film of ${layer.key}`,
                change: (before) => setLayer(before, { key: layer.key, marked: chosen.marked }),
              });
          }}
        >
          {markings.map(({ marked, text }) => (
            <option key={marked} value={marked}>
              {text}
            </option>
          ))}
        </CellSelect>
      </dd>
    </div>
  );
}
