import type { Hardware } from "#shared/mockup/document.ts";
import type { WrittenHardware } from "./written.ts";

/** A length of a standoff as the form asks for it and the drawing beside it shows it, by a number. */
export type Measure = {
  /** Its field, or one within a field after a dot. */
  readonly field: string;
  readonly label: string;
  readonly hint?: string;
};

const ofKind: Readonly<Record<Hardware["kind"], readonly Measure[]>> = {
  capStud: [
    { field: "barrelLength", label: "Barrel, long" },
    { field: "barrelDiameter", label: "Barrel, across" },
    { field: "boreDepth", label: "Bore, deep" },
    { field: "boreDiameter", label: "Bore, across" },
    { field: "floorThickness", label: "Floor, thick" },
    { field: "floorHole", label: "Floor hole, across" },
    { field: "studLength", label: "Stud, long", hint: "From under the cap." },
    { field: "studDiameter", label: "Stud, across" },
    { field: "capDiameter", label: "Cap, across" },
    { field: "capThickness", label: "Cap, thick" },
  ],
  throughScrew: [
    { field: "barrelLength", label: "Spacer, long" },
    { field: "barrelDiameter", label: "Spacer, across" },
    { field: "boreDiameter", label: "Bore, across" },
    { field: "washerThickness", label: "Washer, thick", hint: "0 without one." },
    { field: "cap.diameter", label: "Cap, across" },
    { field: "cap.thickness", label: "Cap, thick" },
  ],
  blindStud: [
    { field: "studLength", label: "Stud, long", hint: "From the panel's back." },
    { field: "studDiameter", label: "Stud, across" },
    { field: "barrelLength", label: "Spacer, long" },
    { field: "barrelDiameter", label: "Spacer, across" },
  ],
  edgeGrip: [
    { field: "barrelLength", label: "Slot above the wood" },
    { field: "barrelDiameter", label: "Holder, across" },
    { field: "slotWidth", label: "Slot, wide" },
    { field: "gripDepth", label: "Slot, deep", hint: "How far it reaches over the panel's edge." },
    { field: "height", label: "Front above the wood" },
    { field: "floorThickness", label: "Floor, thick" },
    { field: "floorHole", label: "Floor hole, across" },
  ],
};

export type NumberedMeasure = Measure & { readonly number: number };

/** The measures that this very standoff has, numbered as on its drawing. */
export function measuresOf(hardware: WrittenHardware): readonly NumberedMeasure[] {
  return ofKind[hardware.kind]
    .map((measure, index) => ({ ...measure, number: index + 1 }))
    .filter(({ field }) => !isLeftOut(hardware, field));
}

function isLeftOut(hardware: WrittenHardware, field: string): boolean {
  if (hardware.kind === "throughScrew") return hardware.cap === null && field.startsWith("cap.");
  return hardware.kind === "blindStud" && hardware.barrelLength === 0 && field.startsWith("barrel");
}

/** A measure's length in mm: null while it is empty, NaN while it can't be read. */
export function measureIn(hardware: WrittenHardware, field: string): number | null {
  const [outer = "", inner] = field.split(".");
  const value = Object.entries(hardware).find(([key]) => key === outer)?.[1];
  const found = inner === undefined ? value : Object.entries(value ?? {}).find(([key]) => key === inner)?.[1];
  return typeof found === "number" ? found : null;
}

/** The standoff with one measure changed. */
export function withMeasure(hardware: WrittenHardware, field: string, mm: number | null): WrittenHardware {
  const [outer = "", inner] = field.split(".");
  if (inner === undefined) return { ...hardware, [outer]: mm };
  const within = Object.entries(hardware).find(([key]) => key === outer)?.[1];
  return { ...hardware, [outer]: { ...(typeof within === "object" ? within : {}), [inner]: mm } };
}
