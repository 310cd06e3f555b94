import { expect, it } from "vitest";
import { screwInBarrel } from "#shared/dry-fit/rules/screw-in-barrel.ts";
import type { CapStud } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  hole,
  plate,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const panel = (hardware: Partial<CapStud>) =>
  buildSign([
    buildLayer("B", [plate("panel", 200, 100, [300, 200])], {
      hold: standoffHold([hole("h", 300, 200)], buildCapStud(hardware)),
    }),
  ]);

// No. 6: 3.5052 mm thick, head 7.0866 mm (ASME B18.6.1).
it.each([
  { hardware: {}, values: [] },
  { hardware: { floorHole: 3.51, boreDiameter: 7.09 }, values: [] },
  { hardware: { floorHole: 3.5 }, values: [3.5] },
  { hardware: { boreDiameter: 7.08 }, values: [7.08] },
  { hardware: { floorHole: 3, boreDiameter: 6 }, values: [3, 6] },
])("a barrel with $hardware: $values", async ({ hardware, values }) => {
  const findings = await findingsOf(screwInBarrel, panel(hardware));
  expect(findings.map(({ value }) => value)).toEqual(values);
  for (const finding of findings)
    expect(finding).toMatchObject({ rule: 9, severity: "stop", where: { x: 300, y: 200 } });
});

it("names the screw, the barrel and both measures", async () => {
  const [finding] = await findingsOf(screwInBarrel, panel({ boreDiameter: 6 }));
  expect(finding?.text).toBe(
    "No. 6 × 16, flat head does not go into Standoff 15 × 12 of B, Layer B: its head is 7.09 mm wide, the bore 6 mm.",
  );
});

it.each([
  { hardware: buildHardware("edgeGrip"), values: [] },
  { hardware: buildHardware("edgeGrip", { floorHole: 3.5 }), values: [3.5] },
  { hardware: buildHardware("throughScrew", { boreDiameter: 3.51 }), values: [] },
  { hardware: buildHardware("throughScrew", { boreDiameter: 3.5 }), values: [3.5] },
  { hardware: buildHardware("blindStud"), values: [] },
])("$hardware.name of another kind: $values", async ({ hardware, values }) => {
  const sign = buildSign([
    buildLayer("B", [plate("panel", 200, 100, [300, 200])], { hold: standoffHold([hole("h", 300, 200)], hardware) }),
  ]);
  const findings = await findingsOf(screwInBarrel, sign);
  expect(findings.map(({ value }) => value)).toEqual(values);
});
