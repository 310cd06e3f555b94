import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { documentVersion } from "#shared/mockup/document.ts";
import { readDocument, upgradeTo } from "#shared/mockup/upgrade.ts";
import { buildLayer, buildSign, plate } from "../../../support/build-sign.ts";

const sample = (version: number): unknown =>
  JSON.parse(readFileSync(new URL(`../../../fixtures/documents/version-${version}.json`, import.meta.url), "utf8"));

it.each(Array.from({ length: documentVersion }, (_, index) => index + 1))(
  "the kept sample of version %i opens",
  (version) => {
    const read = readDocument(sample(version));
    expect(read).toMatchObject({ ok: true, document: { version: documentVersion } });
    if (read.ok) expect(read.document.layers.map(({ key }) => key).slice(0, 2)).toEqual(["B", "C"]);
  },
);

it("a document of version 1 keeps what it said and gets what it meant", () => {
  const read = readDocument(sample(1));
  if (!read.ok) throw new Error(read.reason);
  const { board, backer, hanging, layers } = read.document;
  expect(board.outline).toEqual({ kind: "rectangle" });
  expect(hanging).toEqual({ kind: "cleat", gap: 6, pose: "upright", carriesKg: null, points: [] });
  expect(backer).toMatchObject({ grainTurn: 0, finish: [], stock: { movementPerPoint: 0.00267 } });
  expect(
    layers.every(({ marked, pieces }) => marked === "not stated" && pieces.every(({ reads }) => reads === "")),
  ).toBe(true);
  expect(layers[0]?.hold).toMatchObject({ hardware: { screw: { gauge: 6, head: "flat" } } });
  expect(layers[1]?.hold).toMatchObject({ kind: "pocket", cut: "engraved", bitRadius: 0 });
});

it("a plank of version 2 has no slats and no frame", () => {
  const read = readDocument(sample(2));
  expect(read).toMatchObject({ ok: true, document: { backer: { slats: null, thickness: 18 }, frame: null } });
  if (read.ok) expect(read.document.backer).not.toHaveProperty("kind");
});

it("a sign of version 3 has nothing locked, lettered or hung in a photo", () => {
  const read = readDocument(sample(3));
  expect(read).toMatchObject({ ok: true, document: { lettering: [], presentation: { photo: null } } });
  if (read.ok) expect(read.document.layers.every(({ locked }) => !locked)).toBe(true);
});

it("lettering whose setting is gone is refused", () => {
  const json = z.looseObject({ lettering: z.array(z.unknown()) }).parse(sample(4));
  expect(readDocument({ ...json, lettering: [] })).toMatchObject({ ok: false, reason: /lettering that is not there/ });
});

it("a finish in words is kept as it was written, and an upright board's grain stays upright", () => {
  const old = sample(1);
  const first = z.looseObject({ board: z.looseObject({}), backer: z.looseObject({}) }).parse(old);
  const read = readDocument({
    ...first,
    board: { ...first.board, width: 300, height: 500 },
    backer: { ...first.backer, finish: " Oil, two coats " },
  });
  expect(read).toMatchObject({
    ok: true,
    document: { backer: { grainTurn: 90, finish: [{ kind: "other", name: "Oil, two coats", dryingHours: 0 }] } },
  });
});

it("a document of today's version is read as it is", () => {
  const document = buildSign([buildLayer("B", [plate("b", 10, 10, [5, 5])])]);
  const stored: unknown = JSON.parse(JSON.stringify(document));
  expect(readDocument(stored)).toEqual({ ok: true, document });
});

describe("refused with a reason", () => {
  const good = () => structuredClone(buildSign([buildLayer("B", [plate("b", 10, 10, [5, 5])])]));
  it.each([
    { what: "nothing", json: null, reason: /no mockup/ },
    { what: "a text", json: "{}", reason: /no mockup/ },
    { what: "a list", json: [], reason: /no mockup/ },
    { what: "an object without a version", json: {}, reason: /does not say its version/ },
    { what: "version 0", json: { version: 0 }, reason: /does not say its version/ },
    { what: "version 1.5", json: { version: 1.5 }, reason: /does not say its version/ },
    { what: "a later version", json: { ...good(), version: documentVersion + 1 }, reason: /later Standproud/ },
    { what: "an unknown field", json: { ...good(), extra: 1 }, reason: /extra/ },
    { what: "a quantity of none", json: { ...good(), quantity: 0 }, reason: /At quantity/ },
    { what: "a missing part", json: { version: 1 }, reason: /and \d+ more/ },
  ])("$what", ({ json, reason }) => {
    const read = readDocument(json);
    expect(read.ok).toBe(false);
    if (!read.ok) expect(read.reason).toMatch(reason);
  });

  it("a key that two layers share, with the place", () => {
    const document = good();
    const twice = { ...document, layers: [document.layers[0], { ...document.layers[0], pieces: [] }] };
    expect(readDocument(twice)).toEqual({ ok: false, reason: "At layers / 1 / key: Key B is used twice." });
  });
});

describe("steps from version to version", () => {
  const table = {
    1: (old: Readonly<Record<string, unknown>>) => ({ ...old, second: true }),
    2: (old: Readonly<Record<string, unknown>>) => ({ third: old.second }),
  };

  it("run one after the other, each on what the one before gave", () => {
    expect(upgradeTo({ version: 1, first: 1 }, 3, table)).toEqual({ ok: true, value: { version: 3, third: true } });
    expect(upgradeTo({ version: 2, second: "x" }, 3, table)).toEqual({ ok: true, value: { version: 3, third: "x" } });
  });

  it("leave the stored object as it was", () => {
    const stored = Object.freeze({ version: 1, first: 1 });
    upgradeTo(stored, 3, table);
    expect(stored).toEqual({ version: 1, first: 1 });
  });

  it("stop where one is missing", () => {
    expect(upgradeTo({ version: 1 }, 4, table)).toEqual({
      ok: false,
      reason: "There is no way from version 3 to 4 of a mockup.",
    });
  });
});
