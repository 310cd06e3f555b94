import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import { coatId, sheetId, stripId } from "#shared/cost/entry-ids.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import { stripName, thingsToPrice } from "#shared/cost/things-to-price.ts";
import { machineWorks, usualPaces, usualWaste } from "#shared/cost/works.ts";
import type { Stock } from "#shared/materials/stock.ts";
import { changePrices } from "../../commands/change-prices.ts";
import type { Context } from "../../http/context.ts";
import { presentStockItem } from "../../presenters/stock-item.ts";
import { wholeStock } from "../../queries/list-stock.ts";

/** Euro cents a square metre of 1 mm: what sheet and board are reckoned by here. All prices of the demo are made up. */
const centsPerMm = { cast: 1450, looks: 1900, softwood: 190, hardwood: 420 } as const;
const hour = { hand: 4800, cutter: 6600, saw: 5400 } as const;
/** Cents a pack of a hundred screws, by their length. */
const screwPrices: Readonly<Record<number, number>> = { 12: 410, 16: 460, 19: 490, 25: 560, 32: 640, 38: 720, 45: 810 };
/** Out of stock, and not bought again yet. */
const unpricedColour = "Rust";
/** Woods that the demo keeps strips of, for slats. */
const stripWoods = new Set(["Eastern white pine", "Black walnut", "Hard maple"]);
const hangings: Readonly<Record<string, number>> = { cleat: 780, keyholes: 240, wire: 350, "screwed through": 160 };

/** Fills the demo shop's price book for most of its stock. One colour has none yet, so that a visitor sees what that looks like. */
export async function loadDemoPrices(context: Context, shopId: string): Promise<void> {
  const items = await wholeStock(context, shopId);
  const stock = stockOfItems(items.map(presentStockItem));
  await changePrices(context, { shopId, version: 0, book: demoPrices(stock) });
}

/** The demo's price book for a stock list. */
export function demoPrices(stock: Stock): PriceBook {
  const { hardware, adhesives, labour } = thingsToPrice(stock, "mm");
  const hardwarePrices = new Map<string, { price: number; pack: number }>([
    ...stock.hardware.map(({ hardware: one }) => [one.name, { price: 320 + 22 * one.barrelLength, pack: 1 }] as const),
    ...stock.screws.map(({ name, length }) => [name, { price: screwPrices[length] ?? 600, pack: 100 }] as const),
    ["Brads", { price: 690, pack: 1000 }] as const,
  ]);
  return {
    version: 1,
    currency: "EUR",
    materials: [...sheetPrices(stock), ...woodPrices(stock)],
    machines: Object.values(machineWorks).map(({ id, name }) => ({
      ...usualPaces,
      id,
      name,
      perHour: id === machineWorks.sawing.id ? hour.saw : hour.cutter,
      cutMmPerMinute: id === machineWorks.sawing.id ? 900 : usualPaces.cutMmPerMinute,
      setUpMinutes: id === machineWorks.sawing.id ? 4 : 8,
    })),
    hardware: hardware.map(({ id, name }) => ({
      id,
      name,
      ...(hardwarePrices.get(name) ?? { price: hangings[id.replace("hanging ", "")] ?? 300, pack: 1 }),
    })),
    adhesives: adhesives.map(({ id, name, isTape }) => ({
      id,
      name,
      price: isTape ? 3800 : 1290,
      ...(isTape ? { unit: "cm²" as const } : {}),
      containerMl: isTape ? 6000 : 250,
      mlPerM2: isTape ? 10_000 : 220,
      mlPerM: isTape ? 0 : 10,
    })),
    finishes: finishPrices(),
    labour: labour.map(({ id, name }) => ({
      id,
      name,
      perHour: hour.hand,
      minutesEach: { sign: 35, slat: 2.5, standoff: 4, "frame piece": 8 }[id] ?? 3,
    })),
    markup: 0.35,
    tax: { name: "VAT", share: 0.19 },
  };
}

function sheetPrices(stock: Stock): PriceBook["materials"] {
  return stock.acrylics.flatMap(({ acrylic, thicknessesMm }) =>
    thicknessesMm.flatMap((mm) => {
      if (acrylic.name === unpricedColour) return [];
      const perMm = acrylic.look === "opaque" ? centsPerMm.cast : centsPerMm.looks;
      const price = Math.round((perMm * mm + 900) / 50) * 50;
      return [
        {
          id: sheetId(acrylic, mm, stock),
          name: `${acrylic.name}, ${mm} mm`,
          unit: "m²" as const,
          price,
          waste: usualWaste.sheet,
        },
      ];
    }),
  );
}

function woodPrices(stock: Stock): PriceBook["materials"] {
  const { boards } = thingsToPrice(stock, "mm");
  const priced = stock.woods.flatMap(({ wood, thicknessesMm }) => thicknessesMm.map((mm) => ({ wood, mm })));
  const section = { widthMm: 38, thicknessMm: 6 };
  return [
    ...priced.flatMap(({ wood, mm }, index) => {
      const board = boards[index];
      if (!board) return [];
      const price = Math.round((centsPerMm[wood.hardness] * mm) / 50) * 50;
      return [{ ...board, unit: "m²" as const, price, waste: usualWaste.board }];
    }),
    ...stock.woods
      .filter(({ wood }) => stripWoods.has(wood.name))
      .map(({ wood }) => ({
        id: stripId(wood, section, stock),
        name: stripName(wood.name, section, "mm"),
        unit: "m" as const,
        price: wood.hardness === "softwood" ? 180 : 340,
        waste: usualWaste.strip,
      })),
  ];
}

/** The coats that the demo's signs have. */
function finishPrices(): PriceBook["finishes"] {
  const coat = (name: string, pricePerM2: number, minutesPerM2: number) => ({
    id: coatId({ kind: "other", name, dryingHours: 0 }),
    name,
    pricePerM2,
    minutesPerM2,
    perHour: hour.hand,
  });
  return [
    {
      id: coatId({ kind: "sanding", grit: 180 }),
      name: "Sanding",
      pricePerM2: 60,
      minutesPerM2: 9,
      perHour: hour.hand,
    },
    coat("Pale wash", 240, 9),
    coat("Clear satin", 320, 11),
    coat("Clear matt", 310, 11),
    coat("Hard oil", 410, 12),
  ];
}
