import { Field } from "@/components/ui/field.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { setWallColour } from "../model/commands/set-wall.ts";

/** The colour of a plain wall. */
export function WallColour() {
  const { document, edit } = useDesk();
  return (
    <Field
      label="Wall colour"
      type="color"
      value={document.presentation.wall.toLowerCase()}
      onChange={(event) => {
        const wall = event.target.value.toUpperCase();
        edit({ label: "Wall colour", change: (before) => setWallColour(before, wall), together: "wall colour" });
      }}
    />
  );
}
