import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { connect } from "#server/db/connection.ts";
import { migrator } from "#server/db/migrate.ts";
import { standardScrews } from "#shared/materials/standard-stock.ts";
import { hardwareSchema } from "#shared/mockup/hardware-schemas.ts";
import { acrylicSchema, screwSchema, woodSchema } from "#shared/mockup/stock-schemas.ts";
import { upgradeHardware, upgradeWood } from "#shared/mockup/upgrade-from-1.ts";
import { createTestDatabase, type TestDatabase } from "../support/database.ts";
import { runSql } from "../support/run-sql.ts";

/** A database as it was before the shop kept its own stock, with a shop's rows of document version 1. */

const shopId = "00000000-0000-4000-8000-000000000901";
const step = "2026-12-01-07-stock";
let database: TestDatabase;
const sql = <Row extends Record<string, unknown>>(text: string, values: readonly unknown[] = []) =>
  runSql<Row>(database.ownerUrl, text, values);

const pine = {
  kind: "wood",
  stockId: null,
  name: "Eastern white pine",
  colour: "#E6CFA4",
  gravity: 0.35,
  moisturePercent: 8,
  hardness: "softwood",
};
const walnut = { ...pine, name: "Black walnut", colour: "#6B4A33", gravity: 0.55, hardness: "hardwood" };
const midnight = {
  kind: "acrylic",
  stockId: null,
  name: "Midnight",
  colour: "#27314F",
  look: "opaque",
  process: "cast",
  facesDiffer: false,
  densityKgM3: 1190,
};
const barrel = (screw: string) => ({
  kind: "capStud",
  stockId: null,
  name: `Standoff with ${screw}`,
  finish: "#C3C1BA",
  barrelDiameter: 15,
  barrelLength: 12,
  boreDiameter: 7.5,
  boreDepth: 9.5,
  floorThickness: 2.5,
  floorHole: 4,
  countersunk: true,
  studDiameter: 5,
  studLength: 11,
  capDiameter: 15,
  capThickness: 3,
  screw: { name: screw, diameter: 3.5, length: 16, headDiameter: 7, headHeight: 2 },
});

async function migrateTo(direction: "down" | "up"): Promise<void> {
  const sequelize = connect(database.ownerUrl, { poolMax: 1 });
  try {
    if (direction === "down") await migrator(sequelize).down({ to: step });
    else await migrator(sequelize).up();
  } finally {
    await sequelize.close();
  }
}

async function put(id: number, kind: string, name: string, properties: object, retired = false): Promise<void> {
  await sql(
    `insert into stock_items (id, shop_id, kind, name, properties, created_at, retired_at)
     values ($1, $2, $3, $4, $5, $6, $7)`,
    [
      `00000000-0000-4000-8000-0000000009${id}`,
      shopId,
      kind,
      name,
      JSON.stringify(properties),
      `2026-01-${id}`,
      retired ? "2026-06-01" : null,
    ],
  );
}

beforeAll(async () => {
  database = await createTestDatabase();
  await migrateTo("down");
  await sql(
    `insert into shops (id, slug, name, unit, job_prefix, paper, created_at)
     values ($1, 'old', 'Old', 'mm', 'O', 'A4', now())`,
    [shopId],
  );
  await put(10, "acrylic", "Midnight", { acrylic: midnight, thicknessesMm: [3, 4.5] });
  await put(11, "acrylic", "midnight", { acrylic: { ...midnight, name: "midnight" }, thicknessesMm: [6] });
  await put(12, "acrylic", "MIDNIGHT (2)", { acrylic: { ...midnight, name: "MIDNIGHT (2)" }, thicknessesMm: [6] });
  await put(13, "acrylic", "Midnight", { acrylic: midnight, thicknessesMm: [10] }, true);
  await put(20, "wood", "Eastern white pine", { wood: pine, thicknessesMm: [18] });
  await put(21, "wood", "Black walnut", { wood: walnut, thicknessesMm: [18] });
  await put(25, "hardware", "A", { hardware: barrel("No. 6 × 16, flat head") });
  await put(26, "hardware", "B", { hardware: barrel("Long brass screw") });
  await migrateTo("up");
});
afterAll(() => database.drop());

