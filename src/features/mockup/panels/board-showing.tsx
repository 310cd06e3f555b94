import { DistanceField } from "@/components/ui/distance-field.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";

/** Where the light comes from, as people say it. Degrees clockwise from the top. */
const lights = [
  { azimuth: 0, text: "from above" },
  { azimuth: 45, text: "from the upper right" },
  { azimuth: 90, text: "from the right" },
  { azimuth: 270, text: "from the left" },
  { azimuth: 315, text: "from the upper left" },
] as const;

/** The wall, the light and the distance that the sign is looked at from. */
export function BoardShowing({ draft, set, problemOf }: Pick<BoardWriting, "draft" | "set" | "problemOf">) {
  const { unit } = useDesk();
  const { azimuth, viewingDistance, wall } = draft;
  return (
    <div className="grid gap-3 sm:grid-cols-3">
      <Select label="Light" value={azimuth} onChange={(event) => set({ azimuth: Number(event.target.value) })}>
        {!lights.some((light) => light.azimuth === azimuth) && <option value={azimuth}>{azimuth}° from the top</option>}
        {lights.map((light) => (
          <option key={light.azimuth} value={light.azimuth}>
            {light.text}
          </option>
        ))}
      </Select>
      <DistanceField
        label="Seen from"
        unit={unit}
        value={viewingDistance}
        onChange={(mm) => set({ viewingDistance: mm })}
        error={problemOf("viewingDistance", viewingDistance)}
      />
      <Field
        label="Wall colour"
        type="color"
        value={wall.toLowerCase()}
        onChange={(event) => set({ wall: event.target.value.toUpperCase() })}
      />
    </div>
  );
}
