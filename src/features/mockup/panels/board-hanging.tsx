import type { MockupDocument } from "#shared/mockup/document.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { FixingsTable } from "./fixings-table.tsx";

type Hanging = MockupDocument["hanging"];

const kinds: readonly { readonly kind: Hanging["kind"]; readonly text: string }[] = [
  { kind: "none", text: "not chosen" },
  { kind: "cleat", text: "cleat" },
  { kind: "keyholes", text: "keyholes" },
  { kind: "wire", text: "wire" },
  { kind: "screwed through", text: "screwed through" },
  { kind: "through standoffs", text: "through its standoffs" },
];

const poses: readonly { readonly pose: Hanging["pose"]; readonly text: string }[] = [
  { pose: "upright", text: "upright" },
  { pose: "tilted", text: "tilted" },
  { pose: "lying", text: "lying flat" },
];

/** How the sign hangs, what the wall's fixing carries, and where the fixings are. */
export function BoardHanging({ writing }: { readonly writing: BoardWriting }) {
  const { unit } = useDesk();
  const { draft, set, problemOf } = writing;
  return (
    <>
      <div className="grid items-start gap-3 sm:grid-cols-2 md:grid-cols-4">
        <Select
          label="Hung by"
          value={draft.kind}
          onChange={(event) => {
            const chosen = kinds.find(({ kind }) => kind === event.target.value);
            if (chosen) set({ kind: chosen.kind });
          }}
        >
          {kinds.map(({ kind, text }) => (
            <option key={kind} value={kind}>
              {text}
            </option>
          ))}
        </Select>
        <Select
          label="The sign is"
          value={draft.pose}
          onChange={(event) => {
            const chosen = poses.find(({ pose }) => pose === event.target.value);
            if (chosen) set({ pose: chosen.pose });
          }}
        >
          {poses.map(({ pose, text }) => (
            <option key={pose} value={pose}>
              {text}
            </option>
          ))}
        </Select>
        <LengthField
          label="Gap behind the board"
          unit={unit}
          value={draft.gap}
          onChange={(gap) => set({ gap })}
          error={problemOf("gap", draft.gap)}
        />
        <NumberField
          label="The wall’s fixing carries"
          suffix={unit === "mm" ? "kg" : "lb"}
          hint="All fixings together, as you state it for this wall. Empty while nobody has."
          value={draft.carries}
          onChange={(carries) => set({ carries })}
          error={problemOf("carries", draft.carries)}
        />
      </div>
      <FixingsTable writing={writing} />
    </>
  );
}
