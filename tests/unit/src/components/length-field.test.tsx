// @vitest-environment jsdom
import { useState } from "react";
import { describe, expect, it } from "vitest";
import type { LengthUnit } from "#shared/units/length.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { field, render, type } from "../support/render.tsx";

const seen: (number | null)[] = [];
function Harness({ unit, start }: { readonly unit: LengthUnit; readonly start: number | null }) {
  const [mm, setMm] = useState(start);
  const handleChange = (next: number | null) => {
    seen.push(next);
    setMm(next);
  };
  return <LengthField label="Width" unit={unit} value={mm} onChange={handleChange} />;
}

describe("LengthField", () => {
  it.each([
    { unit: "mm", text: "60 cm", mm: 600, after: "600" },
    { unit: "mm", text: "412,5", mm: 412.5, after: "412.5" },
    { unit: "in", text: "23 5/8", mm: 600.075, after: "23 5/8″" },
    { unit: "in", text: "600 mm", mm: 600, after: "23 5/8″" },
  ] as const)("takes $text in $unit and shows $after when left", async ({ unit, text, mm, after }) => {
    await render(<Harness unit={unit} start={null} />);
    await type(field("Width"), text);
    expect(seen.at(-1)).toBeCloseTo(mm, 9);
    expect(field("Width").value).toBe(after);
  });

  it("keeps what is no length, says so, and passes on that it is none", async () => {
    await render(<Harness unit="mm" start={600} />);
    await type(field("Width"), "wide");
    expect(seen.at(-1)).toBeNaN();
    expect(field("Width").value).toBe("wide");
    expect(field("Width").getAttribute("aria-invalid")).toBe("true");
    expect(document.body.textContent).toContain("Write a length, like 600 or 60 cm.");
  });

  it("is empty for no length", async () => {
    await render(<Harness unit="mm" start={600} />);
    expect(field("Width").value).toBe("600");
    await type(field("Width"), "  ");
    expect(seen.at(-1)).toBeNull();
    expect(field("Width").value).toBe("");
  });
});
