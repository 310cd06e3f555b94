import { describe, expect, it } from "vitest";
import { adhesiveFits } from "#shared/dry-fit/rules/adhesive-fits.ts";
import { standardAcrylics, standardAdhesives, standardStock } from "#shared/materials/standard-stock.ts";
import type { Acrylic, Adhesive, Coat, Hold } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, plate, pocketHold, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

function adhesive(family: Adhesive["family"]): Adhesive {
  const found = standardAdhesives.find((one) => one.family === family);
  if (!found) throw new Error(`There is no ${family}.`);
  return found;
}
function sheet(name: string, rest: Partial<Acrylic> = {}): Acrylic {
  const found = standardAcrylics.find(({ acrylic }) => acrylic.name === name);
  if (!found) throw new Error(`There is no ${name}.`);
  return { ...found.acrylic, ...rest };
}
const bond = (family: Adhesive["family"], tack: Adhesive | null = null): Hold => ({
  kind: "bond",
  adhesive: adhesive(family),
  tack,
});
const pocketWith = (family: Adhesive["family"]): Hold => {
  const hold = pocketHold(2, 0.1);
  return hold.kind === "pocket" ? { ...hold, adhesive: adhesive(family) } : hold;
};
const clear: Coat = { kind: "clear coat", name: "Clear satin", base: "water-borne", dryingHours: 12 };
const onWood = (hold: Hold, finish: Coat[] = [], stock = sheet("Midnight")) => {
  const sign = buildSign([buildLayer("B", [plate("p", 15, 15, [300, 200])], { hold, stock })]);
  return { ...sign, backer: { ...sign.backer, finish } };
};
const onAcrylic = (hold: Hold, stock = sheet("Brass")) =>
  buildSign([
    buildLayer("B", [plate("base", 18, 18, [300, 200])], { hold: bond("cyanoacrylate"), thickness: 6 }),
    buildLayer("C", [plate("p", 10, 10, [300, 200])], { hold, stock }),
  ]);
const severitiesOf = async (sign: Parameters<typeof findingsOf>[1], key: string) =>
  (await findingsOf(adhesiveFits, sign)).filter(({ layerKey }) => layerKey === key).map(({ severity }) => severity);

// Common practice, as shared/bonds/adhesive-families.ts states it.
describe("an adhesive between two surfaces", () => {
  it.each<{ family: Adhesive["family"]; wood: string; acrylic: string; mirror: string }>([
    { family: "solvent cement", wood: "stop", acrylic: "remark", mirror: "stop" },
    { family: "bodied cement", wood: "stop", acrylic: "remark", mirror: "stop" },
    { family: "cyanoacrylate", wood: "remark", acrylic: "remark", mirror: "remark" },
    { family: "epoxy", wood: "remark", acrylic: "stop", mirror: "remark" },
    { family: "neutral silicone", wood: "remark", acrylic: "remark", mirror: "remark" },
    { family: "wood glue", wood: "stop", acrylic: "stop", mirror: "stop" },
  ])("$family: wood $wood, acrylic $acrylic, mirror's back $mirror", async ({ family, wood, acrylic, mirror }) => {
    expect(await severitiesOf(onWood(bond(family)), "B")).toEqual([wood]);
    expect(await severitiesOf(onAcrylic(bond(family)), "C")).toEqual([acrylic]);
    expect(await severitiesOf(onAcrylic(bond(family), sheet("Mirror, silver")), "C")).toEqual([mirror]);
  });

  it("a sheet whose faces differ is painted on its back, unless it is frosted", async () => {
    const painted = sheet("Clear", { facesDiffer: true });
    expect(await severitiesOf(onAcrylic(bond("solvent cement"), painted), "C")).toEqual(["stop"]);
    expect(await severitiesOf(onAcrylic(bond("solvent cement"), sheet("Frost")), "C")).toEqual(["remark"]);
  });

  it("a stop says between what, and asks for nothing else of the layer", async () => {
    const [finding] = await findingsOf(adhesiveFits, onWood(bond("solvent cement"), [clear]));
    expect(finding).toMatchObject({ rule: 18, layerKey: "B", pieceIds: ["p"], where: { x: 300, y: 200 } });
    expect(finding?.text).toBe(
      "Wicking cement of B, Layer B does not bond acrylic to finished wood (Eastern white pine). Solvent melts acrylic into acrylic; wood has nothing that it could melt.",
    );
  });

  it("a layer across two plates of one height is one stop", async () => {
    const plates = ["B", "C"].map((key, index) =>
      buildLayer(key, [plate(`p${key}`, 15, 15, [300 + 15 * index, 200])], { hold: bond("cyanoacrylate") }),
    );
    const across = buildLayer("D", [plate("d", 20, 10, [307, 200])], { hold: bond("epoxy") });
    const stops = (await findingsOf(adhesiveFits, buildSign([...plates, across]))).filter(
      ({ severity }) => severity === "stop",
    );
    expect(stops).toMatchObject([{ layerKey: "D", pieceIds: ["d"] }]);
    expect(stops[0]?.text).toMatch(/acrylic to acrylic \((B, Layer B and C, Layer C|C, Layer C and B, Layer B)\)/);
  });

  it("a tack must fit too", async () => {
    expect(await severitiesOf(onWood(bond("epoxy", adhesive("bodied cement"))), "B")).toEqual(["stop"]);
  });
});

