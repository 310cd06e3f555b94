import { useState } from "react";
import { coatId } from "#shared/cost/entry-ids.ts";
import type { Thing } from "#shared/cost/things-to-price.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";

/** A finish by the name that mockups call it. */
export function AddFinish({ onAdd }: { readonly onAdd: (thing: Thing) => void }) {
  const [written, setWritten] = useState("");
  const [asked, setAsked] = useState(false);
  const name = written.trim();
  const add = () => {
    setAsked(true);
    if (name === "") return;
    onAdd({ id: coatId({ kind: "other", name, dryingHours: 0 }), name });
    setWritten("");
    setAsked(false);
  };
  return (
    <div className="mt-3 flex max-w-xl flex-wrap items-end gap-3">
      <Field
        label="Finish, as mockups name it"
        className="min-w-56 flex-1"
        maxLength={120}
        value={written}
        error={asked && name === "" ? "Write its name." : undefined}
        onChange={(event) => setWritten(event.target.value)}
      />
      <Button onClick={add}>Add the finish</Button>
    </div>
  );
}