const propertiesOf = async (id: number): Promise<Record<string, unknown>> => {
  const [row] = await sql<{ properties: Record<string, unknown> }>("select properties from stock_items where id = $1", [
    `00000000-0000-4000-8000-0000000009${id}`,
  ]);
  return row?.properties ?? {};
};

describe("stock of document version 1", () => {
  it("gains the movement of wood that a version-1 drawing gains", async () => {
    const upgraded = await Promise.all([propertiesOf(20), propertiesOf(21)]);
    expect(upgraded.map(({ wood }) => wood)).toEqual([upgradeWood(pine), upgradeWood(walnut)]);
    expect(upgraded.map(({ wood }) => woodSchema.parse(wood).movementPerPoint)).toEqual([0.00267, 0.00369]);
    expect(upgraded[0]?.thicknessesMm).toEqual([18]);
  });

  it("gains number and head of its screws, no number where the name has none", async () => {
    const upgraded = await Promise.all([propertiesOf(25), propertiesOf(26)]);
    expect(upgraded.map(({ hardware }) => hardware)).toEqual([
      upgradeHardware(barrel("No. 6 × 16, flat head")),
      upgradeHardware(barrel("Long brass screw")),
    ]);
    const parts = upgraded.map(({ hardware }) => hardwareSchema.parse(hardware));
    expect(parts.map((part) => "screw" in part && [part.screw.gauge, part.screw.head])).toEqual([
      [6, "flat"],
      [null, "flat"],
    ]);
  });

  it("has no sheet counted yet", async () => {
    const { acrylic, sheets } = await propertiesOf(10);
    expect(sheets).toEqual([]);
    expect(acrylicSchema.parse(acrylic)).toEqual(midnight);
  });

  it("keeps names once in a kind: the oldest its own, others a number that is free, retired ones as they were", async () => {
    const rows = await sql<{ name: string; inside: string; retired: boolean }>(
      `select name, properties #>> '{acrylic,name}' as inside, retired_at is not null as retired
       from stock_items where kind = 'acrylic' order by created_at`,
    );
    expect(rows).toEqual([
      { name: "Midnight", inside: "Midnight", retired: false },
      { name: "midnight (3)", inside: "midnight (3)", retired: false },
      { name: "MIDNIGHT (2)", inside: "MIDNIGHT (2)", retired: false },
      { name: "Midnight", inside: "Midnight", retired: true },
    ]);
    await expect(put(27, "acrylic", "MIDNIGHT", { acrylic: midnight, thicknessesMm: [3], sheets: [] })).rejects.toThrow(
      "stock_items_name",
    );
  });

  it("has the seven usual screws, which every shop had without a row", async () => {
    const rows = await sql<{ name: string; screw: unknown; version: number }>(
      "select name, properties -> 'screw' as screw, version from stock_items where kind = 'screw' order by (properties #>> '{screw,length}')::integer",
    );
    expect(rows.map(({ screw }) => screwSchema.parse(screw))).toEqual(standardScrews);
    expect(rows.map(({ name }) => name)).toEqual(standardScrews.map(({ name }) => name));
    expect(rows.every(({ version }) => version === 1)).toBe(true);
  });

  it("goes back to what version 1 knew", async () => {
    await migrateTo("down");
    expect(await propertiesOf(20)).toEqual({ wood: pine, thicknessesMm: [18] });
    expect(await propertiesOf(25)).toEqual({ hardware: barrel("No. 6 × 16, flat head") });
    expect(await propertiesOf(10)).toEqual({ acrylic: midnight, thicknessesMm: [3, 4.5] });
    expect(await sql("select from stock_items where kind = 'screw'")).toEqual([]);
    await migrateTo("up");
  });
});