describe("the remark", () => {
  it("gives waiting times and cautions, and wakes with the full hours", async () => {
    const [finding] = await findingsOf(adhesiveFits, onWood(bond("epoxy"), [clear]));
    expect(finding).toMatchObject({ severity: "remark", value: 72, unit: "h" });
    expect(finding?.text).toContain(
      "Slow epoxy bonds B, Layer B: it can be moved after 8 hours, and is at its full strength after 3 days. A bond on a finished face is as strong as the finish. Roughen the acrylic.",
    );
    expect(finding?.text).toContain("wear gloves");
    expect(finding?.text).toContain("Test on scrap");
  });

  it("of sanded wood says nothing about a finish, and of silicone to seal it", async () => {
    const [finding] = await findingsOf(
      adhesiveFits,
      onWood(bond("neutral silicone"), [{ kind: "sanding", grit: 180 }]),
    );
    expect(finding?.text).not.toContain("finish is");
    expect(finding?.text).toContain("Seal raw wood first");
  });

  it("of two steps gives the time between them and the rest after, each caution once", async () => {
    const findings = await findingsOf(adhesiveFits, onAcrylic(bond("solvent cement", adhesive("bodied cement"))));
    const text = findings.find(({ layerKey }) => layerKey === "C")?.text ?? "";
    expect(text).toContain(
      "Bodied cement tacks C, Layer C, after 15 minutes Wicking cement bonds it: it can be moved after 45 minutes, and is at its full strength after 24 hours.",
    );
    expect(text.split("Flammable vapour")).toHaveLength(2);
  });

  it("is left out of what lies on nothing, stands on standoffs or is empty", async () => {
    const nothing = buildSign([buildLayer("B", [plate("lost", 10, 10, [700, 200])])]);
    expect(await findingsOf(adhesiveFits, nothing)).toEqual([]);
    expect(await findingsOf(adhesiveFits, onWood(standoffHold([])))).toEqual([]);
    expect(await findingsOf(adhesiveFits, buildSign([buildLayer("B", [])]))).toEqual([]);
  });
});

describe("solvent in a pocket", () => {
  it("of acrylic can craze it", async () => {
    expect(await severitiesOf(onAcrylic(pocketWith("solvent cement")), "C")).toEqual(["caution", "remark"]);
    expect(await severitiesOf(onAcrylic(pocketWith("cyanoacrylate")), "C")).toEqual(["remark"]);
  });

  it("of finished wood meets raw wood", async () => {
    const [finding] = await findingsOf(adhesiveFits, onWood(pocketWith("neutral silicone"), [clear]));
    expect(finding?.text).toContain("Seal raw wood first");
  });
});

describe("mends", () => {
  it.each([
    { what: "cement on wood", sign: onWood(bond("solvent cement")), labels: [["Take Thick cyanoacrylate"]] },
    {
      what: "a cement as tack",
      sign: onWood(bond("epoxy", adhesive("bodied cement"))),
      labels: [["Take Thick cyanoacrylate, without a tack"]],
    },
    { what: "epoxy on acrylic", sign: onAcrylic(bond("epoxy")), labels: [[], ["Take Wicking cement"]] },
    {
      what: "cement on a mirror",
      sign: onAcrylic(bond("solvent cement"), sheet("Mirror, silver")),
      labels: [[], ["Take Thick cyanoacrylate"]],
    },
    {
      what: "cement in a pocket",
      sign: onAcrylic(pocketWith("bodied cement")),
      labels: [[], ["Take Thick cyanoacrylate"], []],
    },
  ])("of $what: the first on hand that fits", async ({ sign, labels }) => {
    expect((await triedMends(adhesiveFits, sign)).labels).toEqual(labels);
  });

  it("takes one that also takes the movement", async () => {
    const large = buildSign([buildLayer("B", [plate("p", 100, 60, [300, 200])], { hold: bond("solvent cement") })]);
    expect((await triedMends(adhesiveFits, large)).labels).toEqual([["Take Slow epoxy"]]);
  });

  it("offers none when nothing on hand fits", async () => {
    const stock = { ...standardStock, adhesives: [adhesive("solvent cement"), adhesive("wood glue")] };
    expect((await triedMends(adhesiveFits, onWood(bond("wood glue")), { context: { stock } })).labels).toEqual([[]]);
  });
});
