import { describe, expect, it } from "vitest";
import {
  type Family,
  familyFacts,
  pairFit,
  type Surface,
  tackAndWick,
  waitingHours,
} from "#shared/bonds/adhesive-families.ts";
import { adhesiveSchema } from "#shared/mockup/stock-schemas.ts";

const families: readonly Family[] = adhesiveSchema.shape.family.options;
const surfaces: readonly Surface[] = ["acrylic", "coated back", "raw wood", "finished wood"];

describe("every family", () => {
  it.each(families)("%s has cautions, waits and what it allows", (family) => {
    const facts = familyFacts(family);
    expect(facts.cautions).toContain("Test on scrap of the same sheet and finish first.");
    expect(facts.cautions.length).toBeGreaterThan(1);
    expect(facts.fullHours).toBeGreaterThan(facts.handlingHours);
    expect(facts.allowsMm).toBe(facts.gives === "rigid" ? 0.1 : 1);
  });

  it("fits a pair the same in both orders, and some pair at all", () => {
    for (const family of families) {
      const fits = surfaces.flatMap((one) =>
        surfaces.map((other) => {
          expect(pairFit(family, one, other)).toEqual(pairFit(family, other, one));
          return pairFit(family, one, other).fits;
        }),
      );
      expect(fits).toContain(true);
    }
  });

  it("some family fits every pair with acrylic or a coated back in it", () => {
    for (const one of ["acrylic", "coated back"] as const) {
      for (const other of surfaces) expect(families.some((family) => pairFit(family, one, other).fits)).toBe(true);
    }
  });
});

// Common practice.
describe("a pair", () => {
  it.each([
    { family: "solvent cement", one: "acrylic", other: "acrylic", fits: true },
    { family: "solvent cement", one: "acrylic", other: "raw wood", fits: false },
    { family: "solvent cement", one: "acrylic", other: "coated back", fits: false },
    { family: "bodied cement", one: "coated back", other: "raw wood", fits: false },
    { family: "cyanoacrylate", one: "acrylic", other: "finished wood", fits: true },
    { family: "cyanoacrylate", one: "coated back", other: "raw wood", fits: true },
    { family: "epoxy", one: "acrylic", other: "raw wood", fits: true },
    { family: "epoxy", one: "acrylic", other: "acrylic", fits: false },
    { family: "neutral silicone", one: "coated back", other: "finished wood", fits: true },
    { family: "high-bond tape", one: "coated back", other: "acrylic", fits: true },
    { family: "wood glue", one: "acrylic", other: "raw wood", fits: false },
    { family: "wood glue", one: "raw wood", other: "raw wood", fits: true },
    { family: "wood glue", one: "raw wood", other: "finished wood", fits: false },
  ] as const)("$one to $other with $family: $fits", ({ family, one, other, fits }) => {
    const fit = pairFit(family, one, other);
    expect(fit.fits).toBe(fits);
    if (!fit.fits) expect(fit.why).toMatch(/\.$/);
  });

  it.each(["solvent cement", "bodied cement"] as const)(
    "of a coated back with %s is told what to take instead",
    (family) => {
      const fit = pairFit(family, "acrylic", "coated back");
      expect(fit.fits ? "" : fit.why).toMatch(/Solvent lifts paint and mirror backs.*silicone.*tape/);
    },
  );

  it("on a finished face says that the bond is as strong as the finish", () => {
    const fit = pairFit("high-bond tape", "acrylic", "finished wood");
    expect(fit).toMatchObject({ fits: true, remarks: ["A bond on a finished face is as strong as the finish."] });
    expect(pairFit("epoxy", "coated back", "raw wood")).toMatchObject({
      fits: true,
      remarks: ["A bond on a painted or mirrored back is as strong as the coating."],
    });
  });
});

describe("waiting", () => {
  it("for one family is its own", () => {
    expect(waitingHours("epoxy")).toEqual({ handling: 8, full: 72 });
  });

  it("for a tack that is wicked after is the tack's, then a night's rest or the cements' own cure", () => {
    expect(waitingHours(tackAndWick)).toEqual({ handling: 0.75, full: 24.25 });
    expect(waitingHours({ ...tackAndWick, restHours: 48 }).full).toBe(48.25);
  });
});
